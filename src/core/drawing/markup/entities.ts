import { Unreadable } from '../findingLog.js';
import type { ReadingLimits } from '../readingLimits.js';
import { isPlainName, isXmlCharacter } from './xmlCharacters.js';

const LONGEST_NAME = 256;
/** A chain of entities deeper than this could overflow the stack. */
const DEEPEST = 64;

const PREDEFINED: ReadonlyMap<string, string> = new Map([
  ['amp', '&'],
  ['lt', '<'],
  ['gt', '>'],
  ['apos', "'"],
  ['quot', '"'],
]);

/** What became of the references in a text. */
export interface Decoded {
  readonly text: string;
  /** First reference that means nothing here, kept as it stands in the text. */
  readonly unknown: string | null;
  /** First reference to an entity that stands in another file, which is never fetched. */
  readonly external: string | null;
  /** First entity whose text holds markup: it has to be read as content, not as text. */
  readonly markup: string | null;
}

/** A reference from `&` to `;`, or null where there is none. */
export function referenceAt(
  text: string,
  at: number,
): { readonly name: string; readonly end: number } | null {
  const end = text.slice(at + 1, at + 2 + LONGEST_NAME).indexOf(';');
  if (end <= 0) return null;
  const name = text.slice(at + 1, at + 1 + end);
  return name.startsWith('#') || isPlainName(name) ? { name, end: at + end + 2 } : null;
}

/**
 * The internal and external general entities of the document type, the five predefined ones, and
 * character references (XML 1.0 §4.1, §4.4, §4.6).
 *
 * Throws Unreadable where an entity contains itself, or where what is added passes the limit in all;
 * each entity is decoded once, so refusing costs no more than the limit.
 */
export class Entities {
  /** Replacement texts by name; null for external entities. */
  private readonly declared = new Map<string, string | null>();
  private readonly decoded = new Map<string, Decoded>();
  private readonly open = new Set<string>();
  private spent = 0;

  constructor(private readonly limits: ReadingLimits) {}

  /** The first declaration of a name is the one that holds (XML 1.0 §4.2). Null: it stands elsewhere. */
  declare(name: string, replacement: string | null): void {
    if (!this.declared.has(name)) this.declared.set(name, replacement);
  }

  /** Replacement text of a declared entity; null where it is external, undefined where there is none. */
  replacementOf(name: string): string | null | undefined {
    return this.declared.get(name);
  }

  decode(text: string): Decoded {
    let at = text.indexOf('&');
    if (at < 0) return plain(text);
    const parts: string[] = [];
    let unknown: string | null = null;
    let external: string | null = null;
    let markup: string | null = null;
    let from = 0;
    for (; at >= 0; at = text.indexOf('&', at)) {
      const reference = referenceAt(text, at);
      const value = reference && this.resolve(reference.name);
      if (!reference || !value) {
        unknown ??= shownReference(text, at);
        at++;
        continue;
      }
      unknown ??= value.unknown;
      external ??= value.external;
      markup ??= value.markup;
      parts.push(text.slice(from, at), value.text);
      at = from = reference.end;
    }
    parts.push(text.slice(from));
    return { text: parts.join(''), unknown, external, markup };
  }

  /** What a reference stands for, all references in it decoded; null where it is not known. */
  resolve(name: string): Decoded | null {
    if (name.startsWith('#')) return characterOf(name);
    const predefined = PREDEFINED.get(name);
    if (predefined !== undefined) return plain(predefined);
    const replacement = this.declared.get(name);
    if (replacement === undefined) return null;
    if (replacement === null) return { ...plain(''), external: name };
    let result = this.decoded.get(name);
    if (!result) {
      this.enter(name);
      result = replacement.includes('<') ? { ...plain(''), markup: name } : this.decode(replacement);
      this.leave(name);
      this.decoded.set(name, result);
    }
    this.spend(name, result.text.length);
    return result;
  }

  /** Before an entity's text is read, so that one that holds itself is found. */
  enter(name: string): void {
    if (this.open.has(name)) throw new Unreadable('entity-loop', null, { entity: name });
    if (this.open.size >= DEEPEST) throw this.tooMuch(name);
    this.open.add(name);
  }

  leave(name: string): void {
    this.open.delete(name);
  }

  /** Counts what is added to the document, and refuses too much of it. */
  spend(name: string, characters: number): void {
    this.spent += characters;
    if (this.spent > this.limits.entityCharacters) throw this.tooMuch(name);
  }

  private tooMuch(entity: string): Unreadable {
    const value = this.limits.entityCharacters;
    return new Unreadable('entity-limit', null, { entity, limit: 'entityCharacters', value });
  }
}

/** A reference that means nothing, as people can find it. */
export function shownReference(text: string, at: number): string {
  const piece = text.slice(at, at + 40);
  const end = piece.indexOf(';');
  return piece.slice(0, end < 0 ? piece.length : end + 1).split(/\s/)[0];
}

function plain(text: string): Decoded {
  return { text, unknown: null, external: null, markup: null };
}

/** The character that `#…` names, or null. */
export function characterOf(name: string): Decoded | null {
  const match = /^#(?:x([0-9a-fA-F]{1,8})|([0-9]{1,10}))$/.exec(name.replace(/^(#x?)0+(?=.)/, '$1'));
  if (!match) return null;
  const code = match[1] === undefined ? Number(match[2]) : Number.parseInt(match[1], 16);
  return isXmlCharacter(code) ? plain(String.fromCodePoint(code)) : null;
}
