import { describe, expect, test } from 'vitest';
import { type AuditOptions, type AuditResult, auditLines } from '../../../src/core/audit/audit.ts';
import {
  asCubic,
  type Chain,
  cubic,
  dotAt,
  ellipseArc,
  flattened,
  lineSetOf,
  moved,
  polyline,
  reversed,
  rounded,
  spanOf,
} from '../../support/chains.ts';

const SVG: AuditOptions = { snapMm: 0.05, accuracyMm: 0.002, repeats: 'once', repeatToleranceMm: 0.01 };
const KEEP: AuditOptions = { ...SVG, repeats: 'keep' };
const COARSE: AuditOptions = { ...SVG, accuracyMm: 0.02 };
/** accuracy and two chord errors, as the docstring of auditLines says */
const TAU = 0.003;

function audit(wanted: Chain[], drawn: Chain[], options = SVG): AuditResult {
  return auditLines(lineSetOf(wanted), lineSetOf(drawn), options);
}

function codes(result: AuditResult): string[] {
  return [...new Set(result.findings.map((f) => f.code))];
}

const A: [number, number] = [10, 10];
const B: [number, number] = [30, 10];
const C: [number, number] = [30, 25];
const corner = polyline([A, B, C]);
const wave = cubic([
  [0, 0],
  [10, 20],
  [20, -20],
  [30, 0],
]);

describe('what is the same', () => {
  test('nothing at all', () => {
    expect(audit([], [])).toEqual({
      ok: true,
      missingMm: 0,
      extraMm: 0,
      twiceMm: 0,
      maxDeviationMm: 0,
      bridgedMm: 0,
      findings: [],
    });
  });

  test('the very same lines', () => {
    const all = [corner, wave, ellipseArc(50, 50, 10, 10, 0, 2 * Math.PI, 4), dotAt(5, 5)];
    expect(audit(all, all)).toMatchObject({ ok: true, maxDeviationMm: 0, bridgedMm: 0, twiceMm: 0 });
  });

  test('other order, other direction, other runs', () => {
    const drawn = [polyline([C, B]), reversed(wave), polyline([A, [17, 10]]), polyline([[17, 10], B])];
    expect(audit([corner, wave], drawn)).toMatchObject({ ok: true, missingMm: 0, extraMm: 0, twiceMm: 0 });
  });

  test('two strokes drawn as one run', () => {
    const drawn = [polyline([[17, 10], A, B, C].slice(1) as [number, number][])];
    expect(audit([polyline([A, B]), polyline([B, C])], drawn)).toMatchObject({ ok: true });
  });

  test('a line drawn as a cubic, a cubic cut in four', () => {
    const line = { ...corner, segments: corner.segments.map(asCubic) };
    const cut = { ...wave, segments: [0, 1, 2, 3].map((k) => spanOf(wave.segments[0], k / 4, (k + 1) / 4)) };
    expect(audit([corner, wave], [line, cut])).toMatchObject({ ok: true, missingMm: 0, extraMm: 0 });
  });

  test('curves drawn as lines within the accuracy', () => {
    const ring = ellipseArc(50, 50, 10, 4, 0, 2 * Math.PI);
    const result = audit([wave, ring], [flattened(wave, 0.019), flattened(ring, 0.019)], COARSE);
    expect(result).toMatchObject({ ok: true, missingMm: 0, extraMm: 0 });
    expect(result.maxDeviationMm).toBeGreaterThan(0.01);
    expect(result.maxDeviationMm).toBeLessThan(0.024);
  });

  test('a ring that starts elsewhere', () => {
    const square = polyline([A, B, C, [10, 25], A]);
    const turned = polyline([[30, 20], C, [10, 25], A, B, [30, 20]]);
    expect(audit([square], [turned])).toMatchObject({ ok: true, twiceMm: 0 });
  });

  test('a far outlier and very long diagonals', () => {
    const hatch = Array.from({ length: 400 }, (_, i) =>
      polyline([
        [i * 0.05, 0],
        [300 + i * 0.05, 300],
      ]),
    );
    const all = [
      ...hatch,
      dotAt(1e7, 1e7),
      polyline([
        [1e7, 0],
        [1e7, 1],
      ]),
    ];
    expect(audit(all, [...all].reverse().map(reversed))).toMatchObject({ ok: true });
    expect(codes(audit(all, all.slice(1)))).toEqual(['line-missing']);
  });
});

