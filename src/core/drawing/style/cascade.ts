import type { FindingLog } from '../findingLog.js';
import type { SvgElement, SvgTree } from '../markup/svgTree.js';
import { DEFAULT_LIMITS, type ReadingLimits } from '../readingLimits.js';
import { type CustomValues, customValues, substituted } from './customProperties.js';
import { checkedValue, type Declaration, type Misread, readDeclarations, WIDE } from './declarations.js';
import { PROPERTIES } from './properties.js';
import { SelectorMatcher } from './selectorMatcher.js';
import { reportMisread, sheetsOf } from './sheets.js';
import { type Specified, SpecifiedValues } from './specifiedValues.js';
import type { StyleSheet } from './styleSheet.js';

export type { Specified } from './specifiedValues.js';

type StyleLimits = Pick<ReadingLimits, 'styleComparisons' | 'styleCharacters'>;

/** Distinct style attributes remembered; drawings repeat a few of them thousands of times. */
const REMEMBERED = 4096;

/** A `use` around an element, whose copy it is in. */
export interface CopyAround {
  readonly target: SvgElement;
  readonly use: SvgElement;
  readonly outer: CopyAround | null;
}

interface Inline {
  readonly declarations: readonly Declaration[];
  readonly misread: readonly Misread[];
}

/**
 * What is said of one element in its attributes, in style sheets and in its style attribute, the
 * strongest of them for each name (SVG 2, "Styling": presentation attributes are the weakest). Properties
 * that are inherited and to be taken from the parent are left out, as are those that are to have their
 * initial value and are not inherited; `display` is in lower case.
 */
export class Cascade {
  private readonly sheet: StyleSheet | null;
  private readonly matcher: SelectorMatcher | null;
  private specified = new SpecifiedValues();
  private saidGivenUp = false;
  private readonly remembered = new Map<string, Inline>();
  /** What parents were found to specify, and custom properties, by the copy they are in. */
  private readonly parents = new Map<CopyAround | null, Map<SvgElement, SpecifiedValues>>();
  private readonly customs = new Map<CopyAround | null, Map<SvgElement, CustomValues | null>>();

  constructor(
    private readonly tree: SvgTree,
    private readonly log: FindingLog,
    private readonly limits: StyleLimits = DEFAULT_LIMITS,
  ) {
    this.sheet = sheetsOf(tree, log, limits.styleCharacters);
    this.matcher = this.sheet ? new SelectorMatcher(tree, limits.styleComparisons) : null;
  }

  /**
   * The map is the same one each time, valid until the next call. `copy` is what a `use` copies around
   * here: selectors see ancestors up to it only (SVG 2, "The use-element shadow tree").
   */
  specifiedOn(element: SvgElement, copy: CopyAround | null = null): Specified {
    const { specified } = this;
    specified.clear();
    this.fill(specified, element, copy);
    return specified;
  }

  /** Does something that asks for other elements, and leaves the map of the last one as it is. */
  apart<T>(work: () => T): T {
    const { specified } = this;
    this.specified = new SpecifiedValues();
    try {
      return work();
    } finally {
      this.specified = specified;
    }
  }

  private fill(specified: SpecifiedValues, element: SvgElement, copy: CopyAround | null): void {
    const { attributes } = this.tree;
    let references: string[] | null = null;
    for (let i = attributes.begin(element.number), end = attributes.end(element.number); i < end; i++) {
      const number = attributes.nameNumberAt(i);
      if (attributes.prefixes[number] !== null) continue;
      const name = attributes.names[number];
      const value = attributes.valueAt(i);
      specified.set(name, name === 'display' ? value.trim().toLowerCase() : value);
      // Few attributes of a drawing refer to the parent or to a custom property, and none of its long ones.
      if (value.length < LONGEST_REFERENCE && (value === 'inherit' || value.includes('var('))) {
        references = [...(references ?? []), name];
      }
    }
    const style = specified.get('style');
    for (const name of references ?? []) this.refer(specified, name, element, copy);
    for (const declaration of this.declarationsOn(element, style, copy)) {
      this.declare(specified, declaration, element, copy);
    }
  }

