import type { Place } from '../../finding.js';
import { type FindingLog, Unreadable } from '../findingLog.js';
import type { LineIndex } from './lineIndex.js';
import { endsName, isPlainName, isXmlSpace } from './xmlCharacters.js';

/** Where reading was when it turned aside to the text of an entity. */
interface Aside {
  readonly text: string;
  readonly at: number;
  readonly base: number;
}

/**
 * Steps through markup and makes its errors, each with the place where it stands. An entity's text is
 * read in the same way (`enter`, `leave`); whatever is found in it has the place of its reference.
 */
export class MarkupLexer {
  at = 0;
  /** Names of the elements that are open, and offsets of their tags. */
  readonly open: string[] = [];
  readonly openStarts: number[] = [];
  private base = -1;
  private nextLess = -1;
  private nextAmpersand = -1;
  private readonly asides: Aside[] = [];

  constructor(
    public text: string,
    private readonly lines: LineIndex,
    readonly log: FindingLog,
  ) {}

  /** Whether an entity's text is being read. */
  get isAside(): boolean {
    return this.base >= 0;
  }

  /** Turns to the text of an entity whose reference stands at `reference`. */
  enter(text: string, reference: number): void {
    this.asides.push({ text: this.text, at: this.at, base: this.base });
    this.base = this.offsetOf(reference);
    this.restart(text, 0);
  }

  leave(): void {
    const outer = this.asides.pop();
    if (!outer) return;
    this.base = outer.base;
    this.restart(outer.text, outer.at);
  }

  private restart(text: string, at: number): void {
    this.text = text;
    this.at = at;
    this.nextLess = -1;
    this.nextAmpersand = -1;
  }

  /** Where the next `<` stands at or after `from`, or the end of the text. Each is looked for once. */
  lessFrom(from: number): number {
    if (this.nextLess < from) {
      const at = this.text.indexOf('<', from);
      this.nextLess = at < 0 ? this.text.length : at;
    }
    return this.nextLess;
  }

  ampersandFrom(from: number): number {
    if (this.nextAmpersand < from) {
      const at = this.text.indexOf('&', from);
      this.nextAmpersand = at < 0 ? this.text.length : at;
    }
    return this.nextAmpersand;
  }

  startsWith(mark: string): boolean {
    return this.text.startsWith(mark, this.at);
  }

  /** Whatever stands here up to what ends a name; it may be empty or no legal name. */
  name(): string {
    const { text, at: start } = this;
    let at = start;
    while (at < text.length && !endsName(text.charCodeAt(at))) at++;
    this.at = at;
    return text.slice(start, at);
  }

  /** True where there was any. */
  skipSpace(): boolean {
    const start = this.at;
    while (isXmlSpace(this.text.charCodeAt(this.at))) this.at++;
    return this.at > start;
  }

  /** Passes over `<!-- … -->`. */
  comment(): void {
    const { text, at } = this;
    let end = text.indexOf('--', at + 4);
    if (end >= 0 && text[end + 2] !== '>') {
      this.notStrict('a double hyphen in a comment', end);
      end = text.indexOf('-->', end);
    }
    if (end < 0) throw this.cutOff('comment');
    this.at = end + 3;
  }

  /** Passes over `<?target … ?>`. */
  instruction(): void {
    const start = this.at;
    const end = this.text.indexOf('?>', start + 2);
    if (end < 0) throw this.cutOff('processing instruction');
    this.at = start + 2;
    const target = this.name();
    if (!isPlainName(target) || (this.at < end && !this.skipSpace())) throw this.fail('xml-bad-tag', start);
    if (target.toLowerCase() === 'xml') this.notStrict('an XML declaration not at the very start', start);
    if (target === 'xml-stylesheet') {
      const sheet = this.text.slice(this.at, end).replace(/\s+/g, ' ').trim().slice(0, 60);
      this.log.add('style-sheet-not-read', () => this.placeAt(start), { type: `${target} ${sheet}` });
    }
    this.at = end + 2;
  }

  /** What a browser refuses and we read, since it makes no difference to what is drawn. */
  notStrict(what: string, offset: number): void {
    this.log.add('xml-not-strict', () => this.placeAt(offset), { what });
  }

  /** Offset in the document. */
  offsetOf(offset: number): number {
    return this.base < 0 ? offset : this.base;
  }

  placeAt(offset: number): Place {
    return { element: null, id: null, ...this.lines.locate(this.offsetOf(offset)) };
  }

  fail(code: Unreadable['code'], offset: number, values = {}): Unreadable {
    return new Unreadable(code, this.placeAt(offset), values);
  }

  /** The text ends too early; the place is its end, and what is begun and not ended stands in the values. */
  cutOff(inside: string, start?: number): Unreadable {
    const begun = this.lines.locate(
      this.offsetOf(start ?? (inside === 'element' ? this.openStarts.at(-1) : null) ?? this.at),
    );
    const place = { ...this.placeAt(this.text.length), element: this.open.at(-1) ?? null };
    return new Unreadable('xml-cut-off', place, {
      inside,
      open: this.open.length,
      startLine: begun.line,
      startColumn: begun.column,
    });
  }
}
