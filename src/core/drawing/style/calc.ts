import { splitOutside } from './cssText.js';

/** What a number with its unit is worth; null where the unit is not known. Without a unit: ''. */
export type UnitReader = (value: number, unit: string) => Quantity | null;

/** A worked-out value and what it is: percentages are taken for what they are a percentage of. */
export interface Quantity {
  readonly value: number;
  readonly kind: 'number' | 'length' | 'angle';
}

const NUMBER = /^([+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?)(%|[a-z]*)/i;
const LONGEST = 1000;
const DEEPEST = 16;

/** Whether the text is one of the functions that `evaluate` reads. */
export function isMath(text: string): boolean {
  return /^(?:calc|min|max|clamp|-webkit-calc)\(/i.test(text) && text.endsWith(')');
}

/**
 * A number, or a sum of numbers with units in calc(), min(), max() or clamp() (CSS Values and Units Module
 * Level 4, §10); null where it is wrong, mixes kinds, or holds what is not read.
 */
export function evaluate(text: string, unitOf: UnitReader): Quantity | null {
  if (text.length > LONGEST) return null;
  const plain = NUMBER.exec(text);
  if (plain && plain[0].length === text.length) return unitOf(Number(plain[1]), plain[2].toLowerCase());
  if (!isMath(text)) return null;
  const sum = new Sum(text, unitOf);
  const value = sum.product(0);
  return value && sum.atEnd && Number.isFinite(value.value) ? value : null;
}

class Sum {
  private at = 0;

  constructor(
    private readonly text: string,
    private readonly unitOf: UnitReader,
  ) {}

  get atEnd(): boolean {
    return this.at >= this.text.length;
  }

  private sum(depth: number): Quantity | null {
    let left = this.product(depth);
    for (;;) {
      // Signs of sums need white space on both sides.
      const sign = /^\s+([+-])\s+/.exec(this.rest());
      if (!left || !sign) return left;
      this.at += sign[0].length;
      const right = this.product(depth);
      if (!right || right.kind !== left.kind) return null;
      left = { kind: left.kind, value: left.value + (sign[1] === '+' ? right.value : -right.value) };
    }
  }

  product(depth: number): Quantity | null {
    let left = this.term(depth);
    for (;;) {
      const sign = /^\s*([*/])\s*/.exec(this.rest());
      if (!left || !sign) return left;
      this.at += sign[0].length;
      const right = this.term(depth);
      if (!right) return null;
      if (sign[1] === '/') {
        if (right.kind !== 'number') return null;
        left = { kind: left.kind, value: left.value / right.value };
      } else {
        if (left.kind !== 'number' && right.kind !== 'number') return null;
        left = {
          kind: left.kind === 'number' ? right.kind : left.kind,
          value: left.value * right.value,
        };
      }
    }
  }

  private term(depth: number): Quantity | null {
    this.space();
    const rest = this.rest();
    const number = NUMBER.exec(rest);
    if (number) {
      this.at += number[0].length;
      return this.unitOf(Number(number[1]), number[2].toLowerCase());
    }
    const call = /^(-webkit-calc|calc|min|max|clamp|)\(/i.exec(rest);
    if (call && depth < DEEPEST) {
      this.at += call[0].length;
      return this.call(call[1].toLowerCase(), depth + 1);
    }
    const constant = /^(pi|e)\b/i.exec(rest);
    if (!constant) return null;
    this.at += constant[0].length;
    return { kind: 'number', value: constant[0].toLowerCase() === 'e' ? Math.E : Math.PI };
  }

  private call(name: string, depth: number): Quantity | null {
    const values: number[] = [];
    let kind: Quantity['kind'] | null = null;
    for (;;) {
      this.space();
      const none = name === 'clamp' && /^none\b/i.exec(this.rest());
      const value = none ? null : this.sum(depth);
      if (none) this.at += 4;
      else if (!value || (kind !== null && value.kind !== kind)) return null;
      kind = value?.kind ?? kind;
      values.push(value?.value ?? (values.length === 0 ? -Infinity : Infinity));
      this.space();
      const c = this.text[this.at++];
      if (c === ')') break;
      if (c !== ',') return null;
    }
    if (kind === null) return null;
    if (name === 'min') return { kind, value: Math.min(...values) };
    if (name === 'max') return { kind, value: Math.max(...values) };
    if (name === 'clamp') {
      const [low, middle, high] = values;
      return values.length === 3 ? { kind, value: Math.max(low, Math.min(middle, high)) } : null;
    }
    return values.length === 1 ? { kind, value: values[0] } : null;
  }

  private space(): void {
    this.at = this.text.length - this.rest().trimStart().length;
  }

  private rest(): string {
    return this.text.slice(this.at);
  }
}

/** The arguments of a function parted by commas, without the space around them. */
export function argumentsOf(list: string): string[] {
  return list.trim() === '' ? [] : splitOutside(list, ',').map((part) => part.trim());
}
