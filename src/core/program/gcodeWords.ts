import type { GcodeCode } from './gcodeFindings.js';

/** Letters that the grammar knows (NISTIR 6556 §3.3.2, §E.3). */
const LETTERS = 'ABCDFGHIJKLMNPQRSTXYZ';
/** A sign, digits and at most one point, no exponent (NISTIR 6556 §3.3.2.1, §E.2). */
const REAL_NUMBER = /^[+-]?(\d+\.?\d*|\.\d+)$/;
const EXPRESSION = '#[]=';

const TAB = 9;
const RETURN = 13;
const SPACE = 32;
const PLUS = 43;
const MINUS = 45;
const POINT = 46;
const ZERO = 48;
const NINE = 57;

/**
 * Takes lines of RS-274/NGC apart (NISTIR 6556 §3.3): blanks and tabs outside comments mean nothing,
 * not even inside a number, and case is ignored. A semicolon opens a comment to the end of the line:
 * not in the grammar, but common. One object serves all lines; `read` fills it anew.
 */
export class GcodeWords {
  /** Letters in capitals, as written; `value[i]` belongs to `letter[i]`. */
  readonly letter: string[] = [];
  readonly value: number[] = [];
  readonly comments: string[] = [];
  /** Begins with a slash: a switch on the machine says whether it is executed. */
  optional = false;
  /** Nothing but a percent sign. */
  percent = false;
  /** The first thing that could not be read, where reading stopped; its column from 1. */
  problem: GcodeCode | null = null;
  problemWord = '';
  problemColumn = 0;

  private text = '';
  private at = 0;

  /** Reads one line; a carriage return at its end is a blank. O(characters). */
  read(text: string): void {
    this.text = text;
    this.at = 0;
    this.letter.length = 0;
    this.value.length = 0;
    this.comments.length = 0;
    this.optional = false;
    this.percent = false;
    this.problem = null;
    this.skipBlanks();
    if (this.char() === '%') this.readPercent();
    else {
      this.optional = this.char() === '/';
      if (this.optional) this.at++;
      while (this.problem === null && this.readItem());
    }
  }

  /** The number of the first word with this letter. */
  numberOf(letter: string): number | undefined {
    const i = this.letter.indexOf(letter);
    return i < 0 ? undefined : this.value[i];
  }

  private readPercent(): void {
    this.at++;
    this.skipBlanks();
    if (this.at < this.text.length) this.fail('gcode-bad-character', this.at);
    else this.percent = true;
  }

  /** Reads a word or a comment; false at the end of the line. */
  private readItem(): boolean {
    this.skipBlanks();
    const { text, at } = this;
    if (at >= text.length) return false;
    const char = this.char();
    if (char === ';') {
      this.comments.push(text.slice(at + 1).trim());
      return false;
    }
    if (char === '(') this.readComment();
    else if (EXPRESSION.includes(char)) this.fail('gcode-expression', at);
    else if (LETTERS.includes(char.toUpperCase())) this.readWord(char.toUpperCase());
    else this.fail('gcode-bad-character', at);
    return true;
  }

  /** A comment goes to the first closing bracket, on this line, with no other bracket inside (§3.3.4). */
  private readComment(): void {
    const { text, at } = this;
    const close = text.indexOf(')', at);
    const nested = text.indexOf('(', at + 1);
    if (close < 0 || (nested >= 0 && nested < close)) {
      this.fail('gcode-comment-open', at);
      return;
    }
    this.comments.push(text.slice(at + 1, close));
    this.at = close + 1;
  }

  private readWord(letter: string): void {
    const start = this.at++;
    this.skipBlanks();
    let number = this.digits();
    // The rest of a number that has blanks in it; a sign may only come first.
    for (this.skipBlanks(); this.at < this.text.length && this.isNumeric(number === ''); this.skipBlanks()) {
      number += this.digits();
    }
    if (REAL_NUMBER.test(number)) {
      this.letter.push(letter);
      this.value.push(Number(number));
    } else if (this.at < this.text.length && EXPRESSION.includes(this.char())) {
      this.fail('gcode-expression', this.at);
    } else {
      this.fail('gcode-bad-number', start);
    }
  }

  /** What of a number stands here without a blank: a sign perhaps, digits and points. */
  private digits(): string {
    const from = this.at;
    while (this.at < this.text.length && this.isNumeric(this.at === from)) this.at++;
    return this.text.slice(from, this.at);
  }

  private isNumeric(signToo: boolean): boolean {
    const code = this.text.charCodeAt(this.at);
    return (code >= ZERO && code <= NINE) || code === POINT || (signToo && (code === PLUS || code === MINUS));
  }

  private skipBlanks(): void {
    for (; this.at < this.text.length; this.at++) {
      const code = this.text.charCodeAt(this.at);
      if (code !== SPACE && code !== TAB && code !== RETURN) return;
    }
  }

  private char(): string {
    return this.text.charAt(this.at);
  }

  private fail(problem: GcodeCode, at: number): void {
    this.problem = problem;
    this.problemWord = this.text.charAt(at);
    this.problemColumn = at + 1;
  }
}