  /** A presentation attribute that refers to another value. */
  private refer(
    specified: SpecifiedValues,
    name: string,
    element: SvgElement,
    copy: CopyAround | null,
  ): void {
    const value = specified.get(name) ?? '';
    const property = OF_SVG_GRAMMAR.has(name) ? undefined : PROPERTIES.get(name);
    if (!property) return;
    if (value !== 'inherit')
      this.declare(specified, { name, value, important: false, kind: 'var' }, element, copy);
    else if (!property.inherited && !SIZES.has(name)) this.inherit(specified, name, element, copy);
  }

  /** In the order of the cascade: rules, style attribute, important rules, important style attribute. */
  private declarationsOn(
    element: SvgElement,
    style: string | undefined,
    copy: CopyAround | null,
  ): readonly Declaration[] {
    const inline = style === undefined ? NONE : this.inlineOf(style, element);
    if (!this.sheet || !this.matcher) return inOrder(NONE, inline);
    const id = this.tree.attributeOf(element, 'id');
    const ruled = this.sheet.declarationsFor(element, id, copy?.target ?? null, this.matcher);
    if (this.matcher.compared > this.matcher.most && !this.saidGivenUp) {
      this.saidGivenUp = true;
      this.log.add('style-limit', () => this.tree.placeOf(element), {
        limit: 'styleComparisons',
        value: this.limits.styleComparisons,
      });
    }
    return inOrder(ruled, inline);
  }

  private declare(
    specified: SpecifiedValues,
    { name, value, kind }: Declaration,
    element: SvgElement,
    copy: CopyAround | null,
  ): void {
    if (IN_ATTRIBUTES.has(name) && ignoresStyle(element, name)) return;
    if (kind === 'wide') {
      this.wide(specified, name, value, element, copy);
      return;
    }
    if (name.startsWith('--')) return;
    if (kind === 'plain') {
      specified.setStyled(name, value);
      return;
    }
    const given = substituted(value, this.customOn(element, copy));
    const keyword = given?.toLowerCase() ?? '';
    const checked = given === null || WIDE.has(keyword) ? null : checkedValue(name, given, false);
    if (checked !== null) {
      specified.setStyled(name, checked);
      return;
    }
    if (!WIDE.has(keyword)) this.misread(element, { property: name, found: given ?? value });
    // Wrong only when worked out: the weaker declarations are gone by then.
    this.wide(specified, name, WIDE.has(keyword) ? keyword : 'unset', element, copy);
  }

  private wide(
    specified: SpecifiedValues,
    name: string,
    keyword: string,
    element: SvgElement,
    copy: CopyAround | null,
  ): void {
    if (keyword === 'revert-layer') return; // From a var(): what is weaker stands already.
    const isInherited = PROPERTIES.get(name)?.inherited === true;
    specified.unstyle(name);
    if (isInherited && keyword === 'initial') specified.set(name, keyword);
    else if (name === 'transform-origin' && (keyword === 'initial' || keyword === 'unset')) {
      // Its initial value is the middle: that it is the corner here is a rule of browsers' own.
      specified.set(name, '50% 50%');
    } else if (!isInherited && keyword === 'inherit') this.inherit(specified, name, element, copy);
    else specified.delete(name);
  }

  private inherit(
    specified: SpecifiedValues,
    name: string,
    element: SvgElement,
    copy: CopyAround | null,
  ): void {
    const parent = parentOf(element, copy);
    const outer = parent && this.parentValues(parent.element, parent.copy);
    const value = outer?.get(name);
    if (value === undefined) {
      specified.delete(name);
      return;
    }
    if (outer?.styled.has(name)) specified.setStyled(name, value);
    else specified.set(name, value);
  }

