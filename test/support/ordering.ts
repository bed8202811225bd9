import { expect } from 'vitest';
import {
  compareSides,
  DEFAULT_SETTINGS,
  type Drawing,
  PEN_ON_Z,
  readDrawing,
  type Settings,
  sideOfDrawing,
  surveyDrawing,
  tour,
  writeAudited,
} from '../../src/core/index.ts';

/** A drawing ordered, written both ways and audited, with the figures to judge it by. */
export function orderAndAudit(drawing: Drawing, chosen: Partial<Settings> = {}) {
  const began = Date.now();
  const ordered = tour(drawing, { ...DEFAULT_SETTINGS, ...chosen }, PEN_ON_Z);
  const { networks, tours, settings } = ordered;
  const svg = writeAudited(ordered, 'svg');
  const sides = [drawing, readDrawing(svg.text)].map((side) => sideOfDrawing(side, settings));
  return {
    survey: surveyDrawing(drawing, settings, 'test'),
    comparison: compareSides(sides[0], sides[1], settings, PEN_ON_Z, 'test'),
    before: ordered.before.measure,
    after: ordered.after.measure,
    repeatedMm: networks.reduce((sum, network) => sum + network.repeatedMm, 0),
    boundMm: tours.reduce((sum, { bound }) => sum + bound.value, 0),
    minimise: ordered.settings.minimise,
    networks,
    svg,
    gcode: writeAudited(ordered, 'gcode'),
    seconds: (Date.now() - began) / 1000,
  };
}

export type OrderedAndAudited = ReturnType<typeof orderAndAudit>;

/** Nothing lost, nothing gained; better than it stood; no better than anything can be. */
export function expectSound(found: OrderedAndAudited, fewestRuns: number): void {
  const { before, after, repeatedMm, boundMm, minimise } = found;
  for (const { audit } of [found.svg, found.gcode]) {
    expect(audit.findings).toEqual([]);
    expect(audit).toMatchObject({ ok: true, missingMm: 0, extraMm: 0 });
  }
  const { survey, comparison } = found;
  expect(comparison.differences).toEqual([]);
  expect(comparison.same).toBe(true);
  expect(survey.network.repeatedMm).toBeCloseTo(repeatedMm, 6);
  expect(survey.network.fewestRuns).toBeLessThanOrEqual(after.runs);
  expect(survey.network.boundMm).toBeLessThanOrEqual(after.travelMm * (1 + 1e-9));
  expect(after.drawnMm).toBeCloseTo(before.drawnMm - repeatedMm + after.bridgedMm, 6);
  expect(after.runs).toBeGreaterThanOrEqual(fewestRuns);
  expect(after.travelMm).toBeLessThan(before.travelMm / 2);
  if (minimise === 'travel') expect(after.travelMm).toBeGreaterThanOrEqual(boundMm);
}

export function inWords({
  before,
  after,
  repeatedMm,
  boundMm,
  minimise,
  seconds,
}: OrderedAndAudited): string {
  const mm = (length: number) => `${length.toFixed(1)} mm`;
  return [
    `${before.runs} → ${after.runs} runs`,
    `travel ${mm(before.travelMm)} → ${mm(after.travelMm)}${minimise === 'travel' ? ` (bound ${mm(boundMm)})` : ''}`,
    `drawn ${mm(before.drawnMm)} → ${mm(after.drawnMm)} (repeats ${mm(repeatedMm)}, bridges ${mm(after.bridgedMm)})`,
    `${seconds.toFixed(1)} s`,
  ].join(', ');
}
