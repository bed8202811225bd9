import { isQualifiedName } from './xmlCharacters.js';

/**
 * A piece of well-formed markup with everything taken out that svg-parser would misread or choke on: no
 * attributes, texts as `v`, odd tag names as `__0`, `__1`, …; no prolog, comment, CDATA section,
 * processing instruction or reference.
 *
 * Each piece is balanced: it begins with the tags of the `reopened` elements that were open at the end
 * of the piece before, and ends them again.
 */
export interface SkeletonPiece {
  readonly markup: string;
  readonly reopened: number;
  /** Elements that begin in this piece. */
  readonly elements: number;
  /** What the `v`s stand for, in order. */
  readonly texts: readonly string[];
  /** The name that a tag name of the markup stands for. */
  readonly nameOf: (plain: string) => string;
}

/** A tag's name and how the skeleton writes it. */
export interface TagName {
  readonly name: string;
  readonly plain: string;
  readonly start: string;
  readonly end: string;
  readonly empty: string;
}

/** Names that svg-parser takes as they are; `__` is kept for our own placeholders (and so `__proto__`). */
const PLAIN_NAME = /^(?!__)[A-Za-z0-9:_-]+$/;

/** Elements in a piece: few enough that what svg-parser makes of it is gone soon. */
const PER_PIECE = 8192;

/** Writes the skeleton and hands it on piece by piece, so that no text and no tree is ever whole. */
export class SkeletonWriter {
  private readonly names = new Map<string, TagName>();
  private readonly open: TagName[] = [];
  private markup = '';
  private texts: string[] = [];
  private elements = 0;
  private reopened = 0;
  private oddNames = 0;

  private readonly byPlain = new Map<string, string>();
  private readonly nameOf = (plain: string): string => this.byPlain.get(plain) ?? plain;

  constructor(private readonly take: (piece: SkeletonPiece) => void) {}

  /** Null where it is no legal name. */
  tagName(name: string): TagName | null {
    let tag = this.names.get(name);
    if (tag === undefined) {
      if (!isQualifiedName(name)) return null;
      const plain = PLAIN_NAME.test(name) ? name : `__${this.oddNames++}`;
      tag = { name, plain, start: `<${plain}>`, end: `</${plain}>`, empty: `<${plain}/>` };
      this.names.set(name, tag);
      if (plain !== name) this.byPlain.set(plain, name);
    }
    return tag;
  }

  start(tag: TagName): void {
    this.markup += tag.start;
    this.open.push(tag);
    this.count();
  }

  empty(tag: TagName): void {
    this.markup += tag.empty;
    this.count();
  }

  end(): void {
    this.markup += this.open.pop()?.end ?? '';
  }

  text(text: string): void {
    this.markup += 'v';
    this.texts.push(text);
  }

  finish(): void {
    if (this.elements > 0 || this.texts.length > 0) this.flush();
  }

  private count(): void {
    if (++this.elements >= PER_PIECE + this.open.length) this.flush();
  }

  private flush(): void {
    const { open, reopened, elements, texts } = this;
    let markup = this.markup;
    for (let i = open.length - 1; i >= 0; i--) markup += open[i].end;
    this.markup = '';
    for (const tag of open) this.markup += tag.start;
    this.texts = [];
    this.elements = 0;
    this.reopened = open.length;
    this.take({ markup, reopened, elements, texts, nameOf: this.nameOf });
  }
}
