import { type AuditResult, auditLines } from './audit/audit.js';
import type { LineSet } from './audit/lineSet.js';
import { linesOfDrawing, linesOfProgram } from './audit/lines.js';
import type { Drawing } from './drawing/drawing.js';
import { type PenPlan, planPens, strokesOfPens } from './drawing/pens.js';
import { choosePens } from './drawing/penWishes.js';
import { readDrawing } from './drawing/readDrawing.js';
import type { MachineProfile } from './machine/profile.js';
import { type Measure, measureProgram } from './measure/measure.js';
import { liftsFirst, travelCost, type Weigh } from './metric/metric.js';
import { buildNetwork } from './network/buildNetwork.js';
import type { Network } from './network/network.js';
import { type HomeRule, programAsDrawn, programFromTours } from './program/fromTours.js';
import type { Program } from './program/program.js';
import { readGcode } from './program/readGcode.js';
import { type Hooks, REPEAT_TOLERANCE_MM, type Settings } from './settings.js';
import { findTour } from './tour/findTour.js';
import { ROUNDING } from './tour/lowerBound.js';
import type { Tour } from './tour/tour.js';
import { writeGcode } from './write/gcode.js';
import { withoutTravel, writeSvg } from './write/svg.js';

/** Curves written as SVG lie within 20 steps of the fourth decimal place. */
const SVG_ACCURACY_MM = 0.002;

/** A drawing put in order, with everything that the report and the writers need. */
export interface Ordered {
  readonly drawing: Drawing;
  readonly settings: Settings;
  readonly profile: MachineProfile;
  readonly plan: PenPlan;
  readonly networks: readonly Network[];
  readonly tours: readonly Tour[];
  readonly before: { readonly program: Program; readonly measure: Measure };
  readonly after: { readonly program: Program; readonly measure: Measure };
  /** With junctions at crossings: what both ways came to. The better one was kept. */
  readonly crossings: Crossings | null;
}

/** What junctions where lines cross came to, over all pens. */
export interface Crossings {
  readonly count: number;
  readonly without: Measure;
  readonly with: Measure;
  readonly kept: boolean;
}

/**
 * The whole job but for writing: drawing → network → matching → tour → program → measure, each pen for
 * itself. Pens must leave a stroke to draw; throws RangeError otherwise.
 */
export function orderDrawing(
  whole: Drawing,
  settings: Settings,
  profile: MachineProfile,
  hooks: Hooks = {},
): Ordered {
  const drawing = choosePens(whole, settings.pens, settings);
  if (drawing.strokes.count === 0) throw new RangeError('the drawing has no stroke');
  if (settings.junctions !== 'crossing') return orderOnce(drawing, settings, profile, hooks);
  // Junctions at crossings cost vertices, and with them search: they have to pay.
  const without = orderOnce(drawing, { ...settings, junctions: 'touching' }, profile, hooks);
  const crossed = orderOnce(drawing, settings, profile, hooks);
  const count = crossed.networks.reduce((sum, network) => sum + network.crossings, 0);
  const kept = count > 0 && pays(crossed.after.measure, without.after.measure, settings);
  const crossings = { count, without: without.after.measure, with: crossed.after.measure, kept };
  return { ...(kept ? crossed : without), settings, crossings };
}

function orderOnce(drawing: Drawing, settings: Settings, profile: MachineProfile, hooks: Hooks): Ordered {
  const plan = planPens(drawing, settings.pens, settings);
  const strokesOfPen = strokesOfPens(plan);
  const [homeX, homeY] = settings.homeMm ?? [0, drawing.heightMm];
  const home: HomeRule = { homeX, homeY, endAtHome: settings.end === 'home' };

  const networks = strokesOfPen.map((strokes, pen) => {
    hooks.onProgress?.({ doing: 'network', share: pen / plan.pens.length, costMm: null });
    return buildNetwork(drawing, strokes, { ...settings, repeatToleranceMm: REPEAT_TOLERANCE_MM });
  });
  const tours = networks.map((network, pen) => {
    hooks.onProgress?.({ doing: 'pairing', share: pen / networks.length, costMm: null });
    const last = pen === networks.length - 1;
    const task = {
      homeX,
      homeY,
      end: last ? settings.end : 'home',
      ...weighing(network, home, settings),
    };
    return findTour(network, task, {
      matching: settings.matching,
      bound: settings.bound,
      kicksPerEnd: settings.effort,
      seed: settings.seed,
      shouldStop: hooks.shouldStop ?? (() => false),
      onProgress: (share, costMm) =>
        hooks.onProgress?.({ doing: 'improve', share: (pen + share) / networks.length, costMm }),
    });
  });

  const asDrawn = programAsDrawn(drawing, plan.pens, strokesOfPen, home);
  const before = { program: asDrawn, measure: measureProgram(asDrawn, profile) };
  const found = programFromTours(drawing, plan.pens, networks, tours, home);
  const measured = measureProgram(found, profile);
  const all = networks.every(drawsAll);
  const after =
    all && isWorse(measured, before.measure, settings) ? before : { program: found, measure: measured };
  return { drawing, settings, profile, plan, networks, tours, before, after, crossings: null };
}

