import { describe, expect, test } from 'vitest';
import { auditLines } from '../../../src/core/audit/audit.ts';
import { createRandom } from '../../../src/core/structures/random.ts';
import { chainsOf, lineSetOf } from '../../support/chains.ts';
import { redrawn } from '../../support/redrawing.ts';
import { outputsOf, SAMPLE_NAMES, type SampleOutput } from '../../support/sampleOutputs.ts';
import { spoilMany } from '../../support/spoiltOutputs.ts';

const SEED = Number(process.env.FEWLIFT_SEED ?? 20_260);
/** Spoilt places, and changed strokes at least, of each sample in each of two formats. */
const EACH = 500;
/** Segments of an output beyond which so many places, far apart, share an audit. */
const LARGE = 400;
const TOGETHER = 16;

const outputs = new Map<string, SampleOutput[]>();
function outputsFor(name: string): SampleOutput[] {
  const known = outputs.get(name) ?? outputsOf(name);
  outputs.set(name, known);
  return known;
}

describe.each(SAMPLE_NAMES)('%s', (name) => {
  test('a thousand spoilt places: every one is caught, and named', () => {
    for (const output of outputsFor(name)) {
      const segments = output.drawn.reduce((sum, chain) => sum + chain.segments.length, 0);
      const tally = spoilMany(output, createRandom(SEED), EACH, segments > LARGE ? TOGETHER : 1);
      if (process.env.FEWLIFT_SHOW) {
        console.log(name, output.medium, tally.audits, 'audits', JSON.stringify([...tally.done]));
      }
      expect(tally.missed, output.medium).toEqual([]);
      let done = 0;
      for (const count of tally.done.values()) done += count;
      expect(done).toBe(EACH);
    }
  });

  test('a thousand strokes drawn otherwise: none is flagged', () => {
    for (const { medium, wanted, drawn, options } of outputsFor(name)) {
      const random = createRandom(SEED + 1);
      const style = { flattenMm: medium === 'svg' ? null : 0.019, stepMm: medium === 'svg' ? 1e-4 : 1e-3 };
      for (const chains of [chainsOf(wanted), drawn]) {
        const strokes = chains.map((chain) => ({
          kind: chain.dot ? ('dot' as const) : ('line' as const),
          chain,
        }));
        for (let done = 0; done < EACH / 2 || done === 0; done += strokes.length) {
          const other = redrawn(strokes, random, { ...style, keepRepeats: true });
          const result = auditLines(wanted, lineSetOf(other), options);
          expect(result.findings, `${medium} after ${done}`).toEqual([]);
        }
      }
    }
  });
});
