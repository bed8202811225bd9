import type { Place } from '../finding.js';
import { AttributeTable } from './attributeTable.js';
import { Column } from './column.js';
import { skipDoctype } from './doctype.js';
import { Entities } from './entities.js';
import { type FindingLog, Unreadable } from './findingLog.js';
import type { LineIndex } from './lineIndex.js';
import { LongText } from './longText.js';

/** Elements may stand this deep in one another; drawings stay below 50. */
const DEEPEST = 1024;
const NO_PLACE = { element: null, id: null };
/** Names that svg-parser takes as they are; `__` is kept for our own placeholders (and so `__proto__`). */
const PLAIN_NAME = /^(?!__)[A-Za-z0-9:_-]+$/;
const NAME_START = /[A-Za-z_:\u0080-\uffff]/;
// biome-ignore lint/suspicious/noControlCharactersInRegex: the ones XML 1.0 §2.2 forbids are looked for.
const FORBIDDEN = /[\0-\x08\x0b\x0c\x0e-\x1f\ufffe\uffff]/;

/**
 * Well-formed markup with everything taken out that svg-parser would misread or choke on: each
 * element has one attribute, its number; texts are `v0`, `v1`, …; odd tag names `__0`, `__1`, …; no
 * prolog, comment, CDATA section, processing instruction or reference is left.
 */
export interface Skeleton {
  readonly markup: string;
  readonly texts: readonly string[];
  readonly oddNames: readonly string[];
  /** By the elements' numbers, which follow document order. */
  readonly attributes: AttributeTable;
  /** Offset of each element's `<` in the text. */
  readonly starts: Readonly<Uint32Array>;
}

/**
 * Checks the text's well-formedness (XML 1.0: one root, tags balanced, attributes quoted and unique,
 * legal characters) and makes its skeleton. Throws Unreadable with the line and column otherwise.
 * Cost: O(text); attribute values are slices, not copies.
 */
export function scanMarkup(text: string, lines: LineIndex, log: FindingLog): Skeleton {
  return new MarkupScan(text, lines, log).run();
}

class MarkupScan {
  private at = 0;
  private nextLess = -1;
  private nextAmpersand = -1;
  private readonly markup = new LongText();
  private pendingText = '';
  private rootDone = false;
  private readonly texts: string[] = [];
  private readonly attributes: AttributeTable;
  private readonly oddNames: string[] = [];
  private readonly placeholders = new Map<string, string>();
  private readonly starts = new Column();
  private readonly open: string[] = [];
  private readonly openStarts: number[] = [];
  private readonly entities = new Entities();

  constructor(
    private readonly text: string,
    private readonly lines: LineIndex,
    private readonly log: FindingLog,
  ) {
    this.attributes = new AttributeTable(text);
  }

  run(): Skeleton {
    this.checkBeginning();
    const { text } = this;
    while (this.at < text.length) {
      const less = text.indexOf('<', this.at);
      this.takeText(text.slice(this.at, less < 0 ? text.length : less), true);
      if (less < 0) break;
      this.at = less;
      const c = text[less + 1];
      if (c === '/') this.closeTag();
      else if (c === '?') this.skipTo('?>', 'processing instruction');
      else if (c === '!') this.declaration();
      else this.openTag();
    }
    if (this.open.length > 0) throw this.cutOff('element');
    if (!this.rootDone) throw this.fail('not-xml', 0, { found: text.trim().slice(0, 20) });
    const { texts, oddNames, attributes, starts } = this;
    return { markup: this.markup.finish(), texts, oddNames, attributes, starts: starts.values };
  }

  private checkBeginning(): void {
    if (this.text.charCodeAt(0) === 0xfeff) this.at = 1;
    const first = this.text.slice(this.at).search(/\S/);
    if (first < 0) throw new Unreadable('empty-input', null);
    if (this.text[this.at + first] !== '<') {
      // biome-ignore lint/suspicious/noControlCharactersInRegex: kept out of what people will read.
      const found = this.text.slice(this.at + first, this.at + first + 20).replace(/[\0-\x1f\ufffd]/g, '?');
      throw this.fail('not-xml', this.at + first, { found });
    }
    const bad = this.text.search(FORBIDDEN);
    if (bad >= 0) throw this.fail('xml-bad-character', bad, { codePoint: this.text.charCodeAt(bad) });
  }

