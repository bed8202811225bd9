import type { Drawing } from './drawing/drawing.js';
import { NO_LAYER } from './drawing/drawing.js';
import { planPens, strokesOfPens } from './drawing/pens.js';
import { choosePens } from './drawing/penWishes.js';
import { boxOfSegments } from './geometry/box.js';
import { segmentLength } from './geometry/length.js';
import type { Bounds } from './measure/bounds.js';
import { travelCost } from './metric/metric.js';
import { buildNetwork } from './network/buildNetwork.js';
import { fewestRuns } from './network/fewestRuns.js';
import { findNearMisses, type NearMiss } from './network/nearMisses.js';
import { overhang } from './overhang.js';
import { sentence } from './report/sentences.js';
import type { Survey } from './report/survey.js';
import { REPEAT_TOLERANCE_MM, type Settings } from './settings.js';
import { boundOnly } from './tour/findTour.js';
import { nearestNeighbourTravel } from './tour/nearestNeighbour.js';
import { wideStrokes } from './wideStrokes.js';

/** Loose ends this many snap distances from another end are shown as nearly meeting. */
const NEAR_MISS_SNAPS = 10;
/** … and never less than this, so that a snap distance of 0 still shows them. */
const LEAST_NEAR_MISS_MM = 0.1;
/** Places shown of each kind. */
const PLACES_SHOWN = 5;

/**
 * What is in a drawing, before anything is ordered: sizes, pens, layers, the network and how few runs and
 * how little travel it allows. Costs a reading, the networks and an exact pairing.
 */
export function surveyDrawing(whole: Drawing, settings: Settings, version: string): Survey {
  const drawing = choosePens(whole, settings.pens, settings);
  const { strokes, layers } = drawing;
  const plan = planPens(drawing, settings.pens, settings);
  const [homeX, homeY] = settings.homeMm ?? [0, drawing.heightMm];
  const lengthMm = strokeLengths(drawing);
  const misses: NearMiss[] = [];
  let repeatedDots = 0;
  const pens = strokesOfPens(plan).map((ofPen, pen) => {
    const network = buildNetwork(drawing, ofPen, { ...settings, repeatToleranceMm: REPEAT_TOLERANCE_MM });
    const reachMm = Math.max(NEAR_MISS_SNAPS * settings.snapMm, LEAST_NEAR_MISS_MM);
    for (const miss of findNearMisses(network, drawing, ofPen, reachMm, settings.accuracyMm))
      misses.push(miss);
    repeatedDots += network.repeatedDots;
    const end = pen === plan.pens.length - 1 ? settings.end : 'home';
    const bound = boundOnly(network, { homeX, homeY, end, weigh: travelCost });
    const ends = lineEnds(drawing, ofPen);
    return {
      pen: plan.pens[pen].name,
      strokes: ofPen.length,
      drawnMm: ofPen.reduce((sum, s) => sum + lengthMm[s], 0),
      repeatedMm: network.repeatedMm,
      components: network.componentCount,
      oddVertices: network.oddVertices.length,
      fewestRuns: fewestRuns(network),
      boundMm: bound.value,
      nearestNeighbourMm: nearestNeighbourTravel(ends.x, ends.y, homeX, homeY, end === 'home'),
    };
  });
  misses.sort((a, b) => a.gapMm - b.gapMm);
  const total = (pick: (pen: (typeof pens)[number]) => number) =>
    pens.reduce((sum, pen) => sum + pick(pen), 0);
  const dots = strokes.dot.reduce((sum, dot) => sum + dot, 0);
  return {
    schema: 'fewlift-survey/1',
    version,
    drawing: {
      name: drawing.name,
      title: drawing.title,
      widthMm: drawing.widthMm,
      heightMm: drawing.heightMm,
      elements: drawing.elementCount,
      strokes: strokes.count,
      closed: closedCount(drawing),
      dots,
      drawnMm: total((pen) => pen.drawnMm),
    },
    network: {
      snapMm: settings.snapMm,
      components: total((pen) => pen.components),
      oddVertices: total((pen) => pen.oddVertices),
      repeatedMm: total((pen) => pen.repeatedMm),
      repeatedDots,
      fewestRuns: total((pen) => pen.fewestRuns),
      boundMm: total((pen) => pen.boundMm),
      nearestNeighbourMm: total((pen) => pen.nearestNeighbourMm),
    },
    nearMisses: {
      count: misses.length,
      leastMm: misses.length > 0 ? misses[0].gapMm : 0,
      greatestMm: misses.length > 0 ? misses[misses.length - 1].gapMm : 0,
      places: misses.slice(0, PLACES_SHOWN),
    },
    pens,
    layers: layerCounts(drawing, layers.length),
    findings: [
      ...drawing.findings,
      ...overhang(boxOf(drawing), drawing),
      ...wideStrokes(drawing, settings.penWidthMm),
    ].map((finding) => ({
      ...finding,
      message: sentence(finding),
    })),
  };
}

/** Strokes that end where they begin, whether by a closing command or by their points. */
function closedCount({ strokes: { count, first, dot, segments } }: Drawing): number {
  let closed = 0;
  for (let s = 0; s < count; s++) {
    const a = segments.offset[first[s]];
    const b = segments.offset[first[s + 1] - 1] + 2;
    const meets = segments.data[a] === segments.data[b] && segments.data[a + 1] === segments.data[b + 1];
    if (meets && !dot[s]) closed++;
  }
  return closed;
}

function boxOf({ strokes: { segments } }: Drawing): Bounds {
  const box = new Float64Array(4);
  boxOfSegments(segments, 0, segments.count, box);
  const [minX, minY, maxX, maxY] = box;
  return { minX, minY, maxX, maxY };
}

function strokeLengths({ strokes }: Drawing): Float64Array {
  const lengths = new Float64Array(strokes.count);
  for (let s = 0; s < strokes.count; s++) {
    for (let i = strokes.first[s]; i < strokes.first[s + 1]; i++)
      lengths[s] += segmentLength(strokes.segments, i);
  }
  return lengths;
}

function lineEnds({ strokes }: Drawing, ofPen: Uint32Array): { x: Float64Array; y: Float64Array } {
  const x = new Float64Array(2 * ofPen.length);
  const y = new Float64Array(2 * ofPen.length);
  const { first, segments } = strokes;
  ofPen.forEach((s, k) => {
    const a = segments.offset[first[s]];
    const b = segments.offset[first[s + 1] - 1] + 2;
    x[2 * k] = segments.data[a];
    y[2 * k] = segments.data[a + 1];
    x[2 * k + 1] = segments.data[b];
    y[2 * k + 1] = segments.data[b + 1];
  });
  return { x, y };
}

/** Strokes of each layer that has any, in the drawing's order; those outside all layers last. */
function layerCounts({ strokes, layers }: Drawing, count: number): Survey['layers'] {
  const strokesIn = new Float64Array(count + 1);
  for (const layer of strokes.layer) strokesIn[layer === NO_LAYER ? count : layer]++;
  return Array.from(strokesIn, (n, layer) => ({
    layer: layer === count ? null : (layers[layer].label ?? layers[layer].id ?? `layer ${layer + 1}`),
    strokes: n,
  })).filter(({ strokes: n }) => n > 0);
}
