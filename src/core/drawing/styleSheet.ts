import { type Declaration, readDeclarations, splitOutside } from './declarations.js';
import { matches, readSelector, type Selector, type Subject } from './selector.js';

interface Rule {
  readonly selector: Selector;
  readonly declarations: readonly Declaration[];
  readonly order: number;
}

/** Selectors of states that a drawing on paper is never in. */
const NEVER = /:(?:hover|focus|active|visited|focus-within|focus-visible|target)\b/;
/** Comparisons with elements before a hostile sheet is given up; real drawings need some thousands. */
export const MOST_COMPARED = 20_000_000;
/** At-rules that say nothing about lines, and media that a drawing as first shown on a screen is not in. */
const NO_STYLE =
  /^@(?:charset|font-face|namespace|keyframes|-webkit-keyframes|page|font-feature-values|media\s+(?:print|\(\s*prefers-color-scheme\s*:\s*dark\s*\))\s*$)/i;
const HOLDS = /^@media\s+(?:all|screen|\(\s*prefers-color-scheme\s*:\s*light\s*\))$/i;
const DEEPEST_MEDIA = 4;

/**
 * The rules of a drawing's style sheets whose selectors `readSelector` reads, by the key of their last
 * compound so that an element is held against few of them. What else there is goes to `unread`.
 * Sources: Selectors Level 3; CSS Cascading and Inheritance Level 4, "Cascade Sorting Order".
 */
export class StyleSheet {
  private readonly byKey = new Map<string, Rule[]>();
  private readonly classes = new Set<string>();
  /** Keys of rules that ask for ancestors. */
  private readonly contextual = new Set<string>();
  private readonly matched = new Map<string, readonly Declaration[]>();
  private order = 0;
  private compared = 0;

  get isEmpty(): boolean {
    return this.byKey.size === 0;
  }

  /** Adds the text of one `style` element; `unread` gets the beginning of each rule left out. */
  add(text: string, unread: (rule: string) => void, depth = 0): void {
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
        if (depth < DEEPEST_MEDIA && HOLDS.test(head)) this.add(body, unread, depth + 1);
        else if (!NO_STYLE.test(head)) unread(head);
      } else this.addRule(head, readDeclarations(body), unread);
      at = end + 1;
    }
  }

  /** Whether rules were given up for want of time. */
  get gaveUp(): boolean {
    return this.compared > MOST_COMPARED;
  }

  /**
   * Declarations for an element in the order of the cascade, at most two of each property: one
   * important and one not. Elements that the rules cannot tell apart share one list, unless their
   * ancestors matter; `ancestors` is asked only then.
   */
  declarationsFor(subject: Subject, ancestors: () => readonly Subject[]): readonly Declaration[] {
    const idKey = `#${subject.id ?? ''}`;
    const keys = ['*', subject.name];
    if (subject.id !== null && this.byKey.has(idKey)) keys.push(idKey);
    for (const name of subject.classes) if (this.classes.has(name)) keys.push(`.${name}`);
    if (keys.some((key) => this.contextual.has(key))) return this.match(keys, [subject, ...ancestors()]);
    const key = keys.join(' ');
    let declarations = this.matched.get(key);
    if (!declarations) {
      declarations = this.match(keys, [subject]);
      this.matched.set(key, declarations);
    }
    return declarations;
  }

  private match(keys: readonly string[], path: readonly Subject[]): Declaration[] {
    const step = (): boolean => ++this.compared <= MOST_COMPARED;
    const rules: Rule[] = [];
    for (const key of keys) {
      for (const rule of this.byKey.get(key) ?? []) {
        if (matches(rule.selector, path, step)) rules.push(rule);
        else if (this.gaveUp) return [];
      }
    }
    rules.sort((a, b) => a.selector.specificity - b.selector.specificity || a.order - b.order);
    const strongest = new Map<string, Declaration>();
    for (const rule of rules) {
      for (const d of rule.declarations) {
        const slot = d.important ? `!${d.name}` : d.name;
        // Taken out first, so that the order of the list is that of the cascade.
        strongest.delete(slot);
        strongest.set(slot, d);
      }
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
      const { ids, classes, name } = selector.compounds[0];
      for (const c of classes) this.classes.add(c);
      const key = ids.length > 0 ? `#${ids[0]}` : classes.length > 0 ? `.${classes[0]}` : (name ?? '*');
      if (selector.compounds.length > 1) this.contextual.add(key);
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
