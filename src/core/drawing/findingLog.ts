import type { Finding, Place } from '../finding.js';
import { READING_FINDINGS, type ReadingCode } from './findingKinds.js';

type Values = Readonly<Record<string, string | number>>;

/** Places kept of each code; further ones are only counted. */
export const MOST_PLACES = 1000;

interface Entry {
  readonly places: Place[];
  readonly first: Values;
  count: number;
  readonly sums: Map<string, number>;
}

/**
 * One finding per code however often it is met, so that 10,000 texts give one line, not 10,000; with the
 * places of the first thousand.
 */
export class FindingLog {
  private readonly entries = new Map<ReadingCode, Entry>();

  /** `first` is asked only the first time, `place` while places are kept: finding a line costs a search. */
  add(code: ReadingCode, place: () => Place | null, first: Values | (() => Values) = {}, count = 1): void {
    let entry = this.entries.get(code);
    if (entry) entry.count += count;
    else {
      const values = typeof first === 'function' ? first() : first;
      entry = { places: [], first: values, count, sums: new Map() };
      this.entries.set(code, entry);
    }
    if (entry.places.length < MOST_PLACES) addPlace(entry.places, place());
  }

  /** Adds to a value that is a sum over all times, after `add`. */
  sum(code: ReadingCode, name: string, amount: number): void {
    const sums = this.entries.get(code)?.sums;
    sums?.set(name, (sums.get(name) ?? 0) + amount);
  }

  /** In the order in which the codes were first met. */
  list(): Finding[] {
    return [...this.entries].map(([code, { places, first, count, sums }]) => ({
      code,
      severity: READING_FINDINGS[code],
      place: places[0] ?? null,
      ...(places.length > 1 ? { places } : {}),
      values: { ...first, ...Object.fromEntries(sums), count },
    }));
  }
}

/** Copies of one element stand in one place, which is named once. */
function addPlace(places: Place[], place: Place | null): void {
  if (place === null) return;
  const last = places[places.length - 1];
  const isSame = (other: Place) => other.line === place.line && other.column === place.column;
  if (last !== undefined && (isSame(last) || places.some(isSame))) return;
  places.push(place);
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
