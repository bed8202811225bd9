import type { Place } from '../finding.js';
import type { Affine } from '../geometry/affine.js';
import type { Region } from '../geometry/region.js';
import { ClipRegions } from './clip/clipRegions.js';
import type { Layer } from './drawing.js';
import type { ReadingCode } from './findingKinds.js';
import type { FindingLog } from './findingLog.js';
import type { SvgElement, SvgTree } from './markup/svgTree.js';
import { PathReader } from './path/pathReader.js';
import { DEFAULT_LIMITS, type ReadingLimits } from './readingLimits.js';
import type { ReadingRules } from './readingRules.js';
import { StrokeSink } from './stroke/strokeSink.js';
import { Cascade } from './style/cascade.js';
import type { Style } from './style/computedStyle.js';
import type { LengthContext } from './style/length.js';

/** What an element inherits from where it stands. */
export interface Context extends LengthContext {
  /** User units to page mm. */
  readonly map: Affine;
  readonly style: Style;
  readonly layer: number;
  /** What clip paths and viewports around here leave, page mm; null where there are none. */
  readonly clip: Region | null;
  /** The parent is the root, so a group here is a layer. */
  readonly atTop: boolean;
  /** The `use` targets this is a copy inside of, innermost first. */
  readonly copies: CopyOf | null;
}

/** A copy that `use` makes, and the copy that this one is inside of. */
export interface CopyOf {
  readonly target: SvgElement;
  /** The `use` that makes the copy. */
  readonly use: SvgElement;
  readonly depth: number;
  readonly outer: CopyOf | null;
}

/** Least x and y, greatest x and y; null where it is empty, 'unknown' where it cannot be told. */
export type Box = readonly [number, number, number, number] | null | 'unknown';

type Values = Readonly<Record<string, string | number>>;

/** One reading of one drawing: what it has gathered so far. */
export class Session {
  readonly cascade: Cascade;
  readonly sink: StrokeSink;
  readonly paths = new PathReader();
  readonly clips: ClipRegions = new ClipRegions(this);
  readonly colours: string[] = [];
  readonly layers: Layer[] = [];
  readonly places: Place[] = [];
  elementCount = 0;
  /** Boxes that transforms were measured by, of elements that are in no copy. */
  readonly boxes = new Map<SvgElement, Box>();
  /** How many boxes are being measured inside one another. */
  measuring = 0;
  private readonly colourNumbers = new Map<string, number>();
  /** By element number, plus one; 0 where the element has no place yet. */
  private readonly placeNumbers: Uint32Array;

  constructor(
    readonly tree: SvgTree,
    readonly log: FindingLog,
    readonly rules: ReadingRules,
    readonly limits: ReadingLimits = DEFAULT_LIMITS,
  ) {
    this.sink = new StrokeSink(limits);
    this.cascade = new Cascade(tree, log, limits);
    this.placeNumbers = new Uint32Array(tree.elementCount);
  }

  report(code: ReadingCode, element: SvgElement, first: Values | (() => Values) = {}, count = 1): void {
    this.log.add(code, () => this.tree.placeOf(element), first, count);
  }

  colourNumber(colour: string): number {
    let number = this.colourNumbers.get(colour);
    if (number === undefined) {
      number = this.colours.push(colour) - 1;
      this.colourNumbers.set(colour, number);
    }
    return number;
  }

  /** Copies of an element share its place. */
  placeNumber(element: SvgElement): number {
    const known = this.placeNumbers[element.number];
    if (known > 0) return known - 1;
    const number = this.places.push(this.tree.placeOf(element)) - 1;
    this.placeNumbers[element.number] = number + 1;
    return number;
  }
}

/** A value as people can read it in a message. */
export function shown(text: string): string {
  return text.slice(0, 400).replace(/\s+/g, ' ').trim().slice(0, 60);
}
