import { describe, expect, test } from 'vitest';
import { type AuditOptions, auditLines } from '../../../src/core/audit/audit.ts';
import { createRandom } from '../../../src/core/structures/random.ts';
import { lineSetOf } from '../../support/chains.ts';
import { randomStrokes } from '../../support/lineDrawings.ts';
import { redrawn, type Style } from '../../support/redrawing.ts';
import { SPOILS } from '../../support/spoils.ts';

interface Medium {
  readonly name: string;
  readonly options: AuditOptions;
  readonly style: Style;
  /** accuracy and two chord errors, as the docstring of auditLines says */
  readonly tau: number;
}

const once = { snapMm: 0.05, repeats: 'once' as const, repeatToleranceMm: 0.01 };
const keep = { ...once, repeats: 'keep' as const };

const MEDIA: readonly Medium[] = [
  {
    name: 'curves with four decimals',
    options: { ...once, accuracyMm: 0.002 },
    style: { flattenMm: null, stepMm: 1e-4, keepRepeats: false },
    tau: 0.003,
  },
  {
    name: 'curves with four decimals, repeats kept',
    options: { ...keep, accuracyMm: 0.002 },
    style: { flattenMm: null, stepMm: 1e-4, keepRepeats: true },
    tau: 0.003,
  },
  {
    name: 'lines within 0.02 mm with three decimals',
    options: { ...once, accuracyMm: 0.02 },
    style: { flattenMm: 0.019, stepMm: 1e-3, keepRepeats: false },
    tau: 0.024,
  },
  {
    name: 'lines within 0.01 mm with three decimals, repeats kept',
    options: { ...keep, accuracyMm: 0.01 },
    style: { flattenMm: 0.009, stepMm: 1e-3, keepRepeats: true },
    tau: 0.014,
  },
];

describe.each(MEDIA)('$name', ({ options, style, tau }) => {
  test('150 drawings drawn otherwise: none is refused', () => {
    for (let seed = 1; seed <= 150; seed++) {
      const random = createRandom(seed);
      const strokes = randomStrokes(random);
      const wanted = lineSetOf(strokes.map((s) => s.chain));
      const result = auditLines(wanted, lineSetOf(redrawn(strokes, random, style)), options);
      expect(result.findings, `seed ${seed}`).toEqual([]);
      expect(result).toMatchObject({ ok: true, missingMm: 0, extraMm: 0 });
      expect(result.maxDeviationMm).toBeLessThanOrEqual(tau);
    }
  });

  test.each(Object.keys(SPOILS))('%s: every one is caught', (name) => {
    let spoilt = 0;
    for (let seed = 1; seed <= 30; seed++) {
      const random = createRandom(1000 + seed);
      const strokes = randomStrokes(random);
      const changed = SPOILS[name](strokes, random, tau);
      if (changed === null) continue;
      spoilt++;
      const wanted = lineSetOf(strokes.map((s) => s.chain));
      const result = auditLines(wanted, lineSetOf(redrawn(changed, random, style)), options);
      expect(result.ok, `seed ${seed}`).toBe(false);
      expect(result.findings.length).toBeGreaterThan(0);
    }
    expect(spoilt).toBeGreaterThan(5);
  });
});
