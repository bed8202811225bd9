import type { SvgElement, SvgTree } from '../markup/svgTree.js';
import { DEFAULT_LIMITS } from '../readingLimits.js';
import type { AttributeTest, NthTest, Selector, Test } from './selector.js';
import { Siblings } from './siblings.js';

/**
 * Holds elements against selectors (Selectors Level 4), and counts the comparisons, so that a hostile sheet
 * comes to an end.
 */
export class SelectorMatcher {
  /** Comparisons made so far. */
  compared = 0;
  /** Comparisons after which nothing matches any more. */
  readonly most: number;
  private readonly siblings: Siblings;
  private readonly classes = new Map<SvgElement, ReadonlySet<string>>();
  /** What a `use` copies around the element: the top of what selectors see; null outside copies. */
  private top: SvgElement | null = null;
  private anchor: SvgElement | null = null;

  constructor(
    private readonly tree: SvgTree,
    most: number = DEFAULT_LIMITS.styleComparisons,
  ) {
    this.siblings = new Siblings(tree.elementCount);
    this.most = most + 50 * tree.elementCount;
  }

  matches(selector: Selector, element: SvgElement, top: SvgElement | null): boolean {
    this.top = top;
    return this.from(selector, 0, element);
  }

  classesOf(element: SvgElement): ReadonlySet<string> {
    let classes = this.classes.get(element);
    if (!classes) {
      const text = this.tree.attributeOf(element, 'class')?.trim();
      classes = new Set(text ? text.split(/\s+/) : []);
      this.classes.set(element, classes);
    }
    return classes;
  }

  private from(selector: Selector, at: number, element: SvgElement): boolean {
    if (++this.compared > this.most) return false;
    for (const test of selector.compounds[at]) if (!this.holds(test, element)) return false;
    if (at + 1 === selector.compounds.length) return true;
    const combinator = selector.combinators[at];
    if (combinator === '>' || combinator === ' ') {
      for (let e = this.parentOf(element); e !== null; e = this.parentOf(e)) {
        if (this.from(selector, at + 1, e)) return true;
        if (combinator === '>') return false;
      }
      return false;
    }
    const parent = this.parentOf(element);
    if (parent === null) return false;
    const family = this.siblings.in(parent);
    for (let i = this.siblings.indexOf(element, parent) - 1; i >= 0; i--) {
      if (this.from(selector, at + 1, family[i])) return true;
      if (combinator === '+') return false;
    }
    return false;
  }

  private parentOf(element: SvgElement): SvgElement | null {
    return element === this.top ? null : element.parent;
  }

  private some(list: readonly Selector[], element: SvgElement): boolean {
    return list.some((selector) => this.from(selector, 0, element));
  }

  private holds(test: Test, element: SvgElement): boolean {
    switch (test.kind) {
      case 'type':
        return element.name === test.name;
      case 'namespace':
        return element.isSvg === test.isSvg;
      case 'id':
        return this.tree.attributeOf(element, 'id') === test.id;
      case 'class':
        return this.classesOf(element).has(test.name);
      case 'attribute':
        return this.attribute(test, element);
      case 'nth':
        return this.nth(test, element);
      case 'is':
        return this.some(test.list, element) !== test.negated;
      case 'has':
        return this.has(test.list, test.besides, element);
      case 'lang':
        return this.lang(test.ranges, element);
      case 'anchor':
        return element === this.anchor;
      case 'root':
        return element === this.tree.root;
      case 'empty':
        return element.children.every((child) => child === '');
      case 'link':
        return element.name === 'a' && element.isSvg && this.hasHref(element);
      case 'always':
        return true;
      case 'never':
        return false;
    }
  }

  private hasHref(element: SvgElement): boolean {
    const { tree } = this;
    return tree.attributeOf(element, 'href') !== null || tree.attributeOf(element, 'xlink:href') !== null;
  }

