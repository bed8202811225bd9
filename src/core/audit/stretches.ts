import type { Side } from './side.js';

/** A stretch of a chain, in one go, that is not paired. */
export interface Stretch {
  readonly chain: number;
  readonly pen: number;
  /** Its points in order; of part k, from point k to k + 1, the piece and the fractions are known. */
  readonly x: readonly number[];
  readonly y: readonly number[];
  readonly span: readonly number[];
  readonly piece: readonly number[];
  readonly from: readonly number[];
  readonly to: readonly number[];
  readonly lengthMm: number;
  /** Whether it begins where the chain begins, and ends where it ends. */
  readonly atStart: boolean;
  readonly atEnd: boolean;
  /** Largest deviation of what is paired before and after it on the chain. */
  readonly deviation: number;
  /** At how many of its ends what comes next is not drawn itself, but repeats what is. */
  readonly excusedEnds: number;
}

/** All stretches of a side that are not paired, in order; those shorter than a hair only where they are a chain of their own. */
export function unpairedStretches(side: Side, hairMm: number): Stretch[] {
  const stretches: Stretch[] = [];
  const { firstOfChain } = side.spans;
  for (let chain = 0; chain < side.lines.count; chain++) {
    const from = firstOfChain[chain];
    const to = firstOfChain[chain + 1];
    let open: OpenStretch | null = null;
    let before = NOTHING;
    const close = (after: Neighbour): void => {
      if (open === null) return;
      const stretch = open.finish(after);
      if (stretch.lengthMm > hairMm || (stretch.atStart && stretch.atEnd)) stretches.push(stretch);
      open = null;
    };
    for (let span = from; span < to; span++) {
      const neighbour = (v: number, at: number): Neighbour => ({
        deviation: side.deviation[span],
        excused: side.isExcused(span, v, at),
      });
      if (side.whole[span] === 1) {
        if (open !== null) close(neighbour(side.flatten(span), 0));
        before = { deviation: side.deviation[span], excused: side.isExcused(span, -1, 1) };
        continue;
      }
      const first = side.flatten(span);
      for (let v = first; v < first + side.pieceCount(span); v++) {
        const free = side.unpaired(span, v, 0, 1);
        let at = 0;
        for (let i = 0; i < free.length; i += 2) {
          if (free[i] > at) {
            close(neighbour(v, at));
            before = neighbour(v, free[i]);
          }
          open ??= new OpenStretch(side, chain, before);
          open.add(span, v, free[i], free[i + 1]);
          at = free[i + 1];
        }
        if (at < 1) {
          close(neighbour(v, at));
          before = neighbour(v, 1);
        }
      }
    }
    close(NOTHING);
  }
  return stretches;
}

/** What is paired next to a stretch. */
interface Neighbour {
  /** Negative at the chain's end. */
  readonly deviation: number;
  readonly excused: boolean;
}

const NOTHING: Neighbour = { deviation: -1, excused: false };

class OpenStretch {
  private readonly x: number[] = [];
  private readonly y: number[] = [];
  private readonly span: number[] = [];
  private readonly piece: number[] = [];
  private readonly from: number[] = [];
  private readonly to: number[] = [];
  private lengthMm = 0;

  constructor(
    private readonly side: Side,
    private readonly chain: number,
    private readonly before: Neighbour,
  ) {}

  add(span: number, v: number, from: number, to: number): void {
    const { x, y } = this.side;
    if (this.x.length === 0) this.point(x[v] + from * (x[v + 1] - x[v]), y[v] + from * (y[v + 1] - y[v]));
    this.point(x[v] + to * (x[v + 1] - x[v]), y[v] + to * (y[v + 1] - y[v]));
    this.span.push(span);
    this.piece.push(v);
    this.from.push(from);
    this.to.push(to);
    this.lengthMm += (to - from) * this.side.pieceLength(v);
  }

  finish(after: Neighbour): Stretch {
    const { chain, x, y, span, piece, from, to, lengthMm, before } = this;
    const pen = this.side.lines.pen[chain];
    const [atStart, atEnd] = [before.deviation < 0, after.deviation < 0];
    const deviation = Math.max(before.deviation, after.deviation, 0);
    const excusedEnds = Number(before.excused) + Number(after.excused);
    return { chain, pen, x, y, span, piece, from, to, lengthMm, atStart, atEnd, deviation, excusedEnds };
  }

  private point(x: number, y: number): void {
    this.x.push(x);
    this.y.push(y);
  }
}

/** The point half-way along a stretch. */
export function middleOf(stretch: Stretch): { x: number; y: number } {
  const { x, y } = stretch;
  let left = stretch.lengthMm / 2;
  for (let k = 0; k + 1 < x.length; k++) {
    const dx = x[k + 1] - x[k];
    const dy = y[k + 1] - y[k];
    const length = Math.sqrt(dx * dx + dy * dy);
    if (length >= left && length > 0)
      return { x: x[k] + (left / length) * dx, y: y[k] + (left / length) * dy };
    left -= length;
  }
  return { x: x[x.length - 1], y: y[y.length - 1] };
}
