import type { LineSet } from '../../src/core/audit/lineSet.ts';
import { randomBelow } from '../../src/core/structures/random.ts';
import { type Chain, chainsOf, flattened, reversed, type Segment, spanOf } from './chains.ts';

/** Segments `from` up to `to` of a chain replaced: `parts[0]` goes on from what stands before, the last part
 * goes on to what stands after, and between two parts the tool is lifted. `extra` are runs of their own. */
export interface Edit {
  readonly chain: number;
  readonly from: number;
  readonly to: number;
  readonly parts: readonly (readonly Segment[])[];
  readonly extra?: readonly Chain[];
}

/** One thing done to an output: its edits, and all lines taken away or added by them. */
export interface Spot {
  readonly edits: readonly Edit[];
  readonly marks: readonly Segment[];
}

/** A segment of an output: its chain, its number there, and about its length. */
export interface Pick {
  readonly c: number;
  readonly k: number;
  readonly segment: Segment;
  readonly size: number;
}

/** An output to be changed here and there. */
export class OutputSheet {
  readonly dots: number[] = [];
  private readonly picks: Pick[] = [];
  private readonly wanted: Segment[];

  constructor(
    wanted: LineSet,
    readonly chains: readonly Chain[],
    readonly tau: number,
    readonly random: () => number,
  ) {
    this.wanted = chainsOf(wanted).flatMap((chain) => flattened(chain, 0.001).segments);
    chains.forEach((chain, c) => {
      if (chain.dot) this.dots.push(c);
      else {
        chain.segments.forEach((segment, k) => {
          this.picks.push({ c, k, segment, size: sizeOf(segment) });
        });
      }
    });
  }

  penOf(pick: Pick): number {
    return this.chains[pick.c].pen;
  }

  /** A segment drawn at random among those that fit; null where none is found soon. */
  pick(fits: (pick: Pick) => boolean): Pick | null {
    if (this.picks.length === 0) return null;
    for (let attempt = 0; attempt < 200; attempt++) {
      const found = this.picks[randomBelow(this.random, this.picks.length)];
      if (fits(found)) return found;
    }
    return null;
  }

  /** Whether other lines of the output than these lie within `reach` of a point. */
  isBeside(x: number, y: number, reach: number, except: readonly Segment[]): boolean {
    return this.picks.some(({ segment }) => {
      const { data: d } = segment;
      // A curve lies within its length of its chord; most are far away.
      const spare = reach + (segment.kind === 0 ? 0 : sizeOf(segment));
      if (x < Math.min(d[0], d[2]) - spare || x > Math.max(d[0], d[2]) + spare) return false;
      if (y < Math.min(d[1], d[3]) - spare || y > Math.max(d[1], d[3]) + spare) return false;
      if (except.includes(segment)) return false;
      const pieces = flattened({ pen: 0, segments: [segment] }, 0.001).segments;
      return pieces.some((piece) => distanceTo(piece, x, y) <= reach);
    });
  }

  /** How many wanted lines run through the middle of a segment. */
  standing({ segment }: Pick): number {
    const { data: m } = spanOf(segment, 0, 0.5);
    const [x, y] = [m[2], m[3]];
    return this.wanted.filter(({ data: d }) => {
      if (x < Math.min(d[0], d[2]) - 0.01 || x > Math.max(d[0], d[2]) + 0.01) return false;
      if (y < Math.min(d[1], d[3]) - 0.01 || y > Math.max(d[1], d[3]) + 0.01) return false;
      return distanceTo({ kind: 0, data: d }, x, y) <= 0.011;
    }).length;
  }

  /** One from `least` to `most`. */
  between(least: number, most: number): number {
    return least + (most - least) * this.random();
  }
}

/** The output with all edits made; they must not touch each other. */
export function edited(chains: readonly Chain[], edits: readonly Edit[]): Chain[] {
  const byChain = new Map<number, Edit[]>();
  for (const edit of edits) byChain.set(edit.chain, [...(byChain.get(edit.chain) ?? []), edit]);
  const result: Chain[] = [];
  chains.forEach((chain, c) => {
    const own = byChain.get(c);
    if (own === undefined) {
      result.push(chain);
      return;
    }
    own.sort((a, b) => a.from - b.from);
    let run: Segment[] = [];
    let at = 0;
    const lift = (): void => {
      if (run.length > 0) result.push({ ...chain, segments: run });
      run = [];
    };
    for (const { from, to, parts } of own) {
      run.push(...chain.segments.slice(at, from));
      parts.forEach((part, i) => {
        if (i > 0) lift();
        run.push(...part);
      });
      at = to;
    }
    run.push(...chain.segments.slice(at));
    lift();
  });
  for (const { extra } of edits) result.push(...(extra ?? []));
  return result;
}

/** About the length of a segment. */
export function sizeOf(segment: Segment): number {
  const { data, kind } = segment;
  if (kind === 0) return distance(data[0], data[1], data[2], data[3]);
  let size = 0;
  for (const { data: d } of flattened({ pen: 0, segments: [segment] }, 0.05).segments) {
    size += distance(d[0], d[1], d[2], d[3]);
  }
  return size;
}

export function distance(x0: number, y0: number, x1: number, y1: number): number {
  return Math.sqrt((x1 - x0) ** 2 + (y1 - y0) ** 2);
}

export function distanceTo({ data: [x0, y0, x1, y1] }: Segment, x: number, y: number): number {
  const [dx, dy] = [x1 - x0, y1 - y0];
  const squared = dx * dx + dy * dy;
  const along = squared > 0 ? ((x - x0) * dx + (y - y0) * dy) / squared : 0;
  const t = Math.max(0, Math.min(1, along));
  return Math.sqrt((x0 + t * dx - x) ** 2 + (y0 + t * dy - y) ** 2);
}

export function lineFrom(x0: number, y0: number, x1: number, y1: number): Segment {
  return { kind: 0, data: [x0, y0, x1, y1] };
}

export function backwards(segments: readonly Segment[]): readonly Segment[] {
  return reversed({ pen: 0, segments }).segments;
}

/** Straight pieces that stay within 0.05 mm of the marks. */
export function outlineOf(marks: readonly Segment[]): Segment[] {
  return marks.flatMap((mark) => flattened({ pen: 0, segments: [mark] }, 0.05).segments);
}
