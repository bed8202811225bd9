import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';

const SAMPLES = new URL('../../samples/', import.meta.url);
const { samples }: { samples: Record<string, () => string> } = await import(
  new URL('draw/samples.js', SAMPLES).href
);

describe('the drawings in samples/', () => {
  const names = readdirSync(SAMPLES).filter((name) => name.endsWith('.svg'));

  test.each(names)('%s is what samples/draw.js draws, byte for byte', (name) => {
    expect(samples[name]()).toBe(readFileSync(new URL(name, SAMPLES), 'utf8'));
  });

  test('everything that can be drawn is there', () => {
    expect(Object.keys(samples).sort()).toEqual(names.sort());
  });
});
