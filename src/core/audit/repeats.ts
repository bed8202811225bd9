import { LINE } from '../geometry/segments.js';
import { BoxIndex } from './boxIndex.js';
import { spansWithCompany } from './company.js';
import { addInterval, type Intervals, totalLength } from './intervals.js';
import { isNear, visitPieces } from './nearness.js';
import { deviationOf } from './sameSegment.js';
import type { Side } from './side.js';
import { findOverlap, newOverlap } from './sideBySide.js';
import { type Stretch, unpairedStretches } from './stretches.js';
import type { Tolerances } from './tolerances.js';
import { twinsOfPaired } from './wholeSegments.js';

/**
 * A line may be excused by one at up to 20° from it, as pieces of flattened curves may turn from each
 * other. So where two lines meet at a narrower angle, the tips that lie within the tolerance of each other
 * repeat each other, however short they are; at a wider angle a tip that is not drawn is missed.
 */
const EXCUSE_COSINE = 0.94;
/** To count as drawn twice, lines must run in nearly the same direction. */
const PARALLEL_COSINE = 0.98;
/** Curves that touch run together within the tolerance for a while: 0.2 mm, in tolerances. */
const MEETING = 20;

/**
 * Takes what is wanted but unpaired as drawn where it repeats a wanted line that is paired.
 *
 * A line may repeat one that repeats the drawn one, so a second pass lets what was excused in the first
 * stand for others, if a drawn line lies within both tolerances. Cost: a search for each unpaired piece.
 */
export function excuseRepeats(wanted: Side, drawn: Side, tolerances: Tolerances): void {
  excuseTwins(wanted, tolerances);
  for (let pass = 0; pass < 2; pass++) {
    const stretches = unpairedStretches(wanted, 0);
    if (stretches.length === 0) return;
    const paired = new PairedSpans(wanted, wanted.touched);
    const excuses: { span: number; piece: number; parts: Intervals }[] = [];
    for (const stretch of stretches) {
      for (let k = 0; k < stretch.piece.length; k++) {
        if (pass === 1 && !isDrawnNear(stretch, k, drawn, tolerances)) continue;
        const parts = repeatedParts(paired, stretch, k, tolerances);
        if (parts.length > 0) excuses.push({ span: stretch.span[k], piece: stretch.piece[k], parts });
      }
    }
    // Only now: what is excused in a pass must not excuse others in the same pass.
    for (const { span, piece, parts } of excuses) {
      for (let i = 0; i < parts.length; i += 2) {
        wanted.excuse(span, piece, parts[i], parts[i + 1], tolerances.repeatMm);
      }
    }
  }
}

/** Most repeats are whole segments that stand twice: borders that two shapes share. */
function excuseTwins(wanted: Side, { sameMm, repeatMm }: Tolerances): void {
  if (repeatMm < sameMm || !wanted.wholeSegment.includes(0)) return;
  const { lines, spans } = wanted;
  const twins = twinsOfPaired(lines, wanted.wholeSegment, sameMm);
  for (let i = 0; i < twins.length; i++) {
    if (twins[i] < 0) continue;
    for (let span = spans.firstOfSegment[i]; span < spans.firstOfSegment[i + 1]; span++) {
      wanted.excuseSpan(span, twins[i]);
    }
  }
}

function isDrawnNear(stretch: Stretch, k: number, drawn: Side, tolerances: Tolerances): boolean {
  const x = (stretch.x[k] + stretch.x[k + 1]) / 2;
  const y = (stretch.y[k] + stretch.y[k + 1]) / 2;
  return isNear(x, y, drawn, stretch.pen, tolerances.repeatMm + tolerances.matchMm);
}

/** The fractions of part k's piece, within the part, that repeat something paired. */
function repeatedParts(paired: PairedSpans, stretch: Stretch, k: number, tolerances: Tolerances): Intervals {
  const parts: Intervals = [];
  const [from, to] = [stretch.from[k], stretch.to[k]];
  const accept = (low: number, high: number): boolean => {
    const a = Math.max(from, low);
    const b = Math.min(to, high);
    if (b > a) addInterval(parts, a, b, 0);
    return parts.length === 2 && parts[0] <= from && parts[1] >= to;
  };
  visitPairedBeside(
    paired,
    stretch.piece[k],
    stretch.pen,
    tolerances.repeatMm,
    EXCUSE_COSINE,
    isOther,
    accept,
  );
  return parts;
}

