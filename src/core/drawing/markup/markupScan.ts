import type { Column } from '../column.js';
import type { Unreadable } from '../findingLog.js';
import type { ReadingLimits } from '../readingLimits.js';
import { AttributeDefaults } from './attributeDefaults.js';
import type { AttributeTable } from './attributeTable.js';
import { readDoctype } from './doctype.js';
import { readBeginning } from './documentBeginning.js';
import { Entities, referenceAt, shownReference } from './entities.js';
import type { MarkupLexer } from './markupLexer.js';
import { reportReferences, withPlace } from './referencePlaces.js';
import type { SkeletonWriter } from './skeleton.js';
import { isBlank } from './xmlCharacters.js';

/** What the scan writes, by the elements' numbers, which follow document order. */
export interface Scanned {
  readonly writer: SkeletonWriter;
  readonly attributes: AttributeTable;
  /** Offset of each element's `<` in the document. */
  readonly starts: Column;
}

/**
 * Checks the text's well-formedness (XML 1.0: one root, tags balanced, attributes quoted and unique,
 * legal names and characters), expands its entities and writes its skeleton. Throws Unreadable with the
 * line and column otherwise. Cost: O(text); attribute values are slices, not copies.
 */
export function scanMarkup(lexer: MarkupLexer, limits: ReadingLimits, out: Scanned): void {
  new MarkupScan(lexer, limits, out).run();
}

class MarkupScan {
  private pendingText = '';
  private rootDone = false;
  private hasDoctype = false;
  /** Elements open where the text being read began: an entity cannot close them. */
  private floor = 0;
  private readonly entities: Entities;
  private readonly defaults = new AttributeDefaults();

  constructor(
    private readonly lexer: MarkupLexer,
    private readonly limits: ReadingLimits,
    private readonly out: Scanned,
  ) {
    this.entities = new Entities(limits);
  }

  run(): void {
    const { lexer } = this;
    readBeginning(lexer);
    this.content();
    if (lexer.open.length > 0) throw lexer.cutOff('element');
    if (!this.rootDone) throw lexer.fail('not-xml', 0, { found: lexer.text.trim().slice(0, 20) });
    this.out.writer.finish();
  }

  private content(): void {
    const { lexer } = this;
    while (lexer.at < lexer.text.length) {
      const from = lexer.at;
      const less = lexer.lessFrom(from);
      if (less > from) this.takeText(from, less);
      lexer.at = less;
      if (less === lexer.text.length) return;
      const c = lexer.text.charCodeAt(less + 1);
      if (c === 47) this.closeTag();
      else if (c === 63) lexer.instruction();
      else if (c === 33) this.declaration();
      else this.openTag();
    }
  }

  private takeText(from: number, to: number): void {
    const { lexer } = this;
    if (isBlank(lexer.text, from, to)) return;
    const raw = lexer.text.slice(from, to);
    this.checkInside(raw);
    const misplaced = raw.indexOf(']]>');
    if (misplaced >= 0) lexer.notStrict(']]> in text', from + misplaced);
    if (lexer.ampersandFrom(from) >= to) this.pendingText += raw;
    else this.takeReferences(raw, from);
  }

  private checkInside(raw: string): void {
    if (this.lexer.open.length > 0) return;
    throw this.lexer.fail('xml-text-outside-root', this.lexer.at, { found: raw.trim().slice(0, 20) });
  }

  /** Text with references: an entity that holds markup is read where its reference stands. */
  private takeReferences(raw: string, offset: number): void {
    let from = 0;
    for (let at = raw.indexOf('&'); at >= 0; at = raw.indexOf('&', at)) {
      const reference = referenceAt(raw, at);
      const value = withPlace(
        this.lexer,
        offset + at,
        () => reference && this.entities.resolve(reference.name),
      );
      if (!reference || !value) {
        reportReferences(this.lexer, { unknown: shownReference(raw, at), external: null }, offset + at);
        at++;
        continue;
      }
      this.pendingText += raw.slice(from, at);
      if (value.markup === null) this.pendingText += value.text;
      else this.expand(reference.name, offset + at);
      reportReferences(this.lexer, value, offset + at);
      at = from = reference.end;
    }
    this.pendingText += raw.slice(from);
  }

  /** Reads an entity's text as content; it must be balanced in itself (XML 1.0 §4.3.2). */
  private expand(name: string, offset: number): void {
    const { lexer, entities, floor } = this;
    const text = entities.replacementOf(name) ?? '';
    withPlace(this.lexer, offset, () => {
      entities.enter(name);
      entities.spend(name, text.length);
    });
    lexer.enter(text, offset);
    this.floor = lexer.open.length;
    this.content();
    if (lexer.open.length > this.floor) throw lexer.fail('xml-bad-entity', 0, { entity: name });
    this.floor = floor;
    lexer.leave();
    entities.leave(name);
  }

  /** Writes the text gathered since the last tag: comments between do not part it. */
  private flushText(): void {
    if (this.pendingText === '') return;
    this.out.writer.text(this.pendingText);
    this.pendingText = '';
  }

  private declaration(): void {
    const { lexer } = this;
    const { text, at } = lexer;
    if (lexer.startsWith('<!--')) lexer.comment();
    else if (lexer.startsWith('<![CDATA[')) {
      const end = text.indexOf(']]>', at);
      if (end < 0) throw lexer.cutOff('CDATA section');
      const raw = text.slice(at + 9, end);
      this.checkInside(raw);
      this.pendingText += raw;
      lexer.at = end + 3;
    } else if (lexer.startsWith('<!DOCTYPE') && !this.hasDoctype && this.out.starts.length === 0) {
      this.hasDoctype = true;
      readDoctype(lexer, this.entities, this.defaults);
    } else if (text.length - at < 9 && !lexer.isAside) throw lexer.cutOff('tag');
    else throw lexer.fail('xml-bad-tag', at);
  }

