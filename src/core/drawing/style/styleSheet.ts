import type { SvgElement } from '../markup/svgTree.js';
import type { Declaration } from './declarations.js';
import type { Selector, Test } from './selector.js';
import type { SelectorMatcher } from './selectorMatcher.js';
import { type Layer, type Rule, type SheetFindings, SheetReader } from './sheetReader.js';

/**
 * The rules of a drawing's style sheets by the key of their last compound, so that an element is held
 * against few of them. Sources: Selectors Level 4; CSS Cascading and Inheritance Level 5, §6, "Cascading".
 */
export class StyleSheet {
  /** Whether a rule declares a custom property. */
  hasCustom = false;
  private readonly reader: SheetReader;
  private readonly byKey = new Map<string, Rule[]>();
  private readonly classes = new Set<string>();
  /** Keys of rules that ask for more than type, classes and id. */
  private readonly contextual = new Set<string>();
  private readonly matched = new Map<string, readonly Declaration[]>();

  constructor(findings: SheetFindings) {
    this.reader = new SheetReader(findings);
  }

  get isEmpty(): boolean {
    return this.byKey.size === 0;
  }

  /** Adds the text of one `style` element. */
  add(text: string): void {
    const before = this.reader.rules.length;
    this.reader.read(text);
    for (const rule of this.reader.rules.slice(before)) this.index(rule);
  }

  /**
   * Declarations for an element in the order of the cascade, at most two of each property: one important
   * and one not. Elements that the rules cannot tell apart share one list.
   */
  declarationsFor(
    element: SvgElement,
    id: string | null,
    top: SvgElement | null,
    matcher: SelectorMatcher,
  ): readonly Declaration[] {
    const keys = ['*', element.name];
    const idKey = `#${id ?? ''}`;
    if (id !== null && this.byKey.has(idKey)) keys.push(idKey);
    if (this.classes.size > 0) {
      for (const name of matcher.classesOf(element)) if (this.classes.has(name)) keys.push(`.${name}`);
    }
    if (keys.some((key) => this.contextual.has(key))) return this.match(keys, element, top, matcher);
    const key = keys.join(' ');
    let declarations = this.matched.get(key);
    if (!declarations) {
      declarations = this.match(keys, element, top, matcher);
      this.matched.set(key, declarations);
    }
    return declarations;
  }

  private match(
    keys: readonly string[],
    element: SvgElement,
    top: SvgElement | null,
    matcher: SelectorMatcher,
  ): Declaration[] {
    const rules: Rule[] = [];
    for (const key of keys) {
      for (const rule of this.byKey.get(key) ?? []) {
        if (matcher.matches(rule.selector, element, top)) rules.push(rule);
        else if (matcher.compared > matcher.most) return [];
      }
    }
    return sorted(rules);
  }

  private index(rule: Rule): void {
    const { selector, declarations } = rule;
    if (declarations.length === 0) return;
    this.hasCustom ||= declarations.some(({ name }) => name.startsWith('--'));
    const [last] = selector.compounds;
    for (const test of last) if (test.kind === 'class') this.classes.add(test.name);
    const key = keyOf(last);
    if (!isPlain(selector)) this.contextual.add(key);
    const rules = this.byKey.get(key);
    if (rules) rules.push(rule);
    else this.byKey.set(key, [rule]);
  }
}

function keyOf(tests: readonly Test[]): string {
  let key = '*';
  for (const test of tests) {
    if (test.kind === 'id') return `#${test.id}`;
    if (test.kind === 'class' && !key.startsWith('.')) key = `.${test.name}`;
    else if (test.kind === 'type' && key === '*') key = test.name;
  }
  return key;
}

/** Whether what the keys of an element are tells if it matches. */
function isPlain(selector: Selector): boolean {
  return (
    selector.compounds.length === 1 &&
    selector.compounds[0].every(({ kind }) => ['type', 'id', 'class', 'always'].includes(kind))
  );
}

/** What stands for one property, layer by layer: the last entry is that of the strongest layer so far. */
type Standing = { readonly layer: Layer; declaration: Declaration | null }[];

/** Layers turn round for what is important; specificity and order come after them. */
function sorted(rules: Rule[]): Declaration[] {
  const plain = new Map<string, Standing>();
  cascaded(rules, false, plain, (standing) => standing.pop());
  const important = new Map<string, Standing>();
  cascaded(rules, true, important, (standing, { name }, layer) => {
    // Back before the same layer in what is not important, and nothing important stands.
    standing.length = 0;
    const weaker = plain.get(name)?.filter((entry) => entry.layer.rank < layer.rank);
    if (weaker) plain.set(name, weaker);
  });
  return [...plain.values(), ...important.values()].flatMap(
    (standing) => standing[standing.length - 1]?.declaration ?? [],
  );
}

/** `goBack` takes a layer away again, the last of those that stand (CSS Cascade Level 5, "revert-layer"). */
function cascaded(
  rules: Rule[],
  important: boolean,
  strongest: Map<string, Standing>,
  goBack: (standing: Standing, declaration: Declaration, layer: Layer) => void,
): void {
  const sign = important ? -1 : 1;
  rules.sort(
    (a, b) =>
      sign * (a.layer.rank - b.layer.rank) ||
      a.selector.specificity - b.selector.specificity ||
      a.order - b.order,
  );
  for (const { declarations, layer } of rules) {
    for (const d of declarations) {
      if (d.important !== important) continue;
      const standing = strongest.get(d.name) ?? [];
      // Taken out first, so that the order of the list is that of the cascade.
      strongest.delete(d.name);
      strongest.set(d.name, standing);
      if (standing[standing.length - 1]?.layer !== layer) standing.push({ layer, declaration: null });
      if (d.kind === 'wide' && d.value === 'revert-layer') goBack(standing, d, layer);
      else standing[standing.length - 1].declaration = d;
    }
  }
}