describe('what is missing or added', () => {
  test('a stroke not drawn', () => {
    const result = audit([corner, wave], [wave]);
    expect(codes(result)).toEqual(['line-missing']);
    expect(result.missingMm).toBeCloseTo(35, 6);
    expect(result.findings[0].values).toMatchObject({ x: 27.5, y: 10, pen: 0, count: 1 });
  });

  test('a stroke added', () => {
    const result = audit([wave], [wave, corner]);
    expect(codes(result)).toEqual(['line-added']);
    expect(result.extraMm).toBeCloseTo(35, 1);
  });

  test('a line that stops short', () => {
    const result = audit([polyline([A, B])], [polyline([A, [29.98, 10]])]);
    expect(codes(result)).toEqual(['line-missing']);
    expect(Math.abs(result.missingMm - 0.02)).toBeLessThan(TAU);
    expect(audit([polyline([A, B])], [polyline([A, [29.998, 10]])])).toMatchObject({ ok: true });
  });

  test('a line that runs on', () => {
    const result = audit([polyline([A, B])], [polyline([A, [30.02, 10]])]);
    expect(codes(result)).toEqual(['line-added']);
    expect(Math.abs(result.extraMm - 0.02)).toBeLessThan(TAU);
  });

  test('a gap in the middle', () => {
    const result = audit([polyline([A, B])], [polyline([A, [20, 10]]), polyline([[20.04, 10], B])]);
    expect(codes(result)).toEqual(['line-missing']);
    expect(Math.abs(result.missingMm - 0.04)).toBeLessThan(2 * TAU);
  });

  test('a shift, across and along', () => {
    for (const [dx, dy] of [
      [0, 1.2 * TAU],
      [1.2 * TAU, 0],
      [0.9 * TAU, 0.9 * TAU],
    ]) {
      expect(audit([corner], [moved(corner, dx, dy)]).ok, `${dx} ${dy}`).toBe(false);
    }
    expect(audit([corner], [moved(corner, 0.001, 0.001)])).toMatchObject({ ok: true });
  });

  test('a corner cut', () => {
    const cut = polyline([A, [29.98, 10], [30, 10.02], C]);
    const result = audit([corner], [cut]);
    expect(codes(result)).toContain('line-missing');
    expect(Math.abs(result.missingMm - 0.04)).toBeLessThan(3 * TAU);
  });

  test('an arc that bulges the other way', () => {
    const arc = ellipseArc(0, 0, 5, 5, 0.2, 0.1);
    const [x0, y0, x1, y1] = arc.segments[0].data;
    const flipped = ellipseArc(0, 0, 5, 5, 0.2 + Math.PI, 0.1);
    const over = reversed(moved(flipped, x0 + x1, y0 + y1));
    const ends = over.segments[0].data;
    expect(Math.abs(ends[0] - x0) + Math.abs(ends[1] - y0)).toBeLessThan(1e-12);
    const result = audit([arc], [over]);
    expect(codes(result)).toEqual(['line-added', 'line-missing']);
    expect(audit([corner, arc], [corner, over]).ok).toBe(false);
  });

  test('the wrong pen', () => {
    const result = audit([corner, { ...wave, pen: 1 }], [corner, wave]);
    expect(codes(result)).toEqual(['line-added', 'line-missing']);
    expect(result.findings.map((f) => f.values.pen)).toEqual([0, 1]);
  });

  test('a tiny stroke, alone or at the end of another', () => {
    const tiny = polyline([B, [30.02, 10.01]]);
    expect(codes(audit([corner, tiny], [corner]))).toEqual(['line-missing']);
    expect(codes(audit([corner, moved(tiny, 5, 5)], [corner]))).toEqual(['line-missing']);
    expect(audit([corner, tiny], [corner, tiny]).ok).toBe(true);
    expect(codes(audit([corner], [corner, tiny]))).toEqual(['line-added']);
  });

  test('a tiny stroke that lies within the tolerance of another', () => {
    const options = { ...COARSE, repeats: 'keep' as const };
    const tiny = polyline([
      [20, 10.01],
      [20.03, 10.01],
    ]);
    expect(codes(audit([corner, tiny], [corner], options))).toEqual(['line-missing']);
    expect(codes(audit([corner], [corner, tiny], options))).toEqual(['line-doubled']);
    expect(audit([corner, tiny], [tiny, corner], options).ok).toBe(true);
  });

  test('at most twenty places of a kind, with their number', () => {
    const many = Array.from({ length: 50 }, (_, i) => moved(corner, 0, i));
    const result = audit(many, []);
    expect(result.findings).toHaveLength(20);
    expect(result.findings[0].values.count).toBe(50);
  });
});

