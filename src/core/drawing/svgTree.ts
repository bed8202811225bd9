/// <reference path="./vendor.d.ts" />
import { type ParsedElement, parse } from 'svg-parser';
import type { Place } from '../finding.js';
import type { AttributeTable } from './attributeTable.js';
import { type FindingLog, Unreadable } from './findingLog.js';
import type { LineIndex } from './lineIndex.js';
import { type Skeleton, scanMarkup } from './markupScan.js';

const SVG_NAMESPACE = 'http://www.w3.org/2000/svg';

/** Shared by all elements without children, and never written to. */
const NO_CHILDREN: (SvgElement | string)[] = [];

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

export interface SvgTree {
  readonly root: SvgElement;
  /** The first element that has each id. */
  readonly byId: ReadonlyMap<string, SvgElement>;
  /** `style` elements in document order. */
  readonly sheets: readonly SvgElement[];
  readonly elementCount: number;
  readonly attributes: AttributeTable;
  attributeOf(element: SvgElement, name: string): string | null;
  placeOf(element: SvgElement): Place;
}

/**
 * The drawing's text as a tree. Throws Unreadable where it is not well-formed or no SVG.
 * Cost: O(text); the walk is iterative, so depth costs no stack.
 */
export function readTree(text: string, lines: LineIndex, log: FindingLog): SvgTree {
  const skeleton = scanMarkup(text, lines, log);
  let parsed: ParsedElement;
  try {
    parsed = parse(skeleton.markup).children[0];
  } catch {
    throw new Unreadable('xml-unreadable', null);
  }
  return new TreeRestorer(skeleton, lines, log).restore(parsed);
}

/** The text inside an element and its descendants, white space collapsed, at most `limit` characters. */
export function textOf(element: SvgElement, limit: number): string {
  const pending: (SvgElement | string)[] = [element];
  let text = '';
  while (pending.length > 0 && text.length <= 4 * limit) {
    const node = pending.pop()!;
    if (typeof node === 'string') text += node.slice(0, 4 * limit);
    else for (let i = node.children.length - 1; i >= 0; i--) pending.push(node.children[i]);
  }
  return text.replace(/\s+/g, ' ').trim().slice(0, limit);
}

/** Namespace declarations in force, innermost first; `''` is the default one. */
interface Scope {
  readonly prefix: string;
  readonly uri: string;
  readonly outer: Scope | null;
}

/** An element whose children are being restored. */
interface Frame {
  readonly node: ParsedElement;
  readonly element: SvgElement;
  readonly children: (SvgElement | string)[];
  readonly scope: Scope | null;
  next: number;
}

class TreeRestorer {
  private readonly byId = new Map<string, SvgElement>();
  private readonly sheets: SvgElement[] = [];

  constructor(
    private readonly skeleton: Skeleton,
    private readonly lines: LineIndex,
    private readonly log: FindingLog,
  ) {}

  restore(parsed: ParsedElement): SvgTree {
    const top = this.element(parsed, null, null);
    if (top.element.name !== 'svg' || !top.element.isSvg) {
      const root = this.nameOf(parsed.tagName).slice(0, 60);
      throw new Unreadable('not-svg', this.placeOf(top.element), { root });
    }
    const frames = [top];
    while (frames.length > 0) {
      const frame = frames[frames.length - 1];
      const child = frame.node.children[frame.next++];
      if (child === undefined) frames.pop();
      else if (child.type === 'text') frame.children.push(this.restoreText(child.value));
      else {
        const inner = this.element(child, frame.element, frame.scope);
        frame.children.push(inner.element);
        frames.push(inner);
      }
    }
    const { byId, sheets } = this;
    const { attributes } = this.skeleton;
    return {
      root: top.element,
      byId,
      sheets,
      elementCount: attributes.elementCount,
      attributes,
      attributeOf: (element, name) => attributes.get(element.number, name),
      placeOf: (element) => this.placeOf(element),
    };
  }

  private element(node: ParsedElement, parent: SvgElement | null, outer: Scope | null): Frame {
    const number = Number(String(node.properties.n).slice(1));
    const { attributes } = this.skeleton;
    let scope = outer;
    for (let i = attributes.begin(number), end = attributes.end(number); i < end; i++) {
      const name = attributes.nameNumberAt(i);
      const prefix = attributes.prefixes[name];
      if (prefix === 'xmlns') {
        scope = { prefix: attributes.names[name].slice(6), uri: attributes.valueAt(i), outer: scope };
      } else if (prefix === null && attributes.names[name] === 'xmlns') {
        scope = { prefix: '', uri: attributes.valueAt(i), outer: scope };
      }
    }
    const name = this.nameOf(node.tagName);
    const colon = name.indexOf(':');
    const children = node.children.length === 0 ? NO_CHILDREN : [];
    const element: SvgElement = {
      name: name.slice(colon + 1),
      isSvg: this.isSvg(name.slice(0, Math.max(colon, 0)), scope),
      children,
      parent,
      number,
    };
    const id = attributes.get(number, 'id');
    if (id !== null && !this.byId.has(id)) this.byId.set(id, element);
    if (element.isSvg && element.name === 'style') this.sheets.push(element);
    this.checkPrefixes(colon < 0 ? null : name.slice(0, colon), element, scope);
    return { node, element, children, scope, next: 0 };
  }

  /** Without any namespace an element counts as SVG, unlike in a browser: such drawings are common. */
  private isSvg(prefix: string, scope: Scope | null): boolean {
    const uri = lookUp(prefix, scope);
    if (uri === SVG_NAMESPACE) return true;
    return (prefix === '' && (uri === null || uri === '')) || (prefix === 'svg' && uri === null);
  }

  private checkPrefixes(prefix: string | null, element: SvgElement, scope: Scope | null): void {
    if (prefix !== null) this.checkPrefix(prefix, element, scope);
    else if (element.isSvg && !lookUp('', scope)) {
      this.log.add('svg-namespace-missing', () => this.placeOf(element));
    }
    const { attributes } = this.skeleton;
    for (let i = attributes.begin(element.number), end = attributes.end(element.number); i < end; i++) {
      const attributePrefix = attributes.prefixes[attributes.nameNumberAt(i)];
      if (attributePrefix !== null) this.checkPrefix(attributePrefix, element, scope);
    }
  }

  private checkPrefix(prefix: string, element: SvgElement, scope: Scope | null): void {
    if (prefix === 'xml' || prefix === 'xmlns' || prefix === '' || lookUp(prefix, scope) !== null) return;
    this.log.add('undeclared-prefix', () => this.placeOf(element), { prefix });
  }

  private restoreText(placeholder: string): string {
    return this.skeleton.texts[Number(placeholder.slice(1))];
  }

  private nameOf(plain: string): string {
    return plain.startsWith('__') ? this.skeleton.oddNames[Number(plain.slice(2))] : plain;
  }

  private placeOf(element: SvgElement): Place {
    const { attributes, starts } = this.skeleton;
    const id = attributes.get(element.number, 'id');
    return { element: element.name, id, ...this.lines.locate(starts[element.number]) };
  }
}

function lookUp(prefix: string, scope: Scope | null): string | null {
  for (let s = scope; s !== null; s = s.outer) if (s.prefix === prefix) return s.uri;
  return null;
}
