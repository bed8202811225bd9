import { type Declaration, readDeclarations, splitOutside } from './declarations.js';

/** What a selector is matched against. */
export interface Subject {
  readonly name: string;
  readonly id: string | null;
  readonly classes: ReadonlySet<string>;
}

/** A compound selector: a type, ids and classes that must all hold. */
interface Selector {
  readonly name: string | null;
  readonly ids: readonly string[];
  readonly classes: readonly string[];
  readonly specificity: number;
}

interface Rule {
  readonly selector: Selector;
  readonly declarations: readonly Declaration[];
  readonly order: number;
}

/** Selectors of states that a drawing on paper is never in. */
const NEVER = /:(?:hover|focus|active|visited|focus-within|focus-visible|target)\b/;
/** Rules held against elements before a hostile sheet is given up; real drawings need some thousands. */
const MOST_COMPARED = 20_000_000;
/** At-rules that say nothing about lines. */
const NO_STYLE = /^@(?:charset|font-face|namespace|keyframes|-webkit-keyframes|page|font-feature-values)\b/;

/**
 * The rules of a drawing's style sheets whose selectors are made of types, classes and ids, by their
 * key so that an element is held against few of them. What else there is goes to `unread`.
 * Sources: Selectors Level 3; CSS Cascading and Inheritance Level 4, "Cascade Sorting Order".
 */
export class StyleSheet {
  private readonly byKey = new Map<string, Rule[]>();
  private readonly classes = new Set<string>();
  private readonly matched = new Map<string, readonly Declaration[]>();
  private order = 0;
  private compared = 0;

  get isEmpty(): boolean {
    return this.byKey.size === 0;
  }

  /** Adds the text of one `style` element; `unread` gets the beginning of each rule left out. */
  add(text: string, unread: (rule: string) => void): void {
    const clean = text.replace(/\/\*[\s\S]*?(?:\*\/|$)/g, ' ').replace(/<!--|-->/g, ' ');
    let at = 0;
    while (at < clean.length) {
      const brace = clean.indexOf('{', at);
      const head = clean.slice(at, brace < 0 ? clean.length : brace).trim();
      const semicolon = head.startsWith('@') ? clean.indexOf(';', at) : -1;
      if (semicolon >= 0 && (brace < 0 || semicolon < brace)) {
        const statement = clean.slice(at, semicolon).trim();
        if (!NO_STYLE.test(statement)) unread(statement);
        at = semicolon + 1;
        continue;
      }
      if (brace < 0) break;
      const end = closingBrace(clean, brace);
      const body = clean.slice(brace + 1, end);
      if (head.startsWith('@')) {
        if (!NO_STYLE.test(head)) unread(head);
      } else this.addRule(head, readDeclarations(body), unread);
      at = end + 1;
    }
  }

  /**
   * Declarations for an element in the order of the cascade, at most two of each property: one
   * important and one not. Elements that the rules cannot tell apart share one list.
   */
  declarationsFor(subject: Subject): readonly Declaration[] {
    const idKey = `#${subject.id ?? ''}`;
    const keys = ['*', subject.name];
    if (subject.id !== null && this.byKey.has(idKey)) keys.push(idKey);
    for (const name of subject.classes) if (this.classes.has(name)) keys.push(`.${name}`);
    const key = keys.join(' ');
    let declarations = this.matched.get(key);
    if (!declarations) {
      declarations = this.match(keys, subject);
      this.matched.set(key, declarations);
    }
    return declarations;
  }

  private match(keys: readonly string[], subject: Subject): Declaration[] {
    const rules: Rule[] = [];
    for (const key of keys) {
      const candidates = this.byKey.get(key) ?? [];
      this.compared += candidates.length;
      if (this.compared > MOST_COMPARED) return [];
      for (const rule of candidates) if (matches(rule.selector, subject)) rules.push(rule);
    }
    rules.sort((a, b) => a.selector.specificity - b.selector.specificity || a.order - b.order);
    const strongest = new Map<string, Declaration>();
    for (const rule of rules) {
      for (const d of rule.declarations) strongest.set(d.important ? `!${d.name}` : d.name, d);
    }
    return [...strongest.values()];
  }

  private addRule(head: string, declarations: readonly Declaration[], unread: (rule: string) => void): void {
    if (declarations.length === 0) return;
    for (const part of splitOutside(head, ',')) {
      const text = part.trim();
      if (NEVER.test(text)) continue;
      const selector = readSelector(text);
      if (!selector) {
        unread(text);
        continue;
      }
      const { ids, classes, name } = selector;
      for (const c of classes) this.classes.add(c);
      const key = ids.length > 0 ? `#${ids[0]}` : classes.length > 0 ? `.${classes[0]}` : (name ?? '*');
      const rules = this.byKey.get(key);
      const rule = { selector, declarations, order: this.order++ };
      if (rules) rules.push(rule);
      else this.byKey.set(key, [rule]);
    }
  }
}

function closingBrace(text: string, brace: number): number {
  let depth = 0;
  for (let at = brace; at < text.length; at++) {
    const c = text.charCodeAt(at);
    if (c === 123) depth++;
    else if (c === 125 && --depth === 0) return at;
  }
  return text.length;
}

function readSelector(text: string): Selector | null {
  const match = /^(\*|[A-Za-z_][\w-]*)?((?:[.#][\w\u0080-\uffff-]+)*)$/.exec(text);
  if (!match || text === '') return null;
  const parts = match[2]!.match(/[.#][^.#]+/g) ?? [];
  const ids = parts.filter((p) => p.startsWith('#')).map((p) => p.slice(1));
  const classes = parts.filter((p) => p.startsWith('.')).map((p) => p.slice(1));
  const name = match[1] === undefined || match[1] === '*' ? null : match[1];
  const specificity = ids.length * 1_000_000 + classes.length * 1000 + (name === null ? 0 : 1);
  return { name, ids, classes, specificity };
}

function matches(selector: Selector, subject: Subject): boolean {
  return (
    (selector.name === null || selector.name === subject.name) &&
    selector.ids.every((id) => id === subject.id) &&
    selector.classes.every((name) => subject.classes.has(name))
  );
}
