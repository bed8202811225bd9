import { describe, expect, test } from 'vitest';
import { readDrawing } from '../../src/core/index.ts';
import { atlasAsSvg, bordersOf, readAtlas } from '../support/atlas.ts';
import { CHROMIUM, drawInBrowser, useBrowser } from '../support/browser.ts';
import { expectSound, inWords, orderAndAudit } from '../support/ordering.ts';
import { differences, lengthsOf, WHOLE_LINES } from '../support/readerAndBrowser.ts';

/**
 * A world of countries, each a closed outline, so that every shared border stands twice. What is shared,
 * what hangs together and where borders meet is known from the topology by the number of each border arc,
 * without comparing any geometry.
 */
describe.each([
  { scale: '110m', mmPerDegree: 1 },
  { scale: '50m', mmPerDegree: 3 },
] as const)('countries at 1:$scale, $mmPerDegree mm a degree', ({ scale, mmPerDegree }) => {
  const atlas = readAtlas(scale);
  const borders = bordersOf(atlas);
  const onceMm = borders.once * mmPerDegree;
  const beyondOnceMm = borders.beyondOnce * mmPerDegree;
  const drawing = readDrawing(atlasAsSvg(atlas, mmPerDegree));

  test('all outlines are read', () => {
    const readMm = lengthsOf(drawing).reduce((sum, length) => sum + length, 0);
    expect(readMm / (onceMm + beyondOnceMm)).toBeCloseTo(1, 5);
  });

  test('each border is drawn once, in no fewer runs than its ends allow', () => {
    const found = orderAndAudit(drawing, { effort: 1 });
    console.log(`${drawing.strokes.count} outlines at 1:${scale}: ${inWords(found)}`);
    expect(found.networks).toHaveLength(1);
    const [network] = found.networks;
    // In the coarse atlas two slivers, 1.6 mm in all, run along a border that the topology does not share.
    expect(Math.abs(network.repeatedMm / beyondOnceMm - 1)).toBeLessThan(0.001);
    expect(network.componentCount).toBe(borders.components);
    expect(network.oddVertices).toHaveLength(borders.oddPlaces);
    expectSound(found, borders.fewestRuns);
    expect(Math.abs((found.after.drawnMm - found.after.bridgedMm) / onceMm - 1)).toBeLessThan(0.001);
    for (const { audit } of [found.svg, found.gcode]) expect(audit.twiceMm / onceMm).toBeLessThan(0.001);
  });
});

test('asked for the fewest lifts, the world takes as many runs as its ends allow', () => {
  const atlas = readAtlas('110m');
  const found = orderAndAudit(readDrawing(atlasAsSvg(atlas, 1)), { effort: 1, minimise: 'lifts' });
  const { fewestRuns } = bordersOf(atlas);
  console.log(`fewest lifts: ${inWords(found)}`);
  expectSound(found, fewestRuns);
  expect(found.after.runs).toBe(fewestRuns);
});

const browser = useBrowser();

describe.runIf(CHROMIUM !== null)('outlines read as a browser shows them', () => {
  test.each([
    { scale: '110m', mmPerDegree: 25.4 / 24 },
    { scale: '50m', mmPerDegree: 25.4 / 6 },
  ] as const)('at 1:$scale', async ({ scale, mmPerDegree }) => {
    // The browser tells places to six digits, so it is given no more of them.
    const text = atlasAsSvg(readAtlas(scale), mmPerDegree, 3);
    const [outside] = await drawInBrowser(browser(), [text]);
    const found = differences(readDrawing(text, WHOLE_LINES), outside.strokes);
    const { strokes, plain, boxMm, worst } = found;
    console.log(
      `${strokes} outlines at 1:${scale}, lengths differ by ${plain.toExponential(1)} at most, boxes by ${boxMm.toExponential(1)} mm`,
    );
    expect(strokes).toBeGreaterThan(200);
    expect(plain, worst).toBeLessThan(1e-5);
    expect(boxMm, worst).toBeLessThan(1e-3);
  });
});
