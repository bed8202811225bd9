import { afterUnit, splitOutside } from './cssText.js';

/** Custom properties of an element by name, those inherited among them, without var() in them. */
export type CustomValues = ReadonlyMap<string, string>;

/** A text that has grown longer than this by substitution is not valid: it could double without end. */
const LONGEST = 10_000;
const DEEPEST = 16;

/**
 * The custom properties of an element from those of its parent and those declared on it, in which var() is
 * replaced; those that cannot be, or refer to themselves, are not there (CSS Custom Properties for Cascading
 * Variables Module Level 1, §§2 and 3).
 */
export function customValues(
  declared: ReadonlyMap<string, string>,
  parent: CustomValues | null,
): CustomValues {
  const values = new Map(parent ?? []);
  const pending = new Map(declared);
  for (const name of declared.keys()) values.delete(name);
  const resolve = (name: string, depth: number): string | null => {
    const raw = pending.get(name);
    if (raw === undefined || depth > DEEPEST) return values.get(name) ?? null;
    pending.delete(name); // Asked for again inside itself, it has no value.
    const keyword = raw.toLowerCase();
    const value =
      keyword === 'inherit' || keyword === 'unset'
        ? (parent?.get(name) ?? null)
        : keyword === 'initial'
          ? null
          : replaced(raw, (other) => resolve(other, depth + 1), 0);
    if (value !== null) values.set(name, value);
    return value;
  };
  for (const name of declared.keys()) resolve(name, 0);
  return values;
}

/** A value with every var() replaced by what it stands for, or its fallback; null where one has neither. */
export function substituted(value: string, custom: CustomValues | null): string | null {
  return replaced(value, (name) => custom?.get(name) ?? null, 0);
}

function replaced(value: string, textFor: (name: string) => string | null, depth: number): string | null {
  if (depth > DEEPEST) return null;
  let result = '';
  let from = 0;
  for (let at = 0; at < value.length; ) {
    const isCall = /^var\($/i.test(value.slice(at, at + 4)) && !/[\w-]/.test(value[at - 1] ?? ' ');
    if (!isCall) {
      at = afterUnit(value, at);
      continue;
    }
    const end = closing(value, at + 4);
    const [name, ...fallback] = splitOutside(value.slice(at + 4, end), ',');
    if (!name.trim().startsWith('--')) return null;
    let text = textFor(name.trim());
    if (text === null && fallback.length > 0) text = replaced(fallback.join(','), textFor, depth + 1);
    if (text === null) return null;
    result += `${value.slice(from, at)} ${text.trim()} `;
    if (result.length > LONGEST) return null;
    at = end + 1;
    from = at;
  }
  return (result + value.slice(from)).trim();
}

function closing(text: string, from: number): number {
  let depth = 1;
  for (let at = from; at < text.length; ) {
    if (text[at] === '(') depth++;
    else if (text[at] === ')' && --depth === 0) return at;
    at = afterUnit(text, at);
  }
  return text.length;
}
