import { type CurvePiece, isNearlyStraight } from './curvePiece.js';
import { derivativeAt, pointAt } from './evaluate.js';
import { secondDerivativeAt } from './secondDerivative.js';
import type { Segments } from './segments.js';

/** Parts of the shared stretch at whose ends the bends are compared. */
const PARTS = 8;
const HALVINGS = 60;

/**
 * Meetings of two plain bows that run about in the same direction, where tangents may be parallel:
 * contacts, and crossings however close together. False where the pieces are no such bows.
 *
 * Over the chord of the first both are functions y(x), and their difference g is as smooth as they are.
 * It is cut where g″ changes its sign, so that each part is bent one way only: it has at most one
 * extreme, found by halving on g′, and at most one root on either side of that. `contact` is called
 * where |g| is least and no more than `tolerance`, without a change of sign or within `rounding`.
 */
export function bowMeetings(
  a: Segments,
  i: number,
  p: CurvePiece,
  b: Segments,
  j: number,
  q: CurvePiece,
  tolerance: number,
  rounding: number,
  crossing: (s: number, t: number) => void,
  contact: (s: number, t: number) => void,
): boolean {
  if (!isNearlyStraight(p) || !isNearlyStraight(q)) return false;
  const end = p.hull.length - 2;
  const frame = frameOf(p.hull[0], p.hull[1], p.hull[end], p.hull[end + 1]);
  if (!frame) return false;
  const first = graphOf(a, i, p, frame);
  const second = graphOf(b, j, q, frame);
  if (!first || !second) return false;
  const low = Math.max(first.low, second.low);
  const high = Math.min(first.high, second.high);
  if (!(low < high)) return low - high <= tolerance ? touch(first, second, low, tolerance, contact) : true;

  const g = (x: number): number => first.at(x).y - second.at(x).y;
  const slope = (x: number): number => first.at(x).slope - second.at(x).slope;
  const bend = (x: number): number => first.at(x).bend - second.at(x).bend;
  const meetings: Meeting[] = [];
  const cuts = cutsWhere(bend, low, high);
  for (let k = 1; k < cuts.length; k++) oneWay(g, slope, cuts[k - 1], cuts[k], tolerance, rounding, meetings);
  meetings.sort((m, n) => m.x - n.x);
  let last: Meeting | null = null;
  for (const meeting of meetings) {
    // Within rounding all the way: the same meeting, which no arithmetic here can place any better.
    if (last && Math.abs(g((last.x + meeting.x) / 2)) <= rounding && isSame(g, last, meeting, rounding))
      continue;
    const s = first.at(meeting.x).t;
    const t = second.at(meeting.x).t;
    if (meeting.touches) contact(s, t);
    else crossing(s, t);
    last = meeting;
  }
  return true;
}

interface Meeting {
  readonly x: number;
  readonly touches: boolean;
}

function isSame(g: (x: number) => number, m: Meeting, n: Meeting, rounding: number): boolean {
  return [0.25, 0.75].every((share) => Math.abs(g(m.x + share * (n.x - m.x))) <= rounding);
}

/** Ends that just reach one another. */
function touch(
  first: Graph,
  second: Graph,
  x: number,
  tolerance: number,
  contact: (s: number, t: number) => void,
): true {
  const p = first.at(x);
  const q = second.at(x);
  if (Math.abs(p.y - q.y) <= tolerance) contact(p.t, q.t);
  return true;
}

/** The parts of [low, high] between changes of sign of `bend`. */
function cutsWhere(bend: (x: number) => number, low: number, high: number): number[] {
  const cuts = [low];
  let x = low;
  let value = bend(low);
  for (let k = 1; k <= PARTS; k++) {
    const next = k === PARTS ? high : low + ((high - low) * k) / PARTS;
    const nextValue = bend(next);
    if (value !== 0 && nextValue !== 0 && value > 0 !== nextValue > 0) cuts.push(rootOf(bend, x, next));
    x = next;
    value = nextValue;
  }
  cuts.push(high);
  return cuts;
}

