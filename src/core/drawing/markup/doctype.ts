import { Unreadable } from '../findingLog.js';
import type { AttributeDefaults } from './attributeDefaults.js';
import { characterOf, type Entities, referenceAt } from './entities.js';
import type { MarkupLexer } from './markupLexer.js';
import { isPlainName, isQualifiedName } from './xmlCharacters.js';

const ATTRIBUTE_TYPE =
  /^(?:CDATA|ID|IDREF|IDREFS|ENTITY|ENTITIES|NMTOKEN|NMTOKENS|(?:NOTATION[ \t\r\n]+)?\([^()"'<>]*\))$/;
const LONGEST_TYPE = 10_000;

/**
 * Reads a document type declaration (XML 1.0 §2.8) from `<!DOCTYPE` to its `>`: general and parameter
 * entities and defaults of attributes of the internal subset. What stands elsewhere (an external subset
 * or entity) is never fetched. Throws Unreadable where it is not well formed.
 */
export function readDoctype(lexer: MarkupLexer, entities: Entities, defaults: AttributeDefaults): void {
  new DoctypeReader(lexer, entities, defaults).run();
}

class DoctypeReader {
  private readonly start: number;
  /** Replacement texts of parameter entities; null for external ones. */
  private readonly parameters = new Map<string, string | null>();

  constructor(
    private readonly lexer: MarkupLexer,
    private readonly entities: Entities,
    private readonly defaults: AttributeDefaults,
  ) {
    this.start = lexer.at;
  }

  run(): void {
    const { lexer } = this;
    lexer.at += '<!DOCTYPE'.length;
    this.space();
    this.qualifiedName();
    if (lexer.skipSpace() && (lexer.startsWith('SYSTEM') || lexer.startsWith('PUBLIC'))) {
      // The system identifier may be left out nowhere but in a notation.
      this.externalId();
      lexer.skipSpace();
    }
    if (this.next() === '[') {
      lexer.at++;
      this.subset(true);
      lexer.skipSpace();
    }
    this.expect('>');
  }

  /** Markup declarations up to `]`, or to the end of a parameter entity's text. */
  private subset(bracketed: boolean): void {
    const { lexer } = this;
    for (;;) {
      lexer.skipSpace();
      const c = lexer.text[lexer.at];
      if (c === undefined) {
        if (bracketed) throw lexer.cutOff('document type');
        return;
      }
      if (c === ']' && bracketed) {
        lexer.at++;
        return;
      }
      if (c === '%') this.parameterReference();
      else if (lexer.startsWith('<!--')) lexer.comment();
      else if (lexer.startsWith('<?')) lexer.instruction();
      else if (lexer.startsWith('<!ENTITY')) this.entity();
      else if (lexer.startsWith('<!ATTLIST')) this.attributeList();
      else if (lexer.startsWith('<!ELEMENT') || lexer.startsWith('<!NOTATION')) this.skipDeclaration();
      else throw this.bad(lexer.at);
    }
  }

  private entity(): void {
    const { lexer } = this;
    lexer.at += '<!ENTITY'.length;
    this.space();
    const isParameter = this.next() === '%';
    if (isParameter) {
      lexer.at++;
      this.space();
    }
    const name = this.plainName();
    this.space();
    const isLiteral = this.next() === '"' || lexer.text[lexer.at] === "'";
    const value = isLiteral ? this.replacementText(this.literal()) : null;
    if (!isLiteral) this.externalId();
    if (lexer.skipSpace() && !isLiteral && !isParameter && lexer.startsWith('NDATA')) {
      lexer.at += 'NDATA'.length;
      this.space();
      this.plainName();
      lexer.skipSpace();
    }
    this.expect('>');
    if (!isParameter) this.entities.declare(name, value);
    else if (!this.parameters.has(name)) this.parameters.set(name, value);
  }

  /** Character references are replaced at once, others when the entity is used (XML 1.0 §4.4). */
  private replacementText(literal: string): string {
    const percent = literal.indexOf('%');
    if (percent >= 0) throw this.bad(this.lexer.at - literal.length - 1 + percent);
    if (literal.indexOf('&#') < 0) return literal;
    const parts: string[] = [];
    let from = 0;
    for (let at = literal.indexOf('&#'); at >= 0; at = literal.indexOf('&#', at)) {
      const reference = referenceAt(literal, at);
      const character = reference && characterOf(reference.name);
      if (!reference || !character) {
        at++;
        continue;
      }
      parts.push(literal.slice(from, at), character.text);
      at = from = reference.end;
    }
    parts.push(literal.slice(from));
    return parts.join('');
  }

  private parameterReference(): void {
    const { lexer, entities } = this;
    const start = lexer.at++;
    const name = lexer.name();
    if (!isPlainName(name) || this.next() !== ';') throw this.bad(start);
    lexer.at++;
    const text = this.parameters.get(name);
    const place = () => lexer.placeAt(start);
    if (text === null) lexer.log.add('external-entity', place, { entity: `%${name};` });
    else if (text === undefined) lexer.log.add('unknown-entity', place, { entity: `%${name};` });
    else {
      this.at(start, () => {
        entities.enter(`%${name}`);
        entities.spend(`%${name}`, text.length);
      });
      lexer.enter(text, start);
      this.subset(false);
      lexer.leave();
      entities.leave(`%${name}`);
    }
  }

  private attributeList(): void {
    const { lexer } = this;
    lexer.at += '<!ATTLIST'.length;
    this.space();
    const element = this.qualifiedName();
    while (lexer.skipSpace() && this.next() !== '>') {
      const start = lexer.at;
      const attribute = this.qualifiedName();
      this.space();
      this.attributeType();
      this.space();
      if (lexer.startsWith('#REQUIRED')) lexer.at += '#REQUIRED'.length;
      else if (lexer.startsWith('#IMPLIED')) lexer.at += '#IMPLIED'.length;
      else {
        if (lexer.startsWith('#FIXED')) {
          lexer.at += '#FIXED'.length;
          this.space();
        }
        const raw = this.literal();
        const value = this.at(start, () => this.entities.decode(raw));
        if (raw.includes('<') || value.markup !== null) throw this.bad(start);
        this.defaults.declare(element, attribute, value.text);
      }
    }
    this.expect('>');
  }

  private attributeType(): void {
    const { lexer } = this;
    const start = lexer.at;
    let at = start;
    const { text } = lexer;
    if (lexer.startsWith('NOTATION')) at += 'NOTATION'.length;
    if (text[at] === '(' || at > start) {
      at = text.indexOf(')', at) + 1;
      if (at <= 0) throw lexer.cutOff('document type');
      lexer.at = at;
    } else lexer.name();
    if (lexer.at - start > LONGEST_TYPE || !ATTRIBUTE_TYPE.test(text.slice(start, lexer.at))) {
      throw this.bad(start);
    }
  }

  private externalId(): void {
    const { lexer } = this;
    const isPublic = lexer.startsWith('PUBLIC');
    if (!isPublic && !lexer.startsWith('SYSTEM')) throw this.bad(lexer.at);
    lexer.at += 'PUBLIC'.length;
    if (isPublic) {
      this.space();
      this.literal();
    }
    this.space();
    this.literal();
  }

  /** `<!ELEMENT …>` and `<!NOTATION …>` say nothing that a drawing needs. */
  private skipDeclaration(): void {
    const { lexer } = this;
    const start = lexer.at;
    lexer.at += 2;
    lexer.name();
    this.space();
    for (;;) {
      const c = this.next();
      if (c === '>') break;
      if (c === '<') throw this.bad(start);
      if (c === '"' || c === "'") this.literal();
      else lexer.at++;
    }
    lexer.at++;
  }

  /** A quoted text, without its quotes. */
  private literal(): string {
    const { lexer } = this;
    const quote = this.next();
    if (quote !== '"' && quote !== "'") throw this.bad(lexer.at);
    const from = lexer.at + 1;
    const end = lexer.text.indexOf(quote, from);
    if (end < 0) throw lexer.cutOff('document type');
    lexer.at = end + 1;
    return lexer.text.slice(from, end);
  }

  private space(): void {
    if (!this.lexer.skipSpace()) {
      this.next();
      throw this.bad(this.lexer.at);
    }
  }

  private plainName(): string {
    const start = this.lexer.at;
    const name = this.lexer.name();
    if (name === '') this.next();
    if (!isPlainName(name)) throw this.bad(start);
    return name;
  }

  private qualifiedName(): string {
    const start = this.lexer.at;
    const name = this.lexer.name();
    if (name === '') this.next();
    if (!isQualifiedName(name)) throw this.bad(start);
    return name;
  }

  private expect(c: string): void {
    if (this.next() !== c) throw this.bad(this.lexer.at);
    this.lexer.at++;
  }

  /** The next character; throws where the text ends. */
  private next(): string {
    const c = this.lexer.text[this.lexer.at];
    if (c === undefined) throw this.lexer.cutOff('document type', this.start);
    return c;
  }

  /** What is refused in here has its place. */
  private at<T>(offset: number, work: () => T): T {
    try {
      return work();
    } catch (error) {
      if (error instanceof Unreadable) {
        throw new Unreadable(error.code, this.lexer.placeAt(offset), error.values);
      }
      throw error;
    }
  }

  private bad(offset: number): Unreadable {
    return this.lexer.fail('xml-bad-doctype', offset);
  }
}
