/// <reference path="../vendor.d.ts" />
import { type ParsedElement, parse } from 'svg-parser';
import type { Place } from '../../finding.js';
import { type FindingLog, Unreadable } from '../findingLog.js';
import type { AttributeTable } from './attributeTable.js';
import { isReserved, Scope } from './namespaces.js';
import type { SkeletonPiece } from './skeleton.js';
import type { SvgElement } from './svgTree.js';

/** Shared by all elements without children, and never written to. */
const NO_CHILDREN: (SvgElement | string)[] = [];

/** An element while its children are still coming. */
interface Growing extends SvgElement {
  children: (SvgElement | string)[];
}

/** A tag's name taken apart. */
interface Name {
  readonly prefix: string;
  readonly local: string;
}

/** Makes the tree of what svg-parser reads in each piece of the skeleton, and puts back what was taken out. */
export class TreeBuilder {
  private root: Growing | null = null;
  private readonly sheets: SvgElement[] = [];
  private readonly names = new Map<string, Name>();
  /** By depth: the element last met there, and the namespaces in force inside it. */
  private readonly path: Growing[] = [];
  private readonly scopes: Scope[] = [];
  private readonly outside = new Scope(null, '', null);
  private count = 0;

  constructor(
    private readonly attributes: AttributeTable,
    private readonly log: FindingLog,
    private readonly placeOf: (element: SvgElement) => Place,
  ) {}

  take(piece: SkeletonPiece): void {
    const { texts, nameOf, reopened } = piece;
    const before = this.count;
    let node = parsed(piece.markup);
    const nodes: ParsedElement[] = [];
    const next: number[] = [];
    if (reopened === 0) {
      this.add(nameOf(node.tagName), 0);
      nodes.push(node);
      next.push(0);
    } else {
      for (let level = 0; level < reopened; level++) {
        if (level > 0) node = elementOf(node);
        nodes.push(node);
        next.push(level < reopened - 1 ? 1 : 0);
      }
    }
    let text = 0;
    while (nodes.length > 0) {
      const depth = nodes.length;
      const child = nodes[depth - 1].children[next[depth - 1]++];
      if (child === undefined) {
        nodes.pop();
        next.pop();
      } else if (child.type === 'text') append(this.path[depth - 1], texts[text++]);
      else {
        append(this.path[depth - 1], this.add(nameOf(child.tagName), depth));
        if (child.children.length > 0) {
          nodes.push(child);
          next.push(0);
        }
      }
    }
    if (this.count - before !== piece.elements || text !== texts.length) throw unreadable();
  }

  finish(): { root: SvgElement; sheets: readonly SvgElement[] } {
    if (this.root === null) throw unreadable();
    return { root: this.root, sheets: this.sheets };
  }

  private add(tag: string, depth: number): Growing {
    const number = this.count++;
    const outer = depth > 0 ? this.scopes[depth - 1] : this.outside;
    const { scope, prefixed } = this.scopeOf(number, outer);
    const { prefix, local } = this.nameOf(tag);
    const element: Growing = {
      name: local,
      isSvg: prefix === '' ? scope.plainIsSvg : scope.isSvg(prefix),
      children: NO_CHILDREN,
      parent: depth > 0 ? this.path[depth - 1] : null,
      number,
    };
    this.path[depth] = element;
    this.scopes[depth] = scope;
    if (depth === 0) this.setRoot(element, tag);
    if (local === 'style' && element.isSvg) this.sheets.push(element);
    if (prefix !== '') this.checkPrefix(prefix, element, scope);
    else if (!scope.hasDefault && element.isSvg) {
      const values = { element: local.slice(0, 60), isRoot: depth === 0 ? 1 : 0 };
      this.log.add('svg-namespace-missing', () => this.placeOf(element), values);
    }
    if (prefixed > 0) this.checkAttributes(element, scope, prefixed);
    return element;
  }

  private setRoot(element: Growing, tag: string): void {
    this.root = element;
    if (element.name === 'svg' && element.isSvg) return;
    throw new Unreadable('not-svg', this.placeOf(element), { root: tag.slice(0, 60) });
  }

  /** The namespaces in force inside an element, and how many of its attributes have to do with any. */
  private scopeOf(number: number, outer: Scope): { scope: Scope; prefixed: number } {
    const { attributes } = this;
    let scope = outer;
    let prefixed = 0;
    for (let i = attributes.begin(number), end = attributes.end(number); i < end; i++) {
      const name = attributes.nameNumberAt(i);
      const kind = attributes.kinds[name];
      if (kind === 0) continue;
      prefixed++;
      if (kind === 3) continue;
      scope = new Scope(kind === 1 ? '' : attributes.names[name].slice(6), attributes.valueAt(i), scope);
    }
    return { scope, prefixed };
  }

  private nameOf(tag: string): Name {
    let name = this.names.get(tag);
    if (name === undefined) {
      const colon = tag.indexOf(':');
      name = { prefix: tag.slice(0, Math.max(colon, 0)), local: tag.slice(colon + 1) };
      this.names.set(tag, name);
    }
    return name;
  }

  private checkAttributes(element: SvgElement, scope: Scope, prefixed: number): void {
    const { attributes } = this;
    const expanded = new Set<string>();
    for (let i = attributes.begin(element.number), end = attributes.end(element.number); i < end; i++) {
      const number = attributes.nameNumberAt(i);
      const prefix = attributes.prefixes[number];
      if (prefix === null) continue;
      const name = attributes.names[number];
      if (attributes.kinds[number] === 2) {
        if (isReserved(name.slice(6))) {
          this.log.add('xml-not-strict', () => this.placeOf(element), { what: 'a reserved prefix declared' });
        } else if (attributes.valueAt(i) === '') this.checkPrefix(name.slice(6), element, scope);
        continue;
      }
      this.checkPrefix(prefix, element, scope);
      if (prefixed === 1) continue;
      // Namespaces in XML 1.0 §6.3: the same name under two prefixes of one namespace stands twice.
      const full = `${name.slice(prefix.length + 1)} ${scope.lookUp(prefix) ?? `${prefix}:`}`;
      if (expanded.has(full)) {
        throw new Unreadable('xml-duplicate-attribute', this.placeOf(element), {
          attribute: name.slice(0, 60),
        });
      }
      expanded.add(full);
    }
  }

  private checkPrefix(prefix: string, element: SvgElement, scope: Scope): void {
    if (isReserved(prefix) || scope.lookUp(prefix) !== null) return;
    this.log.add('undeclared-prefix', () => this.placeOf(element), { prefix: prefix.slice(0, 60) });
  }
}

function parsed(markup: string): ParsedElement {
  try {
    return parse(markup).children[0];
  } catch {
    throw unreadable();
  }
}

/** The element that a piece begins with again inside another. */
function elementOf(node: ParsedElement): ParsedElement {
  const child = node.children[0];
  if (child === undefined || child.type === 'text') throw unreadable();
  return child;
}

function append(parent: Growing, child: SvgElement | string): void {
  if (parent.children === NO_CHILDREN) parent.children = [child];
  else parent.children.push(child);
}

function unreadable(): Unreadable {
  return new Unreadable('xml-unreadable', null);
}