  private parentValues(element: SvgElement, copy: CopyAround | null): SpecifiedValues {
    const known = mapIn(this.parents, copy);
    let values = known.get(element);
    if (!values) {
      values = new SpecifiedValues();
      this.fill(values, element, copy);
      known.set(element, values);
    }
    return values;
  }

  /** From the outermost ancestor whose values are not known yet inwards, so that depth costs no stack. */
  private customOn(element: SvgElement, copy: CopyAround | null): CustomValues | null {
    const path: { readonly element: SvgElement; readonly copy: CopyAround | null }[] = [];
    let values: CustomValues | null | undefined;
    let at: (typeof path)[number] | null = { element, copy };
    for (; at; at = parentOf(at.element, at.copy)) {
      values = mapIn(this.customs, at.copy).get(at.element);
      if (values !== undefined) break;
      path.push(at);
    }
    let current: CustomValues | null = values ?? null;
    for (const here of path.reverse()) {
      const declared = new Map<string, string>();
      const style = this.tree.attributeOf(here.element, 'style') ?? undefined;
      for (const { name, value } of this.declarationsOn(here.element, style, here.copy)) {
        if (name.startsWith('--')) declared.set(name, value);
      }
      if (declared.size > 0) current = customValues(declared, current);
      mapIn(this.customs, here.copy).set(here.element, current);
    }
    return current;
  }

  private inlineOf(style: string, element: SvgElement): readonly Declaration[] {
    let inline = this.remembered.get(style);
    if (!inline) {
      const misread: Misread[] = [];
      inline = { declarations: readDeclarations(style, (what) => misread.push(what)), misread };
      if (this.remembered.size >= REMEMBERED) this.remembered.clear();
      this.remembered.set(style, inline);
    }
    for (const what of inline.misread) this.misread(element, what);
    return inline.declarations;
  }

  private misread(element: SvgElement, what: Misread): void {
    reportMisread(this.log, what, () => this.tree.placeOf(element));
  }
}

const NONE: readonly Declaration[] = [];
const LONGEST_REFERENCE = 400;
/** Attributes that are read by a grammar of SVG, which has no such references. */
const OF_SVG_GRAMMAR: ReadonlySet<string> = new Set([
  ...['transform', 'd', 'translate', 'rotate', 'scale', 'transform-box', 'offset-path'],
]);
/** Attributes that are lengths of SVG, where `inherit` is no length. */
const SIZES: ReadonlySet<string> = new Set(['x', 'y', 'width', 'height', 'cx', 'cy', 'r', 'rx', 'ry']);

/** Browsers take the place and size of a viewport inside the drawing, and the size of a copy, from attributes only. */
const IN_ATTRIBUTES: ReadonlySet<string> = new Set(['x', 'y', 'width', 'height']);

function ignoresStyle({ name, parent }: SvgElement, property: string): boolean {
  if (name === 'use') return property === 'width' || property === 'height';
  return (name === 'svg' && parent !== null) || name === 'symbol';
}

function inOrder(ruled: readonly Declaration[], inline: readonly Declaration[]): readonly Declaration[] {
  if (ruled.length === 0 && !inline.some((d) => d.important)) return inline;
  if (inline.length === 0) return ruled;
  const plain = (d: Declaration): boolean => !d.important;
  const important = (d: Declaration): boolean => d.important;
  return [
    ...ruled.filter(plain),
    ...inline.filter(plain),
    ...ruled.filter(important),
    ...inline.filter(important),
  ];
}

/** The parent of what a `use` copies is that `use`. */
function parentOf(
  element: SvgElement,
  copy: CopyAround | null,
): { readonly element: SvgElement; readonly copy: CopyAround | null } | null {
  if (copy !== null && element === copy.target) return { element: copy.use, copy: copy.outer };
  return element.parent && { element: element.parent, copy };
}

function mapIn<V>(
  maps: Map<CopyAround | null, Map<SvgElement, V>>,
  copy: CopyAround | null,
): Map<SvgElement, V> {
  let map = maps.get(copy);
  if (!map) {
    map = new Map();
    maps.set(copy, map);
  }
  return map;
}
