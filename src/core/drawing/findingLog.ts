import type { Finding, Place } from '../finding.js';
import { READING_FINDINGS, type ReadingCode } from './findingKinds.js';

type Values = Readonly<Record<string, string | number>>;

interface Entry {
  readonly place: Place | null;
  readonly first: Values;
  count: number;
  readonly sums: Map<string, number>;
}

/** One finding per code however often it is met, so that 10,000 texts give one line, not 10,000. */
export class FindingLog {
  private readonly entries = new Map<ReadingCode, Entry>();

  /** `place` and `first` are asked only the first time: finding a line and column costs a search. */
  add(code: ReadingCode, place: () => Place | null, first: Values | (() => Values) = {}, count = 1): void {
    const known = this.entries.get(code);
    if (known) known.count += count;
    else {
      const values = typeof first === 'function' ? first() : first;
      this.entries.set(code, { place: place(), first: values, count, sums: new Map() });
    }
  }

  /** Adds to a value that is a sum over all times, after `add`. */
  sum(code: ReadingCode, name: string, amount: number): void {
    const sums = this.entries.get(code)?.sums;
    sums?.set(name, (sums.get(name) ?? 0) + amount);
  }

  /** In the order in which the codes were first met. */
  list(): Finding[] {
    return [...this.entries].map(([code, { place, first, count, sums }]) => ({
      code,
      severity: READING_FINDINGS[code],
      place,
      values: { ...first, ...Object.fromEntries(sums), count },
    }));
  }
}

/** Leaves the reading from any depth; caught by `readDrawing`, never by a caller. */
export class Unreadable extends Error {
  constructor(
    readonly code: ReadingCode,
    readonly place: Place | null,
    readonly values: Values = {},
  ) {
    super(code);
  }

  finding(): Finding {
    return {
      code: this.code,
      severity: READING_FINDINGS[this.code],
      place: this.place,
      values: this.values,
    };
  }
}
