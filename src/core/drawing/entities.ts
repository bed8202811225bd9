import { Unreadable } from './findingLog.js';

/** Expanded text an entity may add to a document in all; real ones add some hundred characters. */
const LIMIT_CHARACTERS = 4_000_000;

const LONGEST_NAME = 256;

const PREDEFINED: ReadonlyMap<string, string> = new Map([
  ['amp', '&'],
  ['lt', '<'],
  ['gt', '>'],
  ['apos', "'"],
  ['quot', '"'],
]);

/** What became of the references in one value. */
export interface Decoded {
  readonly text: string;
  /** First reference that means nothing here, kept as it stands in the text. */
  readonly unknown: string | null;
  /** First entity whose text holds markup, which is left out: only its text would be wrong. */
  readonly markup: string | null;
}

/**
 * Decodes references: the five predefined entities, character references, and the internal entities
 * of the document type. External entities are never fetched, so they count as unknown.
 *
 * Throws Unreadable where an entity contains itself, or where expansion passes the limit in all; each
 * entity is expanded once, so refusing costs no more than the limit (XML 1.0 §4.1, §4.4).
 */
export class Entities {
  private readonly declared = new Map<string, string>();
  private readonly expanded = new Map<string, Decoded>();
  private readonly open = new Set<string>();
  private spent = 0;

  /** The first declaration of a name is the one that holds (XML 1.0 §4.2). */
  declare(name: string, replacement: string): void {
    if (!this.declared.has(name)) this.declared.set(name, replacement);
  }

  decode(text: string): Decoded {
    let at = text.indexOf('&');
    if (at < 0) return { text, unknown: null, markup: null };
    const parts: string[] = [];
    let unknown: string | null = null;
    let markup: string | null = null;
    let from = 0;
    let end = 0;
    for (; at >= 0; at = text.indexOf('&', at)) {
      if (end >= 0 && end <= at) end = text.indexOf(';', at);
      const name = end < 0 || end - at > LONGEST_NAME ? null : text.slice(at + 1, end);
      const value = name === null ? null : this.replacement(name);
      if (value === null) {
        unknown ??= text.slice(at, Math.min(end < 0 ? text.length : end + 1, at + 40)).split(/\s/)[0];
        at++;
        continue;
      }
      unknown ??= value.unknown;
      markup ??= value.markup;
      parts.push(text.slice(from, at), value.text);
      at = from = end + 1;
    }
    parts.push(text.slice(from));
    return { text: parts.join(''), unknown, markup };
  }

  private replacement(name: string): Decoded | null {
    if (name.startsWith('#')) return characterOf(name);
    const plain = PREDEFINED.get(name);
    if (plain !== undefined) return { text: plain, unknown: null, markup: null };
    const raw = this.declared.get(name);
    if (raw === undefined) return null;
    let result = this.expanded.get(name);
    if (!result) {
      if (this.open.has(name)) throw new Unreadable('entity-loop', null, { entity: name });
      // A chain of entities deeper than this could overflow the stack.
      if (this.open.size >= 64) throw this.tooMuch(name);
      this.open.add(name);
      result = raw.includes('<') ? { text: '', unknown: null, markup: name } : this.decode(raw);
      this.open.delete(name);
      this.expanded.set(name, result);
    }
    this.spent += result.text.length;
    if (this.spent > LIMIT_CHARACTERS) throw this.tooMuch(name);
    return result;
  }

  private tooMuch(entity: string): Unreadable {
    return new Unreadable('entity-limit', null, { entity, limitCharacters: LIMIT_CHARACTERS });
  }
}

function characterOf(name: string): Decoded | null {
  const match = /^#(?:x([0-9a-f]+)|([0-9]+))$/i.exec(name);
  if (!match || name.startsWith('#X')) return null;
  const code = match[1] === undefined ? Number(match[2]) : Number.parseInt(match[1], 16);
  return isXmlCharacter(code) ? { text: String.fromCodePoint(code), unknown: null, markup: null } : null;
}

/** `Char` of XML 1.0 §2.2. */
function isXmlCharacter(code: number): boolean {
  if (code < 32) return code === 9 || code === 10 || code === 13;
  return code <= 0xd7ff || (code >= 0xe000 && code <= 0xfffd) || (code >= 0x10000 && code <= 0x10ffff);
}