  private closeTag(): void {
    const { lexer } = this;
    const start = lexer.at;
    lexer.at += 2;
    const name = lexer.name();
    lexer.skipSpace();
    if (lexer.at >= lexer.text.length) throw lexer.cutOff('tag');
    if (name === '' || lexer.text.charCodeAt(lexer.at) !== 62) throw lexer.fail('xml-bad-tag', start);
    if (lexer.open.length === this.floor) throw lexer.fail('xml-unopened-tag', start, { found: name });
    const expected = lexer.open.pop();
    const opened = lexer.openStarts.pop() ?? start;
    if (expected !== name) {
      const { line: openedLine, column: openedColumn } = lexer.placeAt(opened);
      throw lexer.fail('xml-tag-mismatch', start, { expected, found: name, openedLine, openedColumn });
    }
    lexer.at++;
    this.flushText();
    this.out.writer.end();
    if (lexer.open.length === 0) this.rootDone = true;
  }

  private openTag(): void {
    const { lexer } = this;
    const { text } = lexer;
    const { writer, attributes, starts } = this.out;
    const start = lexer.at++;
    const name = lexer.name();
    if (lexer.at >= text.length) throw lexer.cutOff('tag', start);
    if (name === '') throw lexer.fail('xml-bad-tag', start);
    const tag = writer.tagName(name);
    if (tag === null) throw lexer.fail('xml-bad-tag', start);
    if (this.rootDone) throw lexer.fail('xml-two-roots', start, { found: name });
    this.checkLimits(start);
    this.flushText();
    starts.push(lexer.offsetOf(start));
    attributes.beginElement();
    for (;;) {
      const spaced = lexer.skipSpace();
      if (lexer.at >= text.length) throw lexer.cutOff('tag', start);
      const c = text.charCodeAt(lexer.at);
      if (c === 62) {
        lexer.at++;
        this.addDefaults(name, start);
        lexer.open.push(name);
        lexer.openStarts.push(start);
        writer.start(tag);
        return;
      }
      if (c === 47) {
        if (lexer.at + 1 >= text.length) throw lexer.cutOff('tag', start);
        if (text.charCodeAt(lexer.at + 1) !== 62) throw lexer.fail('xml-bad-tag', start);
        lexer.at += 2;
        this.addDefaults(name, start);
        writer.empty(tag);
        if (lexer.open.length === 0) this.rootDone = true;
        return;
      }
      if (!spaced) throw lexer.fail('xml-bad-tag', start);
      this.attribute(start);
    }
  }

  private checkLimits(start: number): void {
    const { lexer, limits } = this;
    if (lexer.open.length >= limits.depth) {
      throw lexer.fail('past-limit', start, { limit: 'depth', value: limits.depth });
    }
    if (this.out.starts.length >= limits.elements) {
      throw lexer.fail('past-limit', start, { limit: 'elements', value: limits.elements });
    }
  }

  private attribute(tagStart: number): void {
    const { lexer, limits } = this;
    const { attributes } = this.out;
    const { text } = lexer;
    const start = lexer.at;
    const name = lexer.name();
    lexer.skipSpace();
    const hasEquals = text.charCodeAt(lexer.at) === 61;
    if (hasEquals) {
      lexer.at++;
      lexer.skipSpace();
    }
    if (lexer.at >= text.length) throw lexer.cutOff('tag', tagStart);
    const quote = text[lexer.at];
    if (name === '') throw lexer.fail('xml-bad-tag', tagStart);
    const bad = (why: string) =>
      lexer.fail('xml-bad-attribute', start, { attribute: name.slice(0, 60), why });
    if (!hasEquals) throw bad('no value');
    if (quote !== '"' && quote !== "'") throw bad('no quotes');
    const from = lexer.at + 1;
    const end = text.indexOf(quote, from);
    const less = lexer.lessFrom(from);
    // A `<` inside a value most often means that the closing quote is missing.
    if (end >= 0 ? less < end : less < text.length) throw bad('less-than');
    if (end < 0) throw lexer.cutOff('attribute', tagStart);
    if (end - from > limits.attributeCharacters) {
      const { attributeCharacters: value } = limits;
      throw lexer.fail('past-limit', start, { limit: 'attributeCharacters', value });
    }
    const number = attributes.numberOf(name);
    if (number < 0) throw bad('name');
    if (attributes.isRepeated(number)) {
      throw lexer.fail('xml-duplicate-attribute', start, { attribute: name.slice(0, 60) });
    }
    const plain = lexer.ampersandFrom(from) > end;
    if (plain && !lexer.isAside) attributes.add(number, from, end);
    else {
      const raw = text.slice(from, end);
      attributes.addDecoded(number, plain ? raw : this.decodeValue(raw, start, bad));
    }
    lexer.at = end + 1;
  }

  private decodeValue(raw: string, start: number, bad: (why: string) => Unreadable): string {
    const value = withPlace(this.lexer, start, () => this.entities.decode(raw));
    // XML 1.0 §3.1, "No < in Attribute Values": not through an entity either.
    if (value.markup !== null) throw bad('less-than');
    reportReferences(this.lexer, value, start);
    return value.text;
  }

  private addDefaults(name: string, start: number): void {
    if (this.defaults.isEmpty) return;
    const values = this.defaults.of(name);
    if (!values) return;
    const { attributes } = this.out;
    for (const [attribute, value] of values) {
      const number = attributes.numberOf(attribute);
      withPlace(this.lexer, start, () => this.entities.spend(attribute, value.length + attribute.length));
      if (!attributes.isRepeated(number)) attributes.addDecoded(number, value);
    }
  }
}