describe('neighbours', () => {
  const hatch = Array.from({ length: 20 }, (_, i) =>
    polyline([
      [10, 10 + 0.05 * i],
      [40, 10 + 0.05 * i],
    ]),
  );

  test('hatching at the snap distance is told apart', () => {
    for (const options of [SVG, KEEP, COARSE]) {
      expect(audit(hatch, [...hatch].reverse(), options)).toMatchObject({ ok: true, twiceMm: 0 });
      const result = audit(hatch, [...hatch.slice(0, 9), hatch[8], ...hatch.slice(10)], options);
      expect(codes(result)).toEqual(['line-doubled', 'line-missing']);
      expect(result.missingMm).toBeCloseTo(30, 1);
      expect(result.twiceMm).toBeCloseTo(30, 1);
    }
  });

  test('one line dropped and its neighbour 0.03 mm away doubled', () => {
    const pair = [polyline([A, B]), moved(polyline([A, B]), 0, 0.03)];
    for (const options of [SVG, KEEP, COARSE]) {
      expect(codes(audit(pair, [pair[1], pair[1]], options))).toEqual(['line-doubled', 'line-missing']);
      expect(codes(audit(pair, [pair[1]], options))).toEqual(['line-missing']);
    }
  });

  test('neighbours that change places half-way', () => {
    const [a, b] = hatch;
    const crossed = [
      polyline([
        [10, 10],
        [25, 10],
        [25, 10.05],
        [40, 10.05],
      ]),
      polyline([
        [10, 10.05],
        [25, 10.05],
        [25, 10],
        [40, 10],
      ]),
    ];
    for (const options of [SVG, COARSE]) {
      expect(codes(audit([a, b], crossed, options))).toEqual(['line-added']);
    }
  });

  test('chords of rings closer together than the accuracy', () => {
    const rings = Array.from({ length: 12 }, (_, i) =>
      ellipseArc(50, 50, 5 + 0.02 * i, 5 + 0.02 * i, 0, 2 * Math.PI, 2),
    );
    const drawn = rings.map((ring) => flattened(ring, 0.019));
    expect(audit(rings, drawn, COARSE)).toMatchObject({ ok: true });
    expect(audit(rings, drawn.slice(1), COARSE)).toMatchObject({ ok: false });
  });
});

describe('crowds', () => {
  // Circles about a circle: they touch two envelopes, where dozens run together within the tolerance.
  const guilloche = Array.from({ length: 60 }, (_, i) => {
    const angle = (2 * Math.PI * i) / 60;
    return ellipseArc(50 + 12 * Math.cos(angle), 50 + 12 * Math.sin(angle), 9, 9, angle, 2 * Math.PI, 2);
  });
  // Lines through one point, each drawn in two halves.
  const star = Array.from({ length: 200 }, (_, i) => {
    const angle = (Math.PI * i) / 200;
    const [c, s] = [20 * Math.cos(angle), 20 * Math.sin(angle)];
    return polyline([
      [50 - c, 50 - s],
      [50 + c, 50 + s],
    ]);
  });
  const halves = star.flatMap(({ segments: [line] }) => [
    { pen: 0, segments: [spanOf(line, 0.5, 0)] },
    { pen: 0, segments: [spanOf(line, 0.5, 1)] },
  ]);

  test('lines that run together for a while each keep their own', () => {
    const drawn = guilloche.map((ring) => flattened(ring, 0.019));
    expect(audit(guilloche, drawn, COARSE)).toMatchObject({ ok: true, missingMm: 0, extraMm: 0 });
    expect(codes(audit(guilloche, drawn.slice(1), COARSE))).toEqual(['line-missing']);
    expect(codes(audit(guilloche, [...drawn, drawn[7]], COARSE))).toEqual(['line-doubled']);
  });

  test('lines through one point', () => {
    for (const options of [SVG, COARSE]) {
      expect(audit(star, halves, options)).toMatchObject({ ok: true, missingMm: 0, extraMm: 0 });
      const result = audit(star, halves.slice(1), options);
      expect(codes(result)).toEqual(['line-missing']);
      // Near the hub the neighbours, 0.016 rad away, lie within the repeat tolerance.
      expect(Math.abs(result.missingMm - 20)).toBeLessThan(options === SVG ? 0.8 : 1.6);
    }
  });
});