/**
 * The length that is drawn again on a place where something is drawn already: paired wanted lines beside
 * others that are paired as well, each pair counted once. Lines that run together for less than twenty
 * tolerances merely meet or cross, unless that is the whole of them. Of curves that were paired whole,
 * only those are seen that repeat each other whole.
 */
export function drawnAgainMm(wanted: Side, tolerances: Tolerances): number {
  const { spans, lines } = wanted;
  const { repeatMm } = tolerances;
  const counts = (a: number, b: number): boolean => mayRepeat(wanted, a, b, repeatMm) !== 'none';
  const company = spansWithCompany(wanted, repeatMm, PARALLEL_COSINE, counts);
  if (!company.includes(1)) return 0;
  // Whoever has company is company.
  const paired = new PairedSpans(wanted, company);
  let sum = 0;
  for (let chain = 0; chain < lines.count; chain++) {
    let together = 0;
    let whole = true;
    let chainSum = 0;
    const close = (): void => {
      if (together >= MEETING * repeatMm) chainSum += together;
      together = 0;
    };
    for (let span = spans.firstOfChain[chain]; span < spans.firstOfChain[chain + 1]; span++) {
      const beside = company[span] === 1 ? companyOf(paired, span, repeatMm) : 'none';
      if (beside === 'none') {
        close();
        whole = false;
        continue;
      }
      const first = wanted.flatten(span);
      for (let v = first; v < first + wanted.pieceCount(span); v++) {
        const length = wanted.pieceLength(v);
        const parts = beside === 'twin' ? [0, 1] : againParts(paired, span, v, lines.pen[chain], tolerances);
        if (parts.length === 2 && parts[0] <= 1e-9 && parts[1] >= 1 - 1e-9) {
          together += length;
          continue;
        }
        whole = false;
        for (let i = 0; i < parts.length; i += 2) {
          if (parts[i] > 1e-9) close();
          together += (parts[i + 1] - parts[i]) * length;
          if (parts[i + 1] < 1 - 1e-9) close();
        }
        if (parts.length === 0) close();
      }
    }
    if (whole) sum += chainSum + together;
    else {
      close();
      sum += chainSum;
    }
  }
  return sum;
}

/**
 * What lies about a paired span: nothing that it could repeat; something to compare it with piece by
 * piece; or an earlier segment that it repeats whole.
 */
function companyOf(paired: PairedSpans, span: number, reach: number): 'none' | 'some' | 'twin' {
  const { side } = paired;
  const { boxes } = side;
  const { segment } = side.spans;
  if (side.lines.segments.kind[segment[span]] === LINE) return 'some';
  const o = 4 * span;
  let found: 'none' | 'some' | 'twin' = 'none';
  paired.visit(boxes[o] - reach, boxes[o + 1] - reach, boxes[o + 2] + reach, boxes[o + 3] + reach, (w) => {
    const next = mayRepeat(side, span, w, reach);
    if (next === 'some' || (next === 'twin' && segment[w] < segment[span])) found = next;
    return found === 'twin';
  });
  return found;
}

/** What span `other` may be to a span, of which one is no line: nothing, beside it, or the same curve. */
function mayRepeat(side: Side, span: number, other: number, reach: number): 'none' | 'some' | 'twin' {
  const { chain, segment } = side.spans;
  const { segments } = side.lines;
  const [i, j] = [segment[span], segment[other]];
  if (i === j || side.penOf(span) !== side.penOf(other)) return 'none';
  const curves = segments.kind[i] !== LINE && segments.kind[j] !== LINE;
  if (curves && side.wholeSegment[i] === 1 && side.wholeSegment[j] === 1) {
    return deviationOf(segments, i, segments, j, reach) <= reach ? 'twin' : 'none';
  }
  const joined = chain[span] === chain[other] && Math.abs(i - j) <= 1;
  return !joined || foldsBack(side, i, j) ? 'some' : 'none';
}

