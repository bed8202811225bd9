import { BoxIndex } from './boxIndex.js';
import { totalLength } from './intervals.js';
import { nearParts } from './nearness.js';
import type { Side } from './side.js';
import { findOverlap, newOverlap } from './sideBySide.js';
import { unpairedStretches } from './stretches.js';
import type { Tolerances } from './tolerances.js';

/** Pieces that differ in direction by more than 60° are not paired. */
const LEAST_COSINE = 0.5;
/** A leftover of one side, the two lines that were paired across, and one of the other: three steps. */
const STEPS = 3;

interface Leftover {
  readonly span: number;
  readonly piece: number;
  readonly from: number;
  readonly to: number;
}

/**
 * Pairs what is left over on both sides where lines lie so close together that either may have been paired
 * with another's partner: near a hub, say, where dozens run together. A drawn leftover lies within the
 * match tolerance of a wanted line whose partner lies within it of a wanted leftover, so the two are at
 * most three tolerances apart. All of either leftover must lie within the match tolerance of the other
 * side's ink, and still no point is paired twice: so nothing can be lost where the next line is farther
 * away than the tolerance, and nothing be drawn more often.
 *
 * Cost: a search for each leftover piece.
 */
export function exchangeLeftovers(wanted: Side, drawn: Side, tolerances: Tolerances): void {
  const added = leftoversOf(drawn).filter((part) => isBeside(drawn, part, wanted, tolerances));
  if (added.length === 0) return;
  const boxes = new Float64Array(4 * added.length);
  added.forEach(({ piece }, k) => {
    boxes[4 * k] = Math.min(drawn.x[piece], drawn.x[piece + 1]);
    boxes[4 * k + 1] = Math.min(drawn.y[piece], drawn.y[piece + 1]);
    boxes[4 * k + 2] = Math.max(drawn.x[piece], drawn.x[piece + 1]);
    boxes[4 * k + 3] = Math.max(drawn.y[piece], drawn.y[piece + 1]);
  });
  const index = new BoxIndex(boxes);
  const reach = STEPS * tolerances.matchMm;
  for (const part of leftoversOf(wanted)) {
    const { span, piece: w } = part;
    const [ax, ay, bx, by] = [wanted.x[w], wanted.y[w], wanted.x[w + 1], wanted.y[w + 1]];
    const near: number[] = [];
    const [minX, minY] = [Math.min(ax, bx) - reach, Math.min(ay, by) - reach];
    const [maxX, maxY] = [Math.max(ax, bx) + reach, Math.max(ay, by) + reach];
    index.visit(minX, minY, maxX, maxY, (k) => {
      if (drawn.penOf(added[k].span) === wanted.penOf(span)) near.push(k);
      return false;
    });
    if (near.length === 0 || !isBeside(wanted, part, drawn, tolerances)) continue;
    for (const k of near.sort((p, q) => p - q)) {
      pairParts(drawn, added[k].span, added[k].piece, wanted, span, w, tolerances.matchMm);
    }
  }
}

function leftoversOf(side: Side): Leftover[] {
  const parts: Leftover[] = [];
  for (const { span, piece, from, to } of unpairedStretches(side, 0)) {
    for (let k = 0; k < piece.length; k++) {
      parts.push({ span: span[k], piece: piece[k], from: from[k], to: to[k] });
    }
  }
  return parts;
}

/** Whether all of a leftover lies within the match tolerance of the other side. */
function isBeside(
  side: Side,
  { span, piece, from, to }: Leftover,
  other: Side,
  tolerances: Tolerances,
): boolean {
  const x = [from, to].map((t) => side.x[piece] + t * (side.x[piece + 1] - side.x[piece]));
  const y = [from, to].map((t) => side.y[piece] + t * (side.y[piece + 1] - side.y[piece]));
  const near = totalLength(nearParts({ x, y, pen: side.penOf(span) }, other, tolerances.matchMm));
  return (to - from) * side.pieceLength(piece) - near <= tolerances.hairMm;
}

/** Pairs what is free of two pieces opposite each other. */
function pairParts(
  drawn: Side,
  spanA: number,
  v: number,
  wanted: Side,
  spanB: number,
  w: number,
  matchMm: number,
): void {
  const o = newOverlap();
  const [ax, ay, ax1, ay1] = [drawn.x[v], drawn.y[v], drawn.x[v + 1], drawn.y[v + 1]];
  const [bx, by, bx1, by1] = [wanted.x[w], wanted.y[w], wanted.x[w + 1], wanted.y[w + 1]];
  if (!findOverlap(ax, ay, ax1, ay1, bx, by, bx1, by1, STEPS * matchMm, LEAST_COSINE, o)) return;
  // In truth no more than the tolerance: each was exchanged for one that is nearer.
  const deviation = Math.min(matchMm, Math.max(Math.abs(o.offsetFrom), Math.abs(o.offsetTo)));
  const widthA = o.to0 - o.from0;
  const widthB = o.to1 - o.from1;
  const freeA = drawn.unpaired(spanA, v, o.from0, o.to0);
  for (let i = 0; i < freeA.length; i += 2) {
    const s = o.from1 + ((freeA[i] - o.from0) / widthA) * widthB;
    const t = o.from1 + ((freeA[i + 1] - o.from0) / widthA) * widthB;
    const freeB = wanted.unpaired(spanB, w, Math.min(s, t), Math.max(s, t));
    for (let j = 0; j < freeB.length; j += 2) {
      const a = o.from0 + ((freeB[j] - o.from1) / widthB) * widthA;
      const b = o.from0 + ((freeB[j + 1] - o.from1) / widthB) * widthA;
      drawn.pair(spanA, v, Math.max(0, Math.min(a, b)), Math.min(1, Math.max(a, b)), deviation);
      wanted.pair(spanB, w, freeB[j], freeB[j + 1], deviation);
    }
  }
}