  private takeText(raw: string, decode: boolean): void {
    if (raw === '' || !/\S/.test(raw)) return;
    if (this.open.length === 0) {
      throw this.fail('xml-text-outside-root', this.at, { found: raw.trim().slice(0, 20) });
    }
    this.pendingText += decode ? this.decode(raw) : raw;
  }

  /** Writes the text gathered since the last tag: comments between do not part it. */
  private flushText(): void {
    if (this.pendingText === '') return;
    this.markup.add(`v${this.texts.push(this.pendingText) - 1}`);
    this.pendingText = '';
  }

  private declaration(): void {
    const { text, at } = this;
    if (text.startsWith('<!--', at)) this.skipTo('-->', 'comment', 4);
    else if (text.startsWith('<![CDATA[', at)) {
      const end = text.indexOf(']]>', at);
      if (end < 0) throw this.cutOff('CDATA section');
      this.takeText(text.slice(at + 9, end), false);
      this.at = end + 3;
    } else if (text.startsWith('<!DOCTYPE', at) && this.starts.length === 0) {
      const end = skipDoctype(text, at, this.entities);
      if (end < 0) throw this.cutOff('document type');
      this.at = end;
    } else if (text.length - at < 9) throw this.cutOff('tag');
    else throw this.fail('xml-bad-tag', at);
  }

  private skipTo(mark: string, inside: string, past = 2): void {
    const end = this.text.indexOf(mark, this.at + past);
    if (end < 0) throw this.cutOff(inside);
    this.at = end + mark.length;
  }

  private closeTag(): void {
    const start = this.at;
    this.at += 2;
    const name = this.name();
    this.skipSpace();
    if (this.at >= this.text.length) throw this.cutOff('tag');
    if (name === '' || this.text[this.at] !== '>') throw this.fail('xml-bad-tag', start);
    const expected = this.open.pop();
    this.openStarts.pop();
    if (expected === undefined) throw this.fail('xml-unopened-tag', start, { found: name });
    if (expected !== name) throw this.fail('xml-tag-mismatch', start, { expected, found: name });
    this.at++;
    this.flushText();
    this.markup.add(`</${this.plainName(name)}>`);
    if (this.open.length === 0) this.rootDone = true;
  }

  private openTag(): void {
    const { text } = this;
    const start = this.at++;
    const name = this.name();
    if (this.at >= text.length) throw this.cutOff('tag', start);
    if (name === '') throw this.fail('xml-bad-tag', start);
    if (this.rootDone) throw this.fail('xml-two-roots', start, { found: name });
    if (this.open.length >= DEEPEST) throw this.fail('xml-too-deep', start, { limit: DEEPEST });
    this.flushText();
    this.markup.add(`<${this.plainName(name)} n="e${this.starts.push(start)}"`);
    this.attributes.beginElement();
    for (;;) {
      const before = this.at;
      this.skipSpace();
      if (this.at >= text.length) throw this.cutOff('tag', start);
      const c = text[this.at];
      if (c === '>') {
        this.open.push(name);
        this.openStarts.push(start);
        this.at++;
        this.markup.add('>');
        return;
      }
      if (c === '/') {
        if (this.at + 1 >= text.length) throw this.cutOff('tag', start);
        if (text[this.at + 1] !== '>') throw this.fail('xml-bad-tag', start);
        this.at += 2;
        this.markup.add('/>');
        if (this.open.length === 0) this.rootDone = true;
        return;
      }
      if (this.at === before) throw this.fail('xml-bad-tag', start);
      this.attribute(start);
    }
  }