/** Whether two segments run in roughly opposite directions from end to end. */
function foldsBack(side: Side, i: number, j: number): boolean {
  const { offset, data: d } = side.lines.segments;
  const [o, p] = [offset[i], offset[j]];
  const ax = d[o + 2] - d[o];
  const ay = d[o + 3] - d[o + 1];
  const bx = d[p + 2] - d[p];
  const by = d[p + 3] - d[p + 1];
  const dot = ax * bx + ay * by;
  return dot < 0 && 4 * dot * dot > (ax * ax + ay * ay) * (bx * bx + by * by);
}

function againParts(
  paired: PairedSpans,
  span: number,
  v: number,
  pen: number,
  tolerances: Tolerances,
): Intervals {
  const own = paired.side.pairedParts(span, v, 0, 1);
  const parts: Intervals = [];
  if (own.length === 0) return parts;
  // In a crowd nearly all of a line will do, or every line would be held against every other.
  const enough = totalLength(own) - tolerances.repeatMm / paired.side.pieceLength(v);
  visitPairedBeside(paired, v, pen, tolerances.repeatMm, PARALLEL_COSINE, isEarlier, (low, high) => {
    for (let i = 0; i < own.length; i += 2) {
      const from = Math.max(low, own[i]);
      const to = Math.min(high, own[i + 1]);
      if (to > from) addInterval(parts, from, to, 1e-12);
    }
    return totalLength(parts) >= enough;
  });
  return parts;
}

function isOther(v: number, w: number): boolean {
  return v !== w;
}

function isEarlier(v: number, w: number): boolean {
  return w < v;
}

/** Those of a side's spans that belong, for searching. */
class PairedSpans {
  private readonly index: BoxIndex;
  /** The span of each box; null where all are paired. */
  private readonly spanOf: number[] | null;

  constructor(
    readonly side: Side,
    belongs: Uint8Array,
  ) {
    const { boxes } = side;
    const { count } = side.spans;
    const spans: number[] = [];
    for (let span = 0; span < count; span++) if (belongs[span] === 1) spans.push(span);
    this.spanOf = spans.length === count ? null : spans;
    if (this.spanOf === null) {
      this.index = side.index;
      return;
    }
    const own = new Float64Array(4 * spans.length);
    for (let k = 0; k < own.length; k++) own[k] = boxes[4 * spans[k >> 2] + (k & 3)];
    this.index = new BoxIndex(own);
  }

  visit(minX: number, minY: number, maxX: number, maxY: number, visit: (span: number) => boolean): void {
    const { spanOf } = this;
    this.index.visit(minX, minY, maxX, maxY, spanOf === null ? visit : (k) => visit(spanOf[k]));
  }
}

/** Calls `accept` with the fractions of piece v beside which other paired pieces run, until it returns true. */
function visitPairedBeside(
  paired: PairedSpans,
  v: number,
  pen: number,
  reach: number,
  leastCosine: number,
  counts: (v: number, w: number) => boolean,
  accept: (from: number, to: number) => boolean,
): void {
  const { side } = paired;
  const o = newOverlap();
  const ax = side.x[v];
  const ay = side.y[v];
  const bx = side.x[v + 1];
  const by = side.y[v + 1];
  const beside = (w: number, span: number): boolean => {
    if (!counts(v, w)) return false;
    const { x, y } = side;
    if (!findOverlap(ax, ay, bx, by, x[w], y[w], x[w + 1], y[w + 1], reach, leastCosine, o)) return false;
    const parts = side.pairedParts(span, w, Math.min(o.from1, o.to1), Math.max(o.from1, o.to1));
    for (let i = 0; i < parts.length; i += 2) {
      const s = o.from0 + ((parts[i] - o.from1) / (o.to1 - o.from1)) * (o.to0 - o.from0);
      const t = o.from0 + ((parts[i + 1] - o.from1) / (o.to1 - o.from1)) * (o.to0 - o.from0);
      if (accept(Math.min(s, t), Math.max(s, t))) return true;
    }
    return false;
  };
  visitPieces(side, paired, pen, ax, ay, bx, by, reach, beside);
}