describe('repeats', () => {
  const line = polyline([A, B]);

  test('once: once is enough, as often as wanted is not too much', () => {
    expect(audit([line, reversed(line), line], [line])).toMatchObject({ ok: true, twiceMm: 0 });
    expect(audit([line, reversed(line), line], [line, line, line]).twiceMm).toBeCloseTo(40, 6);
    expect(audit([line, reversed(line), line], [line, line, line]).ok).toBe(true);
    const result = audit([line, line], [line, line, line]);
    expect(codes(result)).toEqual(['line-doubled']);
    expect(result.twiceMm).toBeCloseTo(40, 6);
    expect(codes(audit([line, line], []))).toEqual(['line-missing']);
  });

  test('keep: exactly as often as wanted', () => {
    expect(audit([line, line], [line, line], KEEP)).toMatchObject({ ok: true });
    expect(audit([line, line], [line, line], KEEP).twiceMm).toBeCloseTo(20, 6);
    const result = audit([line, line], [line], KEEP);
    expect(codes(result)).toEqual(['line-missing']);
    expect(result.missingMm).toBeCloseTo(20, 6);
    expect(codes(audit([line, line], [line, line, line], KEEP))).toEqual(['line-doubled']);
  });

  test('repeats within their tolerance, and not beyond', () => {
    expect(audit([line, moved(line, 0, 0.009)], [line])).toMatchObject({ ok: true });
    expect(audit([line, moved(line, 0, 0.009), moved(line, 0, -0.009)], [line])).toMatchObject({ ok: true });
    expect(codes(audit([line, moved(line, 0, 0.013)], [line]))).toEqual(['line-missing']);
    expect(codes(audit([line, moved(line, 0, 0.009)], [line], KEEP))).toEqual(['line-missing']);
  });

  test('parts that overlap', () => {
    const wanted = [
      polyline([
        [0, 0],
        [10, 0],
      ]),
      polyline([
        [5, 0],
        [15, 0],
      ]),
    ];
    const long = polyline([
      [0, 0],
      [15, 0],
    ]);
    expect(audit(wanted, [long])).toMatchObject({ ok: true, twiceMm: 0 });
    expect(audit(wanted, [long], KEEP).missingMm).toBeCloseTo(5, 2);
    expect(
      audit(
        wanted,
        [
          long,
          polyline([
            [10, 0],
            [5, 0],
          ]),
        ],
        KEEP,
      ),
    ).toMatchObject({ ok: true });
  });

  test('a stroke that goes back on itself', () => {
    const back = polyline([A, B, A]);
    expect(audit([back], [polyline([A, B])])).toMatchObject({ ok: true });
    expect(audit([back], [back])).toMatchObject({ ok: true });
    expect(audit([back], [back], KEEP).twiceMm).toBeCloseTo(20, 6);
    expect(codes(audit([back], [polyline([A, B])], KEEP))).toEqual(['line-missing']);
  });

  test('ten thousand lines on one spot', () => {
    const many = Array.from({ length: 10_000 }, (_, i) => (i % 2 ? line : reversed(line)));
    expect(audit(many, many, KEEP)).toMatchObject({ ok: true });
    expect(audit(many, many.slice(1), KEEP).missingMm).toBeCloseTo(20, 6);
    expect(audit(many, [line])).toMatchObject({ ok: true });
  });
});