  private attribute(test: AttributeTest, element: SvgElement): boolean {
    if (!test.anyPrefix) {
      const value = this.tree.attributeOf(element, test.name);
      return value !== null && valueHolds(test, value);
    }
    const { attributes } = this.tree;
    for (let i = attributes.begin(element.number), end = attributes.end(element.number); i < end; i++) {
      const name = attributes.nameAt(i);
      const isIt = name === test.name || name.endsWith(`:${test.name}`);
      if (isIt && valueHolds(test, attributes.valueAt(i))) return true;
    }
    return false;
  }

  private nth({ a, b, fromEnd, ofType, of }: NthTest, element: SvgElement): boolean {
    if (of && !this.some(of, element)) return false;
    const parent = this.parentOf(element);
    const place = parent === null ? 1 : this.placeOf(element, parent, fromEnd, ofType, of);
    const steps = place - b;
    return a === 0 ? steps === 0 : steps % a === 0 && steps / a >= 0;
  }

  private placeOf(
    element: SvgElement,
    parent: SvgElement,
    fromEnd: boolean,
    ofType: boolean,
    of: readonly Selector[] | null,
  ): number {
    if (ofType) return this.siblings.placeOfType(element, parent, fromEnd);
    const family = this.siblings.in(parent);
    const index = this.siblings.indexOf(element, parent);
    if (!of) return fromEnd ? family.length - index : index + 1;
    let place = 1;
    const step = fromEnd ? 1 : -1;
    for (let i = index + step; i >= 0 && i < family.length; i += step) {
      if (this.some(of, family[i])) place++;
    }
    return place;
  }

  private has(list: readonly Selector[], besides: boolean, element: SvgElement): boolean {
    const outer = this.anchor;
    this.anchor = element;
    const found = this.anyBelow(list, element) || (besides && this.anyBeside(list, element));
    this.anchor = outer;
    return found;
  }

  private anyBelow(list: readonly Selector[], element: SvgElement): boolean {
    const pending: SvgElement[] = [...this.siblings.in(element)];
    while (this.compared <= this.most) {
      const next = pending.pop();
      if (!next) break;
      if (this.some(list, next)) return true;
      for (const child of this.siblings.in(next)) pending.push(child);
    }
    return false;
  }

  private anyBeside(list: readonly Selector[], element: SvgElement): boolean {
    const parent = this.parentOf(element);
    if (parent === null) return false;
    const family = this.siblings.in(parent);
    for (let i = this.siblings.indexOf(element, parent) + 1; i < family.length; i++) {
      if (this.some(list, family[i]) || this.anyBelow(list, family[i])) return true;
    }
    return false;
  }

  /** RFC 4647, §3.3.1, "Basic Filtering". */
  private lang(ranges: readonly string[], element: SvgElement): boolean {
    for (let e: SvgElement | null = element; e !== null; e = this.parentOf(e)) {
      const given = this.tree.attributeOf(e, 'xml:lang') ?? this.tree.attributeOf(e, 'lang');
      if (given === null) continue;
      const tag = given.toLowerCase();
      return ranges.some(
        (range) => (range === '*' && tag !== '') || tag === range || tag.startsWith(`${range}-`),
      );
    }
    return false;
  }
}

function valueHolds({ operator, value: asked, ignoreCase }: AttributeTest, given: string): boolean {
  const value = ignoreCase ? given.toLowerCase() : given;
  const wanted = ignoreCase ? asked.toLowerCase() : asked;
  switch (operator) {
    case '':
      return true;
    case '=':
      return value === wanted;
    case '~=':
      return wanted !== '' && value.split(/\s+/).includes(wanted);
    case '|=':
      return value === wanted || value.startsWith(`${wanted}-`);
    case '^=':
      return wanted !== '' && value.startsWith(wanted);
    case '$=':
      return wanted !== '' && value.endsWith(wanted);
    case '*=':
      return wanted !== '' && value.includes(wanted);
  }
}
