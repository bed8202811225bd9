import { BoxIndex } from './boxIndex.js';
import { isNear } from './nearness.js';
import type { Side } from './side.js';
import type { Tolerances } from './tolerances.js';

/** Points that are held against each other one by one. */
export interface Specks {
  readonly x: number[];
  readonly y: number[];
  readonly pen: number[];
  /** The chain of each, and whether it is a dot or a stroke so small that rounding may make it one. */
  readonly chain: number[];
  readonly isDot: boolean[];
  /** How far it reaches. */
  readonly extent: number[];
}

/**
 * The dots of a side, and its strokes of which nothing is paired and that reach no farther than the match
 * tolerance: written with few decimals such a stroke becomes a dot, or a stroke in any direction.
 */
export function specksOf(side: Side, { matchMm }: Tolerances): Specks {
  const { lines, spans } = side;
  const { segments, first } = lines;
  const specks: Specks = { x: [], y: [], pen: [], chain: [], isDot: [], extent: [] };
  for (let c = 0; c < lines.count; c++) {
    if (first[c] === first[c + 1]) continue;
    const noExtent = spans.firstOfChain[c] === spans.firstOfChain[c + 1];
    const isDot = lines.dot[c] === 1 || noExtent;
    const extent = isDot ? 0 : looseExtent(side, c, matchMm);
    if (extent > matchMm) continue;
    const o = segments.offset[first[c]];
    specks.x.push(segments.data[o]);
    specks.y.push(segments.data[o + 1]);
    specks.pen.push(lines.pen[c]);
    specks.chain.push(c);
    specks.isDot.push(isDot);
    specks.extent.push(extent);
  }
  return specks;
}

/** How far a chain reaches; infinite where that is beyond a limit, or something of it is paired. */
function looseExtent(side: Side, chain: number, limit: number): number {
  const { firstOfChain } = side.spans;
  let [minX, minY, maxX, maxY] = [Infinity, Infinity, -Infinity, -Infinity];
  for (let span = firstOfChain[chain]; span < firstOfChain[chain + 1]; span++) {
    if (side.touched[span] === 1) return Number.POSITIVE_INFINITY;
    const { boxes } = side;
    minX = Math.min(minX, boxes[4 * span]);
    minY = Math.min(minY, boxes[4 * span + 1]);
    maxX = Math.max(maxX, boxes[4 * span + 2]);
    maxY = Math.max(maxY, boxes[4 * span + 3]);
    if (maxX - minX > limit || maxY - minY > limit) return Number.POSITIVE_INFINITY;
  }
  return Math.max(maxX - minX, maxY - minY);
}

/**
 * Matches specks one to one, the nearest first by growing reach up to `matchMm`. `mate[i]` is the drawn
 * speck of wanted speck i, or −1; `taken` tells which drawn ones have one.
 */
export function matchSpecks(
  wanted: Specks,
  drawn: Specks,
  tolerances: Tolerances,
): { mate: Int32Array; taken: Uint8Array; deviation: number } {
  const mate = new Int32Array(wanted.x.length).fill(-1);
  const taken = new Uint8Array(drawn.x.length);
  const boxes = new Float64Array(4 * drawn.x.length);
  for (let j = 0; j < drawn.x.length; j++) {
    boxes[4 * j] = boxes[4 * j + 2] = drawn.x[j];
    boxes[4 * j + 1] = boxes[4 * j + 3] = drawn.y[j];
  }
  const index = new BoxIndex(boxes);
  let deviation = 0;
  for (const share of [1 / 64, 1 / 8, 1]) {
    const reach = share * tolerances.matchMm;
    for (let i = 0; i < mate.length; i++) {
      if (mate[i] >= 0) continue;
      let least = reach;
      index.visit(wanted.x[i] - reach, wanted.y[i] - reach, wanted.x[i] + reach, wanted.y[i] + reach, (j) => {
        if (taken[j] === 1 || drawn.pen[j] !== wanted.pen[i]) return false;
        const distance = distanceOf(wanted, i, drawn, j);
        if (distance > least) return false;
        least = distance;
        mate[i] = j;
        return distance === 0;
      });
      if (mate[i] < 0) continue;
      taken[mate[i]] = 1;
      if (least > deviation) deviation = least;
    }
  }
  return { mate, taken, deviation };
}

/**
 * Which of the wanted specks without a mate are drawn all the same: by a line passing within the snap
 * distance; a dot, where repeats are drawn once, by the mate of another within the repeat tolerance; a
 * stroke no longer than two hairs by any ink within the match tolerance.
 */
export function coveredOtherwise(
  wanted: Specks,
  mate: Int32Array,
  drawn: Side,
  once: boolean,
  tolerances: Tolerances,
): Uint8Array {
  const covered = new Uint8Array(mate.length);
  const repeats = once ? new MatedSpecks(wanted, mate) : null;
  for (let i = 0; i < mate.length; i++) {
    if (mate[i] >= 0) continue;
    const { snapMm, matchMm, hairMm, repeatMm } = tolerances;
    if (wanted.extent[i] > 2 * hairMm) continue;
    const reach = wanted.isDot[i] ? snapMm + matchMm : matchMm;
    const onLine = isNear(wanted.x[i], wanted.y[i], drawn, wanted.pen[i], reach);
    if (onLine || repeats?.hasNear(i, repeatMm)) covered[i] = 1;
  }
  return covered;
}

class MatedSpecks {
  private readonly index: BoxIndex;
  private readonly mated: number[] = [];

  constructor(
    private readonly specks: Specks,
    mate: Int32Array,
  ) {
    for (let i = 0; i < mate.length; i++) if (mate[i] >= 0) this.mated.push(i);
    const boxes = new Float64Array(4 * this.mated.length);
    this.mated.forEach((i, k) => {
      boxes[4 * k] = boxes[4 * k + 2] = specks.x[i];
      boxes[4 * k + 1] = boxes[4 * k + 3] = specks.y[i];
    });
    this.index = new BoxIndex(boxes);
  }

  hasNear(i: number, reach: number): boolean {
    const { specks, mated } = this;
    const x = specks.x[i];
    const y = specks.y[i];
    let found = false;
    this.index.visit(x - reach, y - reach, x + reach, y + reach, (k) => {
      found = specks.pen[mated[k]] === specks.pen[i] && distanceOf(specks, i, specks, mated[k]) <= reach;
      return found;
    });
    return found;
  }
}

function distanceOf(a: Specks, i: number, b: Specks, j: number): number {
  const dx = a.x[i] - b.x[j];
  const dy = a.y[i] - b.y[j];
  return Math.sqrt(dx * dx + dy * dy);
}