describe('bridges', () => {
  const a = polyline([A, B]);
  const b = polyline([[30.03, 10.02], C]);

  test('from an end to a vertex and on', () => {
    const through = polyline([A, B, [30.03, 10.02], C]);
    const result = audit([a, b], [through]);
    expect(result).toMatchObject({ ok: true, extraMm: 0, twiceMm: 0 });
    expect(Math.abs(result.bridgedMm - Math.sqrt(0.0013))).toBeLessThan(2 * TAU);
    const overVertex = polyline([A, B, [30.02, 9.98], [30.03, 10.02], C]);
    const third = polyline([
      [30.02, 9.98],
      [40, 0],
    ]);
    expect(audit([a, b, third], [overVertex, third])).toMatchObject({ ok: true, extraMm: 0 });
    expect(audit([a, b], [overVertex]).ok).toBe(false);
  });

  test('ends that overlap, with the bridge on the lines', () => {
    const c = polyline([
      [29.96, 10],
      [45, 10],
    ]);
    expect(audit([a, c], [polyline([A, B, [29.96, 10], [45, 10]])], KEEP)).toMatchObject({ ok: true });
    expect(
      audit(
        [a, c],
        [
          polyline([A, B, [29.96, 10]]),
          polyline([
            [29.96, 10],
            [45, 10],
          ]),
        ],
        KEEP,
      ),
    ).toMatchObject({
      ok: true,
    });
  });

  test('onto the middle of another stroke', () => {
    const touching = polyline([
      [20, 10.04],
      [20, 30],
    ]);
    const drawn = [polyline([A, [20, 10], [20, 10.04], [20, 30]]), polyline([[20, 10], B])];
    const result = audit([a, touching], drawn);
    expect(result).toMatchObject({ ok: true });
    expect(Math.abs(result.bridgedMm - 0.04)).toBeLessThan(2 * TAU);
  });

  test('where lines cross', () => {
    const crossing = [
      a,
      polyline([
        [20, 0],
        [20.02, 20],
      ]),
      polyline([
        [20.03, 0],
        [20, 20],
      ]),
    ];
    const drawn = [
      polyline([A, [20.01, 10], [20.015, 10], [20.03, 0]]),
      polyline([
        [20, 20],
        [20.015, 10],
        [20.01, 10],
        [20, 0],
      ]),
      polyline([[20.02, 20], [20.01, 10], B]),
    ];
    expect(audit(crossing, drawn)).toMatchObject({ ok: true });
  });

  test('not longer than two snap distances, nor by themselves, nor into nowhere', () => {
    const far = polyline([[30.09, 10.07], C]);
    expect(codes(audit([a, far], [polyline([A, B, [30.09, 10.07], C])]))).toEqual(['line-added']);
    const alone = polyline([B, [30.03, 10.02]]);
    expect(codes(audit([a, b], [a, b, alone]))).toEqual(['line-added']);
    expect(codes(audit([a], [polyline([A, B, [30.03, 10.02]])]))).toEqual(['line-added']);
  });
});

describe('dots', () => {
  test('one by one', () => {
    const dots = [dotAt(1, 1), dotAt(2, 1), dotAt(1, 1.004)];
    expect(audit(dots, [...dots].reverse(), KEEP)).toMatchObject({ ok: true });
    expect(codes(audit(dots, dots.slice(1), KEEP))).toEqual(['dot-missing']);
    expect(audit(dots, dots.slice(1))).toMatchObject({ ok: true });
    expect(codes(audit(dots, [dots[0], dots[2]]))).toEqual(['dot-missing']);
    expect(codes(audit(dots, [...dots, dots[1]]))).toEqual(['dot-added']);
    expect(codes(audit(dots, [...dots.slice(0, 2), { ...dots[2], pen: 1 }], KEEP)).sort()).toEqual([
      'dot-added',
      'dot-missing',
    ]);
  });

  test('on a line', () => {
    expect(audit([corner, dotAt(20, 10.04)], [corner])).toMatchObject({ ok: true });
    expect(audit([corner, dotAt(20, 10.04)], [corner, dotAt(20, 10.04)])).toMatchObject({ ok: true });
    expect(codes(audit([corner, dotAt(20, 10.06)], [corner]))).toEqual(['dot-missing']);
    expect(codes(audit([corner, dotAt(20, 10, 1)], [corner]))).toEqual(['dot-missing']);
    expect(codes(audit([corner], [corner, dotAt(20, 10)]))).toEqual(['dot-added']);
  });

  test('a stroke too small for the decimals may become a dot, but not vanish', () => {
    const speck = polyline([
      [5, 5],
      [5.0001, 5.0001],
    ]);
    expect(audit([speck, corner], [dotAt(5, 5), corner])).toMatchObject({ ok: true });
    expect(codes(audit([speck, corner], [corner]))).toEqual(['line-missing']);
  });

  test('a stroke of 0.0003 mm written with three decimals, at an accuracy of 0.001 mm', () => {
    const fine = { ...SVG, accuracyMm: 0.001 };
    const speck = polyline([
      [10, 10],
      [10.0003, 10],
    ]);
    expect(audit([speck, wave], [dotAt(10, 10), wave], fine).findings).toEqual([]);
    expect(codes(audit([speck, wave], [wave], fine))).toEqual(['line-missing']);
    expect(codes(audit([speck, wave], [dotAt(10.002, 10), wave], fine))).toEqual([
      'dot-added',
      'line-missing',
    ]);
  });
});

