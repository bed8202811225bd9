import { afterUnit, isSpace } from './cssText.js';

/** One thing in a style sheet or a block of it, as written. */
export type StyleItem =
  | { readonly kind: 'declaration'; readonly text: string; readonly at: number }
  | {
      readonly kind: 'rule' | 'at-rule';
      /** Of an at-rule, in lower case; '' for others. */
      readonly name: string;
      readonly prelude: string;
      readonly at: number;
      /** null where an at-rule has no block. */
      readonly items: readonly StyleItem[] | null;
    };

/** Blocks in blocks deeper than this are passed over: real sheets have up to four. */
const DEEPEST = 32;

/**
 * The frame of a style sheet: rules, at-rules and declarations, blocks in blocks, with places (CSS Syntax
 * Module Level 3, §5.4, rules in rules included). What cannot be a declaration or rule is dropped as there.
 * `tooDeep` gets the places of blocks that are passed over. O(text).
 */
export function readStyleBlocks(text: string, tooDeep: (at: number) => void): readonly StyleItem[] {
  return new BlockScanner(text, tooDeep).items(0);
}

class BlockScanner {
  private at = 0;

  constructor(
    private readonly text: string,
    private readonly tooDeep: (at: number) => void,
  ) {}

  /** What stands up to the end of the block, which is passed. */
  items(depth: number): StyleItem[] {
    const items: StyleItem[] = [];
    const { text } = this;
    while (this.at < text.length) {
      const c = text[this.at];
      if (c === '}' && depth > 0) {
        this.at++;
        break;
      }
      if (isSpace(c) || text.startsWith('/*', this.at) || (c === ';' && depth > 0)) {
        this.at = afterUnit(text, this.at);
      } else if (depth === 0 && text.startsWith('<!--', this.at)) this.at += 4;
      else if (depth === 0 && text.startsWith('-->', this.at)) this.at += 3;
      else {
        const item = c === '@' ? this.atRule(depth) : this.other(depth);
        if (item) items.push(item);
      }
    }
    return items;
  }

  private atRule(depth: number): StyleItem {
    const at = this.at;
    const name = /^[-\w\u0080-\uffff]*/.exec(this.text.slice(at + 1, at + 80))?.[0] ?? '';
    this.at += 1 + name.length;
    const from = this.at;
    this.skipTo((c) => c === ';' || c === '{' || (c === '}' && depth > 0));
    const prelude = this.text.slice(from, this.at).trim();
    const items = this.text[this.at] === '{' ? this.block(depth) : null;
    if (items === null && this.text[this.at] === ';') this.at++;
    return { kind: 'at-rule', name: name.toLowerCase(), prelude, at, items };
  }

  private other(depth: number): StyleItem | null {
    const at = this.at;
    if (depth > 0) {
      const isCustom = /^--[^\s:;{}]*\s*:/.test(this.text.slice(at, at + 400));
      this.skipTo((c) => c === ';' || c === '}' || (c === '{' && !isCustom));
    } else this.skipTo((c) => c === '{');
    const head = this.text.slice(at, this.at).trim();
    if (this.text[this.at] === '{') {
      return { kind: 'rule', name: '', prelude: head, at, items: this.block(depth) };
    }
    return depth > 0 ? { kind: 'declaration', text: head, at } : null;
  }

  private block(depth: number): StyleItem[] {
    const open = this.at++;
    if (depth < DEEPEST) return this.items(depth + 1);
    this.tooDeep(open);
    this.skipTo((c) => c === '}');
    this.at++;
    return [];
  }

  /** To the first character outside brackets and quotes that is asked for, or the end. */
  private skipTo(isEnd: (c: string) => boolean): void {
    const { text } = this;
    let depth = 0;
    while (this.at < text.length) {
      const c = text[this.at];
      if (depth === 0 && isEnd(c)) return;
      if (c === '(' || c === '[' || c === '{') depth++;
      else if ((c === ')' || c === ']' || c === '}') && depth > 0) depth--;
      this.at = afterUnit(text, this.at);
    }
  }
}
