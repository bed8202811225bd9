import { segmentBox } from '../geometry/box.js';
import { BoxIndex } from './boxIndex.js';
import { EndGrid } from './endGrid.js';
import type { LineSet } from './lineSet.js';
import { isSectionOf, type Section } from './section.js';
import { roughLength } from './spans.js';
import type { Tolerances } from './tolerances.js';
import type { WholePairs } from './wholeSegments.js';

/** Wanted segments whose box holds a place that are tried for what runs through it. */
const MOST_TRIED = 48;
/** As bridges, and what touches them, are in most drawings: a share of the segments too small to index all. */
const FEW_LEFT = 0.02;
/** Segments shorter than this, in `sameMm`, are left to others: two match tolerances. */
const SHORT = 16;

/**
 * Pairs wanted segments that are drawn in several: cut where lines meet, or curves as chords. A drawn
 * segment claims the part of a wanted one that it runs along within narrow bounds; where the claims on a
 * wanted segment cover it from end to end, each once, it and they are settled. Whoever stands in
 * another's place leaves a gap or a double claim, so nothing is settled there and others look closer.
 *
 * Cost: a look-up of ends for each drawn segment without a partner, or a box search where that finds none.
 */
export function pairSections(
  wanted: LineSet,
  drawn: LineSet,
  pairs: WholePairs,
  tolerances: Tolerances,
): void {
  if (!pairs.drawn.includes(-1) || !pairs.wanted.includes(-1)) return;
  const claims = new Claims(wanted, drawn, pairs, tolerances);
  for (let c = 0; c < drawn.count; c++) if (!drawn.dot[c]) claims.followChain(c);
  claims.claimLeft();
  claims.settle();
}

class Claims {
  private readonly pen: Uint32Array;
  private readonly chain: Uint32Array;
  private readonly ends: EndGrid;
  /** Of each drawn segment the wanted one that it claims, or −1, and which part of it. */
  private readonly claimed: Int32Array;
  private readonly from: Float64Array;
  private readonly to: Float64Array;
  private readonly deviation: Float64Array;
  private readonly section: Section = { t0: 0, t1: 0, deviation: 0 };
  /** Drawn segments that no end led to a wanted one, and their pens, in turn. */
  private readonly left: number[] = [];
  private boxes: { index: BoxIndex; segment: Uint32Array } | null = null;

  constructor(
    private readonly wanted: LineSet,
    private readonly drawn: LineSet,
    private readonly pairs: WholePairs,
    private readonly tolerances: Tolerances,
  ) {
    const { segments } = wanted;
    this.pen = new Uint32Array(segments.count);
    this.chain = new Uint32Array(segments.count);
    const open = new Uint8Array(segments.count);
    for (let c = 0; c < wanted.count; c++) {
      for (let i = wanted.first[c]; i < wanted.first[c + 1]; i++) {
        this.pen[i] = wanted.pen[c];
        this.chain[i] = c;
        if (wanted.dot[c] || pairs.wanted[i] >= 0) continue;
        if (roughLength(segments, i) >= SHORT * tolerances.sameMm) open[i] = 1;
      }
    }
    this.isOpen = open;
    this.ends = new EndGrid(segments, tolerances.sameMm, (i) => open[i] === 1);
    const { count } = drawn.segments;
    this.claimed = new Int32Array(count).fill(-1);
    this.from = new Float64Array(count);
    this.to = new Float64Array(count);
    this.deviation = new Float64Array(count);
  }

  private readonly isOpen: Uint8Array;

  followChain(c: number): void {
    const { drawn, pairs, claimed, to, from } = this;
    const { offset, data: d } = drawn.segments;
    const pen = drawn.pen[c];
    for (let j = drawn.first[c]; j < drawn.first[c + 1]; j++) {
      if (pairs.drawn[j] >= 0) continue;
      if (j > drawn.first[c] && claimed[j - 1] >= 0) {
        const w = claimed[j - 1];
        const at = to[j - 1];
        if (at > 0 && at < 1) {
          if (this.claim(j, pen, w, at)) continue;
        } else {
          // Past its end, on to the next of its chain.
          const next = w + (to[j - 1] > from[j - 1] ? 1 : -1);
          const goesOn = next >= 0 && next < this.chain.length && this.chain[next] === this.chain[w];
          if (goesOn && this.claim(j, pen, next, -1)) continue;
        }
      }
      const o = offset[j];
      if (this.claimByEnd(j, pen, d[o], d[o + 1])) continue;
      if (this.claimByEnd(j, pen, d[o + 2], d[o + 3])) continue;
      this.left.push(j, pen);
    }
  }

