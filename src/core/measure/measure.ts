import { segmentLength } from '../geometry/length.js';
import { moveSeconds } from '../geometry/motion.js';
import { followProgram } from '../program/followProgram.js';
import type { Program } from '../program/program.js';
import type { MotionModel } from './motionModel.js';

export interface PenMeasure {
  readonly pen: string;
  readonly runs: number;
  readonly drawnMm: number;
  readonly travelMm: number;
  readonly seconds: number;
}

export interface Measure {
  /** How often the tool goes down. */
  readonly runs: number;
  /** All lifted travel along the sheet, from and to home included. */
  readonly travelMm: number;
  /** All that is drawn, bridges included. */
  readonly drawnMm: number;
  /** Bridges alone. */
  readonly bridgedMm: number;
  readonly seconds: number;
  /** One for every pen of the program, in its order; a pen without runs has zeros. */
  readonly perPen: readonly PenMeasure[];
}

/**
 * Lengths, runs and time of a program.
 *
 * Lengths have the relative accuracy of `segmentLength`. Time is a model: every run is one move at
 * drawing speed from rest to rest, corners notwithstanding, every travel one from rest to rest, and
 * every run pays for one way down and one way up; a pen change takes none. O(segments).
 */
export function measureProgram(program: Program, model: MotionModel): Measure {
  const acceleration = model.accelerationMmPerS2;
  const height = Math.abs(model.raisedHeightMm - model.downHeightMm);
  const downAndUp =
    moveSeconds(height, model.plungeSpeedMmPerS, acceleration) +
    moveSeconds(height, model.liftSpeedMmPerS, acceleration);
  const perPen = program.pens.map((pen) => ({
    pen: pen.name,
    runs: 0,
    drawnMm: 0,
    travelMm: 0,
    seconds: 0,
  }));
  let current = perPen[0];
  let bridgedMm = 0;
  followProgram(program, {
    beginPen(pen) {
      current = perPen[pen];
    },
    travel(x0, y0, x1, y1) {
      const length = Math.sqrt((x1 - x0) * (x1 - x0) + (y1 - y0) * (y1 - y0));
      current.travelMm += length;
      current.seconds += moveSeconds(length, model.travelSpeedMmPerS, acceleration);
    },
    run(run) {
      let length = 0;
      for (let i = program.first[run]; i < program.first[run + 1]; i++) {
        const l = segmentLength(program.segments, i);
        length += l;
        if (program.bridge[i] === 1) bridgedMm += l;
      }
      current.runs++;
      current.drawnMm += length;
      current.seconds += downAndUp + moveSeconds(length, model.drawSpeedMmPerS, acceleration);
    },
    endPen() {},
  });
  const sum = (of: (pen: PenMeasure) => number) => perPen.reduce((total, pen) => total + of(pen), 0);
  return {
    runs: program.count,
    travelMm: sum((pen) => pen.travelMm),
    drawnMm: sum((pen) => pen.drawnMm),
    bridgedMm,
    seconds: sum((pen) => pen.seconds),
    perPen,
  };
}