/** Roots and contacts on [low, high], where g is bent one way. */
function oneWay(
  g: (x: number) => number,
  slope: (x: number) => number,
  low: number,
  high: number,
  tolerance: number,
  rounding: number,
  meetings: Meeting[],
): void {
  const atLow = g(low);
  const atHigh = g(high);
  const falls = slope(low);
  const rises = slope(high);
  if (falls === 0 || rises === 0 || falls > 0 === rises > 0) {
    if (Math.abs(atLow) <= rounding) meetings.push({ x: low, touches: falls === 0 });
    else if (Math.abs(atHigh) <= rounding) meetings.push({ x: high, touches: rises === 0 });
    else if (atLow > 0 !== atHigh > 0) meetings.push({ x: rootOf(g, low, high), touches: false });
    return;
  }
  const extreme = rootOf(slope, low, high);
  const value = g(extreme);
  if (Math.abs(value) <= rounding) {
    meetings.push({ x: extreme, touches: true });
    return;
  }
  const before = value > 0 !== atLow > 0;
  const after = value > 0 !== atHigh > 0;
  if (before) meetings.push({ x: rootOf(g, low, extreme), touches: false });
  if (after) meetings.push({ x: rootOf(g, extreme, high), touches: false });
  const isNearest = Math.abs(value) <= Math.min(Math.abs(atLow), Math.abs(atHigh));
  if (!before && !after && isNearest && Math.abs(value) <= tolerance) {
    meetings.push({ x: extreme, touches: true });
  }
}

/** Where f changes its sign between low and high, by halving; one of the two may be 0. */
function rootOf(f: (x: number) => number, low: number, high: number): number {
  const rising = f(low) < 0 || f(high) > 0;
  for (let k = 0; k < HALVINGS; k++) {
    const mid = (low + high) / 2;
    if (mid <= low || mid >= high) break;
    const value = f(mid);
    if (value === 0) return mid;
    if (value > 0 === rising) high = mid;
    else low = mid;
  }
  return (low + high) / 2;
}

interface Frame {
  readonly x: number;
  readonly y: number;
  /** Unit vector along. */
  readonly cos: number;
  readonly sin: number;
}

function frameOf(x0: number, y0: number, x1: number, y1: number): Frame | null {
  const length = Math.sqrt((x1 - x0) * (x1 - x0) + (y1 - y0) * (y1 - y0));
  return length > 0 ? { x: x0, y: y0, cos: (x1 - x0) / length, sin: (y1 - y0) / length } : null;
}

/** A piece as a function y(x) in a frame; `at` gives its own object again and again. */
interface Graph {
  readonly low: number;
  readonly high: number;
  at(x: number): State;
}

interface State {
  /** The parameter. */
  t: number;
  y: number;
  /** y′ and y″ by x. */
  slope: number;
  bend: number;
}

function graphOf(segments: Segments, i: number, piece: CurvePiece, frame: Frame): Graph | null {
  const { cos, sin } = frame;
  let direction = 0;
  for (let k = 0; k < piece.cone.length; k += 2) {
    const along = cos * piece.cone[k] + sin * piece.cone[k + 1];
    const across = cos * piece.cone[k + 1] - sin * piece.cone[k];
    const sign = Math.sign(along);
    if (Math.abs(across) > 2 * Math.abs(along) || (direction !== 0 && sign !== direction)) return null;
    direction = sign;
  }
  if (direction === 0) return null;
  const v = new Float64Array(2);
  const xAt = (t: number): number => {
    pointAt(segments, i, t, v);
    return cos * (v[0] - frame.x) + sin * (v[1] - frame.y);
  };
  const x0 = xAt(piece.t0);
  const x1 = xAt(piece.t1);
  const state: State = { t: 0, y: 0, slope: 0, bend: 0 };
  return {
    low: Math.min(x0, x1),
    high: Math.max(x0, x1),
    at: (x) => {
      let low = piece.t0;
      let high = piece.t1;
      let t = x1 === x0 ? low : low + ((high - low) * (x - x0)) / (x1 - x0);
      t = Math.min(Math.max(t, low), high);
      let miss = 0;
      let vx = 0;
      let vy = 0;
      for (let step = 0; step < HALVINGS; step++) {
        miss = x - xAt(t);
        derivativeAt(segments, i, t, v);
        vx = cos * v[0] + sin * v[1];
        vy = cos * v[1] - sin * v[0];
        if (miss === 0) break;
        if (miss > 0 === direction > 0) low = t;
        else high = t;
        const newton = t + miss / vx;
        const next = newton >= low && newton <= high ? newton : (low + high) / 2;
        if (Math.abs(next - t) <= Number.EPSILON || next === t) break;
        t = next;
      }
      pointAt(segments, i, t, v);
      state.t = t;
      state.slope = vy / vx;
      state.y = cos * (v[1] - frame.y) - sin * (v[0] - frame.x) + state.slope * miss;
      secondDerivativeAt(segments, i, t, v);
      const ax = cos * v[0] + sin * v[1];
      const ay = cos * v[1] - sin * v[0];
      state.bend = (vx * ay - vy * ax) / (vx * vx * vx);
      return state;
    },
  };
}