  /** Looks for whoever runs through the start of those that claimed nothing, where they are many. */
  claimLeft(): void {
    if (this.left.length < FEW_LEFT * this.claimed.length) return;
    for (let k = 0; k < this.left.length; k += 2) this.claimByBox(this.left[k], this.left[k + 1]);
  }

  /** Settles the wanted segments whose claims cover them once. */
  settle(): void {
    const { wanted, claimed, pairs } = this;
    const head = new Int32Array(wanted.segments.count).fill(-1);
    const next = new Int32Array(claimed.length).fill(-1);
    for (let j = 0; j < claimed.length; j++) {
      if (claimed[j] < 0) continue;
      next[j] = head[claimed[j]];
      head[claimed[j]] = j;
    }
    for (let w = 0; w < head.length; w++) {
      if (head[w] < 0) continue;
      const parts: number[] = [];
      for (let j = head[w]; j >= 0; j = next[j]) parts.push(j);
      if (!this.covers(w, parts)) continue;
      pairs.wanted[w] = 0;
      for (const j of parts) {
        pairs.drawn[j] = this.deviation[j];
        if (pairs.drawn[j] > pairs.wanted[w]) pairs.wanted[w] = pairs.drawn[j];
      }
    }
  }

  /** Whether the parts follow each other from end to end, up to a quarter of the match tolerance. */
  private covers(w: number, parts: number[]): boolean {
    const { from, to } = this;
    const low = (j: number): number => Math.min(from[j], to[j]);
    parts.sort((a, b) => low(a) - low(b));
    const slack = (2 * this.tolerances.sameMm) / roughLength(this.wanted.segments, w);
    let at = 0;
    for (const j of parts) {
      if (Math.abs(low(j) - at) > slack) return false;
      at = Math.max(from[j], to[j]);
    }
    return at >= 1 - slack;
  }

  private claim(j: number, pen: number, w: number, knownT0: number): boolean {
    const { section, tolerances } = this;
    if (this.isOpen[w] === 0 || this.pen[w] !== pen) return false;
    const { sameMm, matchMm } = tolerances;
    const { wanted, drawn } = this;
    if (!isSectionOf(wanted.segments, w, drawn.segments, j, knownT0, sameMm, matchMm, section)) return false;
    this.claimed[j] = w;
    this.from[j] = section.t0;
    this.to[j] = section.t1;
    this.deviation[j] = section.deviation;
    return true;
  }

  private claimByEnd(j: number, pen: number, x: number, y: number): boolean {
    let found = false;
    this.ends.visit(x, y, (w) => {
      found = this.claim(j, pen, w, -1);
      return found;
    });
    return found;
  }

  private claimByBox(j: number, pen: number): void {
    this.boxes ??= this.indexOpen();
    const { index, segment } = this.boxes;
    const { offset, data: d } = this.drawn.segments;
    const o = offset[j];
    const reach = this.tolerances.sameMm;
    let left = MOST_TRIED;
    index.visit(d[o] - reach, d[o + 1] - reach, d[o] + reach, d[o + 1] + reach, (k) => {
      left--;
      return this.claim(j, pen, segment[k], -1) || left === 0;
    });
  }

  private indexOpen(): { index: BoxIndex; segment: Uint32Array } {
    const { segments } = this.wanted;
    let count = 0;
    for (let i = 0; i < segments.count; i++) count += this.isOpen[i];
    const segment = new Uint32Array(count);
    const boxes = new Float64Array(4 * count);
    const box = new Float64Array(4);
    let k = 0;
    for (let i = 0; i < segments.count; i++) {
      if (this.isOpen[i] === 0) continue;
      segmentBox(segments, i, box);
      for (let m = 0; m < 4; m++) boxes[4 * k + m] = box[m];
      segment[k++] = i;
    }
    return { index: new BoxIndex(boxes), segment };
  }
}