  private attribute(tagStart: number): void {
    const { text } = this;
    const start = this.at;
    const name = this.name();
    this.skipSpace();
    const hasEquals = text[this.at] === '=';
    if (hasEquals) this.at++;
    this.skipSpace();
    if (this.at >= text.length) throw this.cutOff('tag', tagStart);
    const quote = text[this.at];
    if (name === '') throw this.fail('xml-bad-tag', tagStart);
    if (!hasEquals || (quote !== '"' && quote !== "'")) {
      throw this.fail('xml-bad-attribute', start, { attribute: name });
    }
    const from = this.at + 1;
    const end = text.indexOf(quote, from);
    if (this.nextLess < from) this.nextLess = this.nextOf('<', from);
    // A `<` inside a value most often means that the closing quote is missing.
    if (end >= 0 ? this.nextLess < end : this.nextLess < text.length) {
      throw this.fail('xml-bad-attribute', start, { attribute: name });
    }
    if (end < 0) throw this.cutOff('attribute', tagStart);
    const number = this.attributes.numberOf(name);
    if (this.attributes.isRepeated(number)) {
      throw this.fail('xml-duplicate-attribute', start, { attribute: name });
    }
    if (this.nextAmpersand < from) this.nextAmpersand = this.nextOf('&', from);
    if (this.nextAmpersand > end) this.attributes.add(number, from, end);
    else this.attributes.addDecoded(number, this.decode(text.slice(from, end)));
    this.at = end + 1;
  }

  private nextOf(character: string, from: number): number {
    const at = this.text.indexOf(character, from);
    return at < 0 ? this.text.length : at;
  }

  private name(): string {
    const { text } = this;
    const start = this.at;
    if (!NAME_START.test(text[start] ?? '')) return '';
    let at = start + 1;
    while (at < text.length && !endsName(text.charCodeAt(at))) at++;
    this.at = at;
    return text.slice(start, at);
  }

  private skipSpace(): void {
    for (;;) {
      const c = this.text.charCodeAt(this.at);
      if (c !== 32 && c !== 10 && c !== 9 && c !== 13) return;
      this.at++;
    }
  }

  private plainName(name: string): string {
    let plain = this.placeholders.get(name);
    if (plain === undefined) {
      plain = name;
      if (!PLAIN_NAME.test(name)) plain = `__${this.oddNames.push(name) - 1}`;
      this.placeholders.set(name, plain);
    }
    return plain;
  }

  private decode(raw: string): string {
    if (raw.indexOf('&') < 0) return raw;
    const start = this.at;
    const place = (): Place => this.placeAt(start);
    try {
      const { text, unknown, markup } = this.entities.decode(raw);
      if (unknown !== null) this.log.add('unknown-entity', place, { entity: unknown });
      if (markup !== null) this.log.add('entity-with-markup', place, { entity: markup });
      return text;
    } catch (error) {
      if (error instanceof Unreadable) throw new Unreadable(error.code, place(), error.values);
      throw error;
    }
  }

  private placeAt(offset: number): Place {
    return { ...NO_PLACE, ...this.lines.locate(offset) };
  }

  private fail(code: Unreadable['code'], offset: number, values = {}): Unreadable {
    return new Unreadable(code, this.placeAt(offset), values);
  }

  /** The text ends too early; the place is its end, and what is begun and not ended stands in the values. */
  private cutOff(inside: string, start?: number): Unreadable {
    const begun = this.lines.locate(start ?? (inside === 'element' ? this.openStarts.at(-1)! : this.at));
    const place = { ...this.placeAt(this.text.length), element: this.open.at(-1) ?? null };
    return new Unreadable('xml-cut-off', place, {
      inside,
      open: this.open.length,
      startLine: begun.line,
      startColumn: begun.column,
    });
  }
}

/** Whitespace, or one of `" ' / < = >`. */
function endsName(c: number): boolean {
  return (
    c === 32 || c === 62 || c === 61 || c === 47 || c === 60 || c === 34 || c === 39 || (c <= 13 && c >= 9)
  );
}
