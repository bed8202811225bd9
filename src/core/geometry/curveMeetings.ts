import { bowMeetings } from './bowMeetings.js';
import { areApart, type CurvePiece, curvePiece, MOST_PIECE_TURN, meetAtMostOnce } from './curvePiece.js';
import { MeetingSolver } from './refineMeeting.js';
import { ARC, type Segments } from './segments.js';

/** Pairs of pieces looked at, at most: two cubics that meet nine times take some hundreds. */
const MOST_PAIRS = 6000;
/** How far outside a piece, as a share of it, a meeting may lie and still count as the piece's own. */
const SLACK = 1e-6;

/** A part of a segment by its parameters. */
export interface Range {
  readonly t0: number;
  readonly t1: number;
}

/**
 * Meetings of segment i of a, within `rangeA`, and segment j of b, within `rangeB`: crossings, and
 * contacts where the two come within `tolerance` of one another. The same one may be visited twice.
 *
 * Pairs of pieces are halved until a line separates them; until no two of their directions are
 * parallel, when Newton's method finds the one crossing; or until both are plain bows over one chord
 * (see `bowMeetings`).
 * Source of the frame: Sederberg and Meyers (see `meetAtMostOnce`). `size` is the largest coordinate.
 */
export function curveMeetings(
  a: Segments,
  i: number,
  rangeA: Range,
  b: Segments,
  j: number,
  rangeB: Range,
  tolerance: number,
  size: number,
  visit: (s: number, t: number) => void,
): void {
  const noise = 256 * Number.EPSILON * size;
  const rounding = 8 * Number.EPSILON * size;
  const margin = tolerance + noise;
  const pending: [CurvePiece, CurvePiece][] = [];
  const others = startPieces(b, j, rangeB);
  for (const p of startPieces(a, i, rangeA)) {
    for (const q of others) if (!areApart(p, q, margin)) pending.push([p, q]);
  }
  if (pending.length === 0) return;
  const solver = new MeetingSolver(a, i, b, j);
  const stop = 4 * margin;
  const own = (p: CurvePiece, t: number): boolean => {
    const slack = SLACK * (p.t1 - p.t0) + 1e-12;
    return t >= p.t0 - slack && t <= p.t1 + slack;
  };
  const isMeeting = (): boolean =>
    solver.gap <= noise || (solver.gap <= margin && (isEnd(solver.s) || isEnd(solver.t)));

  /** True where the pair is done with. */
  const solve = (p: CurvePiece, q: CurvePiece): boolean => {
    solver.toCrossing((p.t0 + p.t1) / 2, (q.t0 + q.t1) / 2);
    if (!isMeeting() || !own(p, solver.s) || !own(q, solver.t)) return false;
    visit(solver.s, solver.t);
    return true;
  };

  const cross = (p: CurvePiece, q: CurvePiece, s: number, t: number): void => {
    solver.toCrossing(s, t);
    if (isMeeting() && own(p, solver.s) && own(q, solver.t)) visit(solver.s, solver.t);
    else if (solver.gapAt(s, t) <= margin) visit(s, t);
  };
  const touch = (p: CurvePiece, q: CurvePiece, s: number, t: number): void => {
    const isBetter = solver.toContact(s, t) && solver.gap <= margin && own(p, solver.s) && own(q, solver.t);
    if (isBetter) visit(solver.s, solver.t);
    else if (solver.gapAt(s, t) <= margin) visit(s, t);
  };
  const bows = (p: CurvePiece, q: CurvePiece): boolean =>
    bowMeetings(
      a,
      i,
      p,
      b,
      j,
      q,
      margin,
      rounding,
      (s, t) => cross(p, q, s, t),
      (s, t) => touch(p, q, s, t),
    );

  let budget = MOST_PAIRS;
  for (let pair = pending.pop(); pair; pair = pending.pop()) {
    const [p, q] = pair;
    if (areApart(p, q, margin)) continue;
    if (meetAtMostOnce(p, q)) {
      if (solve(p, q)) continue;
    } else if (bows(p, q)) continue;
    const smallest = (p.extent <= stop || p.t1 - p.t0 < 1e-14) && (q.extent <= stop || q.t1 - q.t0 < 1e-14);
    if (smallest || budget-- <= 0) {
      // Too small to tell apart: at a cusp.
      if (!solve(p, q) && solver.gap <= margin) visit(solver.s, solver.t);
      continue;
    }
    if (p.extent >= q.extent ? p.t1 - p.t0 >= 1e-14 : q.t1 - q.t0 < 1e-14) {
      const mid = (p.t0 + p.t1) / 2;
      pending.push([curvePiece(a, i, mid, p.t1), q], [curvePiece(a, i, p.t0, mid), q]);
    } else {
      const mid = (q.t0 + q.t1) / 2;
      pending.push([p, curvePiece(b, j, mid, q.t1)], [p, curvePiece(b, j, q.t0, mid)]);
    }
  }
}

function isEnd(t: number): boolean {
  return t === 0 || t === 1;
}

/** Arcs in pieces small enough for a hull; other segments whole. */
function startPieces(segments: Segments, i: number, { t0, t1 }: Range): CurvePiece[] {
  const turn = segments.kind[i] === ARC ? Math.abs(segments.data[segments.offset[i] + 11]) * (t1 - t0) : 0;
  const count = Math.max(1, Math.ceil(turn / MOST_PIECE_TURN));
  const pieces: CurvePiece[] = [];
  for (let k = 0; k < count; k++) {
    const from = k === 0 ? t0 : t0 + ((t1 - t0) * k) / count;
    const to = k === count - 1 ? t1 : t0 + ((t1 - t0) * (k + 1)) / count;
    pieces.push(curvePiece(segments, i, from, to));
  }
  return pieces;
}
