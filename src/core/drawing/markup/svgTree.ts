import type { Place } from '../../finding.js';
import { Column } from '../column.js';
import type { FindingLog } from '../findingLog.js';
import type { ReadingLimits } from '../readingLimits.js';
import { AttributeTable } from './attributeTable.js';
import type { LineIndex } from './lineIndex.js';
import { MarkupLexer } from './markupLexer.js';
import { scanMarkup } from './markupScan.js';
import { SkeletonWriter } from './skeleton.js';
import { TreeBuilder } from './treeBuilder.js';

/** An element of the drawing as written: nothing inherited, nothing computed. */
export interface SvgElement {
  /** Local name, without prefix. */
  readonly name: string;
  /** False for elements of other namespaces, which draw nothing. */
  readonly isSvg: boolean;
  readonly children: readonly (SvgElement | string)[];
  readonly parent: SvgElement | null;
  /** Its number in document order, by which `attributes` knows it. */
  readonly number: number;
}

/** The document: elements as a tree, attributes as columns, places looked up when asked for. */
export interface SvgTree {
  readonly root: SvgElement;
  /** The first element that has each id; made when first asked for. */
  readonly byId: ReadonlyMap<string, SvgElement>;
  /** `style` elements in document order. */
  readonly sheets: readonly SvgElement[];
  readonly elementCount: number;
  readonly attributes: AttributeTable;
  attributeOf(element: SvgElement, name: string): string | null;
  placeOf(element: SvgElement): Place;
}

/**
 * The drawing's text as a tree. Throws Unreadable where it is not well-formed or no SVG, or past a limit.
 * Cost: O(text); the walk is iterative, so depth costs no stack.
 */
export function readTree(text: string, lines: LineIndex, log: FindingLog, limits: ReadingLimits): SvgTree {
  const attributes = new AttributeTable(text);
  const starts = new Column();
  const placeOf = (element: SvgElement): Place => ({
    element: element.name,
    id: attributes.get(element.number, 'id'),
    ...lines.locate(starts.values[element.number]),
  });
  const builder = new TreeBuilder(attributes, log, placeOf);
  const writer = new SkeletonWriter((piece) => builder.take(piece));
  scanMarkup(new MarkupLexer(text, lines, log), limits, { writer, attributes, starts });
  const { root, sheets } = builder.finish();
  let byId: Map<string, SvgElement> | null = null;
  return {
    root,
    sheets,
    get byId() {
      byId ??= elementsById(root, attributes);
      return byId;
    },
    elementCount: attributes.elementCount,
    attributes,
    attributeOf: (element, name) => attributes.get(element.number, name),
    placeOf,
  };
}

function elementsById(root: SvgElement, attributes: AttributeTable): Map<string, SvgElement> {
  const byId = new Map<string, SvgElement>();
  const pending = [root];
  for (let element = pending.pop(); element; element = pending.pop()) {
    const id = attributes.get(element.number, 'id');
    if (id !== null && !byId.has(id)) byId.set(id, element);
    for (let i = element.children.length - 1; i >= 0; i--) {
      const child = element.children[i];
      if (typeof child !== 'string') pending.push(child);
    }
  }
  return byId;
}

/** The text inside an element and its descendants, white space collapsed, at most `limit` characters. */
export function textOf(element: SvgElement, limit: number): string {
  const pending: (SvgElement | string)[] = [element];
  let text = '';
  while (text.length <= 4 * limit) {
    const node = pending.pop();
    if (node === undefined) break;
    if (typeof node === 'string') text += node.slice(0, 4 * limit);
    else for (let i = node.children.length - 1; i >= 0; i--) pending.push(node.children[i]);
  }
  return text.replace(/\s+/g, ' ').trim().slice(0, limit);
}
