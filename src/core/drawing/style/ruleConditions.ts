import { splitOutside, unescaped } from './cssText.js';

/** null: it depends on what is not known here. */
export type Truth = boolean | null;

const LONGEST = 2000;
const DEEPEST = 16;

/** How a screen in its ordinary state answers (Media Queries Level 5), where the answer needs no window. */
const FEATURES: ReadonlyMap<string, readonly string[]> = new Map([
  ['prefers-color-scheme', ['light']],
  ['prefers-reduced-motion', ['no-preference']],
  ['prefers-reduced-transparency', ['no-preference']],
  ['prefers-reduced-data', ['no-preference']],
  ['prefers-contrast', ['no-preference']],
  ['forced-colors', ['none']],
  ['inverted-colors', ['none']],
  ['hover', ['hover']],
  ['any-hover', ['hover']],
  ['pointer', ['fine']],
  ['any-pointer', ['fine']],
  ['update', ['fast']],
  ['grid', ['0']],
  ['monochrome', ['0']],
  ['scan', ['progressive']],
  ['color-gamut', ['srgb']],
  ['dynamic-range', ['standard']],
  ['scripting', ['enabled']],
]);
/** Those whose ordinary state counts as no, where only their name is asked. */
const FALSE_VALUES: ReadonlySet<string> = new Set(['none', 'no-preference', '0']);

/**
 * Whether a media query list holds on a screen in light mode (Media Queries Level 4); null where it asks for
 * the size of a window or for what is not known here.
 */
export function mediaHolds(text: string): Truth {
  if (text.length > LONGEST) return null;
  if (text.trim() === '') return true;
  return anyOf(splitOutside(text, ',').map((query) => mediaQuery(query.trim().toLowerCase())));
}

function mediaQuery(query: string): Truth {
  const typed = /^(?:(not|only)\s+)?(?!not\b|only\b|and\b|or\b)([a-z][a-z-]*)(?:\s+and\s+(.+))?$/s.exec(
    query,
  );
  if (!typed) return condition(query, mediaFeature, 0);
  const [, modifier, type, rest] = typed;
  const isType = type === 'all' || type === 'screen';
  const holds = isType ? (rest === undefined ? true : condition(rest, mediaFeature, 0)) : false;
  return modifier === 'not' ? not(holds) : holds;
}

function mediaFeature(text: string): Truth {
  const [name, value] = splitOutside(text, ':').map((part) => part.trim());
  if (name === 'color' || name === 'min-color') return true;
  const values = FEATURES.get(name);
  if (!values) return null;
  return value === undefined ? !FALSE_VALUES.has(values[0]) : values.includes(value);
}

/**
 * Whether an `@supports` condition holds (CSS Conditional Rules Module Level 4); `declared` says whether a
 * declaration is one that browsers read, `selects` the same of a selector.
 */
export function supportHolds(
  text: string,
  declared: (name: string, value: string) => Truth,
  selects: (selector: string) => Truth,
): Truth {
  if (text.length > LONGEST) return null;
  return condition(
    text.trim(),
    (leaf) => {
      const colon = leaf.indexOf(':');
      return colon < 0 ? null : declared(leaf.slice(0, colon).trim(), leaf.slice(colon + 1).trim());
    },
    0,
    (name, argument) => (name === 'selector' ? selects(unescaped(argument)) : null),
  );
}

type Leaf = (text: string) => Truth;
type Call = (name: string, argument: string) => Truth;

/** `not`, `and` and `or` over what stands in brackets; and and or are not mixed. */
function condition(text: string, leaf: Leaf, depth: number, call: Call = () => null): Truth {
  if (depth > DEEPEST) return null;
  const parts = bracketed(text);
  if (!parts) return null;
  const [first, ...rest] = parts;
  const inner = (part: string): Truth => inBrackets(part, leaf, depth + 1, call);
  if (/^not$/i.test(first)) return rest.length === 1 ? not(inner(rest[0])) : null;
  const operands = parts.filter((_, i) => i % 2 === 0).map(inner);
  const words = new Set(parts.filter((_, i) => i % 2 === 1).map((word) => word.toLowerCase()));
  if (words.size > 1 || parts.length % 2 === 0) return null;
  if (words.size === 0 || words.has('and')) return not(anyOf(operands.map(not)));
  return words.has('or') ? anyOf(operands) : null;
}

function inBrackets(part: string, leaf: Leaf, depth: number, call: Call): Truth {
  const named = /^([a-z-]*)\((.*)\)$/is.exec(part);
  if (!named) return null;
  const inside = named[2].trim();
  if (named[1] !== '') return call(named[1].toLowerCase(), inside);
  const nested = /^(?:not\b|\()/i.test(inside) && !/^[a-z-]+\s*:/i.test(inside);
  return nested ? condition(inside, leaf, depth, call) : leaf(inside);
}

/** Words and bracketed parts by turns; null where brackets do not pair. */
function bracketed(text: string): string[] | null {
  const parts: string[] = [];
  let from = 0;
  let depth = 0;
  for (let at = 0; at < text.length; at++) {
    const c = text[at];
    if (c === '(') depth++;
    else if (c === ')' && --depth === 0) {
      parts.push(text.slice(from, at + 1).trim());
      from = at + 1;
    } else if (depth === 0 && /\s/.test(c)) {
      const word = text.slice(from, at).trim();
      if (word !== '') parts.push(word);
      from = at + 1;
    }
    if (depth < 0) return null;
  }
  return depth === 0 && text.slice(from).trim() === '' && parts.length > 0 ? parts : null;
}

function not(truth: Truth): Truth {
  return truth === null ? null : !truth;
}

function anyOf(truths: readonly Truth[]): Truth {
  if (truths.includes(true)) return true;
  return truths.includes(null) ? null : false;
}