/** A text as it is to be written, and what the audit of its reading found. */
export interface Written {
  readonly kind: 'svg' | 'gcode';
  readonly text: string;
  readonly audit: AuditResult;
}

/** Writes the program as text, reads that text back and holds it against the drawing. */
export function writeAudited(ordered: Ordered, kind: 'svg' | 'gcode', showTravel = false): Written {
  const { drawing, settings, profile, after } = ordered;
  const { widthMm, heightMm, title, description, name } = drawing;
  const text =
    kind === 'svg'
      ? writeSvg(after.program, { widthMm, heightMm, title, description, travel: showTravel })
      : writeGcode(after.program, profile, {
          pageWidthMm: widthMm,
          pageHeightMm: heightMm,
          name,
          facts: after.measure,
        });
  const audit = auditLines(linesOfDrawing(drawing, ordered.plan), readBack(text, kind), {
    snapMm: settings.snapMm,
    accuracyMm: kind === 'svg' ? SVG_ACCURACY_MM : profile.accuracyMm,
    repeats: settings.repeats,
    repeatToleranceMm: REPEAT_TOLERANCE_MM,
  });
  return { kind, text, audit };
}

/** The lines that a written text draws, by an independent reading of it. */
function readBack(text: string, kind: 'svg' | 'gcode'): LineSet {
  if (kind === 'gcode') return linesOfProgram(readGcode(text).program);
  // Whatever was written is to be seen, past the edge of the page too.
  const drawing = readDrawing(withoutTravel(text), { pageEdge: 'ignore' });
  return linesOfDrawing(drawing, planPens(drawing, 'layer'));
}

function weighing(network: Network, home: HomeRule, settings: Settings): { weigh: Weigh; weighHome: Weigh } {
  if (settings.minimise === 'travel') return { weigh: travelCost, weighHome: travelCost };
  let reach = 0;
  for (let v = 0; v < network.vertexCount; v++) {
    reach = Math.max(
      reach,
      Math.abs(network.vertexX[v] - home.homeX) + Math.abs(network.vertexY[v] - home.homeY),
    );
  }
  return liftsFirst(2 * reach, network.edgeCount);
}

/** A little more travel for several runs fewer is worth it: where travel counts, the time decides. */
function pays(crossed: Measure, without: Measure, settings: Settings): boolean {
  if (settings.minimise !== 'travel') return isWorse(without, crossed, settings);
  return crossed.seconds < without.seconds * (1 - ROUNDING);
}

/** Whether nothing was left out as drawn already: a line drawn twice may by chance save travel. */
function drawsAll(network: Network): boolean {
  return network.repeatedMm === 0 && network.repeatedDots === 0 && network.dotsOnLines === 0;
}

/**
 * The order found is kept only where it is better, or as good, by what was asked for; of two that travel
 * alike the one with fewer runs.
 */
function isWorse(found: Measure, asDrawn: Measure, settings: Settings): boolean {
  if (settings.minimise === 'lifts' && found.runs !== asDrawn.runs) return found.runs > asDrawn.runs;
  const alike = Math.abs(found.travelMm - asDrawn.travelMm) <= ROUNDING * (1 + asDrawn.travelMm);
  return alike ? found.runs > asDrawn.runs : found.travelMm > asDrawn.travelMm;
}