describe('places where much comes together', () => {
  const hub = (count: number): Chain[] =>
    Array.from({ length: count }, (_, i) => {
      const angle = (2 * Math.PI * i) / count;
      return polyline([
        [50, 50],
        [50 + 40 * Math.cos(angle), 50 + 40 * Math.sin(angle)],
      ]);
    });

  test.each([
    ['three thousand spokes at one hub', 3000, 1],
    ['three hundred spokes, each in two', 300, 2],
  ])('%s, rounded; one of them lost', (_, count, parts) => {
    const spokes = hub(count);
    for (const [options, step] of [
      [SVG, 1e-4],
      [COARSE, 1e-3],
    ] as const) {
      const drawn = spokes.flatMap((spoke) => {
        const { pen, segments } = rounded(reversed(spoke), step);
        if (parts === 1) return [{ pen, segments }];
        return [
          { pen, segments: [spanOf(segments[0], 0, 0.7)] },
          { pen, segments: [spanOf(segments[0], 0.7, 1)] },
        ];
      });
      expect(audit(spokes, drawn, options).findings).toEqual([]);
      expect(codes(audit(spokes, drawn.slice(1), options))).toEqual(['line-missing']);
    }
  });

  test('an arc closed by a bridge along itself, begun at any place', () => {
    const arc = ellipseArc(50, 50, 0.2, 0.2, 0.3, 0.24);
    const [x0, y0, x1, y1] = arc.segments[0].data;
    const bridge = { kind: 0, data: [x1, y1, x0, y0] };
    for (const t of [0.2, 0.5, 0.88]) {
      const [head, tail] = [spanOf(arc.segments[0], 0, t), spanOf(arc.segments[0], t, 1)];
      const drawn = { pen: 0, segments: [tail, bridge, head] };
      expect(audit([arc], [drawn]).findings, `${t}`).toEqual([]);
    }
  });

  test('a line on the next line, near a stroke that ends there, is no bridge', () => {
    const square = polyline([A, B, C, [10, 25], A]);
    const overshot = polyline([A, B, C, [10, 25], A, [10.04, 10]]);
    const result = audit([square, polyline([A, [0, 0]])], [overshot, polyline([A, [0, 0]])]);
    expect(codes(result)).toEqual(['line-doubled']);
    expect(Math.abs(result.twiceMm - 0.04)).toBeLessThan(2 * TAU);
  });

  test('the tip of a line that meets others at half a right angle', () => {
    const [left, slant] = [polyline([A, [10, 30]]), polyline([A, [24, 24]])];
    const short = polyline([
      [10.011, 10.011],
      [24, 24],
    ]);
    expect(codes(audit([left, slant], [left, short]))).toEqual(['line-missing']);
  });
});

describe('small curves', () => {
  test('rings and arcs near the size of the tolerance', () => {
    for (const r of [0.4, 0.1, 0.05, 0.03, 0.02]) {
      const ring = ellipseArc(50, 50, r, r, 0.3, 2 * Math.PI);
      const arc = ellipseArc(40, 50, r, r, 0.3, 2);
      expect(audit([ring, arc], [flattened(ring, 0.019), flattened(arc, 0.019)], COARSE).ok, `${r}`).toBe(
        true,
      );
      expect(codes(audit([ring, arc], [flattened(ring, 0.019)], COARSE)), `${r}`).toEqual(['line-missing']);
    }
  });

  test('a cubic with a loop smaller than the tolerance', () => {
    const loop = cubic([
      [0, 0],
      [10.02, 0.02],
      [9.98, 0.02],
      [20, 0],
    ]);
    expect(audit([loop], [flattened(loop, 0.019)], COARSE)).toMatchObject({ ok: true });
  });
});

test('refuses tolerances and numbers that mean nothing', () => {
  expect(() => audit([], [], { ...SVG, accuracyMm: 0 })).toThrow(RangeError);
  expect(() => audit([], [], { ...SVG, snapMm: -1 })).toThrow(RangeError);
  expect(() => audit([corner], [polyline([A, [Number.NaN, 1]])])).toThrow(RangeError);
});
