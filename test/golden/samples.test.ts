import { existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, test } from 'vitest';
import {
  DEFAULT_SETTINGS,
  PEN_ON_Z,
  type ReadOptions,
  readDrawing,
  reportOf,
  tour,
  writeAudited,
} from '../../src/core/index.ts';
import { runStrictly } from '../support/gcodeMachine.ts';

const SAMPLES = fileURLToPath(new URL('../../samples/', import.meta.url));
const NUMBERS = fileURLToPath(new URL('./samples.json', import.meta.url));

/** Set to rewrite the ceilings from what is reached now; they are reviewed in the diff and only tighten. */
const REWRITE = process.env.FEWLIFT_GOLDEN === 'write';

interface Ceiling {
  readonly runs: number;
  readonly travelMm: number;
  readonly drawnMm: number;
}

/** How the recipes in samples/README.md read a drawing, where not by default. */
const READING: Readonly<Record<string, ReadOptions>> = { 'gift-box.svg': { dashes: 'solid' } };

const ceilings: Record<string, Ceiling> = existsSync(NUMBERS)
  ? JSON.parse(readFileSync(NUMBERS, 'utf8'))
  : {};
const reached: Record<string, Ceiling> = {};
const up = (value: number) => Math.ceil(value * 100) / 100;

describe('samples', () => {
  const names = readdirSync(SAMPLES).filter((name) => name.endsWith('.svg'));

  test.each(names)('%s is ordered, audited, and no worse than it was', (name) => {
    const text = readFileSync(SAMPLES + name, 'utf8');
    const drawing = readDrawing(text, { ...READING[name], name });
    const ordered = tour(drawing, DEFAULT_SETTINGS, PEN_ON_Z);
    const [svg, gcode] = [writeAudited(ordered, 'svg'), writeAudited(ordered, 'gcode')];
    const { audit, after, before, gap, bound } = reportOf(ordered, [svg.audit, gcode.audit], 'test');
    expect(audit).toMatchObject({ ok: true, missingMm: 0, extraMm: 0 });
    expect(gap).not.toBeNull();
    expect(bound.value).toBeLessThanOrEqual(after.travelMm * (1 + 1e-9));
    expect(after.travelMm).toBeLessThanOrEqual(before.travelMm);
    // The head of the file counts little on real drawings, and much on these small ones.
    expect(svg.text.length).toBeLessThanOrEqual(1.5 * text.length + 400);
    // A strict machine of its own: no rapid while down, no feed along the sheet while raised.
    const machine = runStrictly(gcode.text);
    expect(machine.descents).toBe(after.runs);
    expect(machine.travelMm).toBeCloseTo(after.travelMm, 1);
    // Chords 0.02 mm off an arc of radius r are shorter by 0.02/(3r): 1 % at the 0.7 mm of the letters.
    expect(Math.abs(machine.drawnMm - after.drawnMm)).toBeLessThanOrEqual(0.005 * after.drawnMm);
    reached[name] = { runs: after.runs, travelMm: up(after.travelMm), drawnMm: up(after.drawnMm) };
    if (REWRITE) return;
    expect(after.runs).toBeLessThanOrEqual(ceilings[name].runs);
    expect(after.travelMm).toBeLessThanOrEqual(ceilings[name].travelMm);
    expect(after.drawnMm).toBeLessThanOrEqual(ceilings[name].drawnMm);
  });

  test('every sample has its ceiling', () => {
    if (REWRITE) writeFileSync(NUMBERS, `${JSON.stringify(reached, null, 2)}\n`);
    else expect(Object.keys(ceilings).sort()).toEqual(names.sort());
  });
});
