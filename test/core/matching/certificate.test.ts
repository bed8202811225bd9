import { describe, expect, test } from 'vitest';
import { checkCertificate } from '../../../src/core/matching/certificate.ts';
import { exactMatching } from '../../../src/core/matching/exact.ts';
import type { Certificate, CertifiedMatching } from '../../../src/core/matching/problem.ts';
import { createRandom, randomBelow } from '../../../src/core/structures/random.ts';
import { provesByDefinition } from '../../support/certificateByPairs.ts';
import { plane, pointSets, smallProblem } from '../../support/matchingProblems.ts';

const problem = plane(pointSets.clustered(40, createRandom(12)));
const sound = exactMatching(problem);

function withCertificate(change: Partial<Certificate>): CertifiedMatching {
  return { ...sound, certificate: { ...sound.certificate, ...change } };
}

function changed<T extends Float64Array | Uint32Array | Int32Array>(column: T, i: number, value: number): T {
  const copy = column.slice() as T;
  copy[i] = value;
  return copy;
}

function reason(matching: CertifiedMatching): string | null {
  const { ok, reason: why } = checkCertificate(problem, matching);
  expect(ok).toBe(why === null);
  if (ok) expect(provesByDefinition(problem, matching)).toBe(true);
  return why;
}

test('accepts what the solver gives, which has sets in it', () => {
  expect(reason(sound)).toBe(null);
  expect(sound.certificate.setDual.length).toBeGreaterThan(3);
});

describe('rejects a spoilt certificate', () => {
  const { certificate, mate } = sound;

  test('a vertex dual changed, by 1 either way', () => {
    for (let v = 0; v < problem.n; v++) {
      const dual = certificate.vertexDual[v];
      expect(reason(withCertificate({ vertexDual: changed(certificate.vertexDual, v, dual + 1) }))).toMatch(
        /negative reduced cost/,
      );
      expect(reason(withCertificate({ vertexDual: changed(certificate.vertexDual, v, dual - 1) }))).toMatch(
        /slack/,
      );
    }
  });

  test('a set dual changed, negative or no integer', () => {
    for (let i = 0; i < certificate.setDual.length; i++) {
      const dual = certificate.setDual[i];
      expect(reason(withCertificate({ setDual: changed(certificate.setDual, i, dual + 1) }))).not.toBe(null);
      expect(reason(withCertificate({ setDual: changed(certificate.setDual, i, dual - 1) }))).not.toBe(null);
      expect(reason(withCertificate({ setDual: changed(certificate.setDual, i, -1) }))).toMatch(/negative/);
      expect(reason(withCertificate({ setDual: changed(certificate.setDual, i, dual + 0.5) }))).toMatch(
        /integer/,
      );
    }
  });

  test('a set left out, given away or merged with another', () => {
    const sets = certificate.setDual.length;
    for (let i = 0; i < sets; i++) {
      const without = (column: Float64Array | Uint32Array): number[] => [...column].filter((_, k) => k !== i);
      const spoilt = withCertificate({
        setDual: Float64Array.from(without(certificate.setDual)),
        setFirst: Uint32Array.from(without(certificate.setFirst)),
        setEnd: Uint32Array.from(without(certificate.setEnd)),
      });
      expect(reason(spoilt)).not.toBe(null);
      const first = certificate.setFirst[i];
      expect(reason(withCertificate({ setFirst: changed(certificate.setFirst, i, first + 2) }))).not.toBe(
        null,
      );
      expect(reason(withCertificate({ setEnd: changed(certificate.setEnd, i, first + 1) }))).toMatch(
        /not odd/,
      );
    }
  });

  test('two members of the list of members swapped, one of them in a set', () => {
    const { setMembers, setFirst, setEnd } = certificate;
    const sizes = [...setEnd].map((end, i) => end - setFirst[i]);
    const i = sizes.indexOf(Math.min(...sizes));
    let tried = 0;
    for (let a = setFirst[i]; a < setEnd[i]; a++) {
      for (let b = 0; b < setMembers.length; b++) {
        if (b >= setFirst[i] && b < setEnd[i]) continue;
        const swapped = changed(changed(setMembers, a, setMembers[b]), b, setMembers[a]);
        const spoilt = withCertificate({ setMembers: swapped });
        // Where both lie in the same sets that have a dual nothing is spoilt.
        expect(reason(spoilt) === null).toBe(provesByDefinition(problem, spoilt));
        tried++;
      }
    }
    expect(tried).toBeGreaterThan(20);
  });

  test('mates swapped between any two pairs', () => {
    for (let a = 0; a < problem.n; a++) {
      for (let c = 0; c < problem.n; c++) {
        const b = mate[a];
        const d = mate[c];
        if (c === a || c === b) continue;
        const other = changed(changed(changed(changed(mate, a, c), c, a), b, d), d, b);
        expect(reason({ ...sound, mate: other })).toMatch(/is left by|has slack/);
      }
    }
  });

  test('a mate that is not returned', () => {
    expect(reason({ ...sound, mate: changed(mate, 0, mate[1]) })).toMatch(/not in exactly one pair/);
    expect(reason({ ...sound, mate: mate.slice(2) })).toMatch(/one mate a vertex/);
  });

  test('an even set, a member twice, sets that overlap', () => {
    const setEnd = certificate.setEnd;
    expect(reason(withCertificate({ setEnd: changed(setEnd, 0, setEnd[0] - 1) }))).toMatch(/not odd/);
    const start = certificate.setFirst[0];
    const members = certificate.setMembers;
    expect(reason(withCertificate({ setMembers: changed(members, start, members[start + 1]) }))).toMatch(
      /wrong member/,
    );
    const pair = (v: number): number[] => [v, mate[v]];
    const a = 0;
    const others = Array.from({ length: problem.n }, (_, v) => v).filter(
      (v) => v !== a && v !== mate[a] && v < mate[v],
    );
    const overlapping = {
      setDual: new Float64Array(2),
      setFirst: Uint32Array.of(0, 3),
      setEnd: Uint32Array.of(3, 6),
      setMembers: Uint32Array.from([...pair(a), others[0], ...pair(others[1]), a]),
    };
    expect(reason(withCertificate(overlapping))).toMatch(/overlap/);
  });

  test('a scale, a bound or a total that does not follow', () => {
    expect(reason(withCertificate({ scale: certificate.scale * 3 }))).toMatch(/power of two/);
    expect(reason(withCertificate({ scale: certificate.scale * 2 }))).not.toBe(null);
    expect(reason(withCertificate({ lowerBound: certificate.lowerBound * (1 + 1e-15) }))).toMatch(
      /lower bound/,
    );
    expect(reason({ ...sound, total: sound.total * (1 + 1e-9) })).toMatch(/total/);
  });
});

test('agrees with the definition, pair by pair, on 300 problems with one number spoilt', () => {
  const random = createRandom(77);
  let rejected = 0;
  for (let round = 0; round < 300; round++) {
    const small = smallProblem(random, 16);
    const matching = exactMatching(small);
    const { vertexDual, setDual } = matching.certificate;
    const step = [-2, -1, 1, 2][randomBelow(random, 4)];
    const v = randomBelow(random, small.n);
    const w = randomBelow(random, small.n);
    // One dual, two against each other, or a set's dual against that of one of its vertices.
    const duals = changed(vertexDual, v, vertexDual[v] + step);
    const kind = randomBelow(random, 3);
    if (kind > 0) duals[w] -= step;
    const sets = setDual.slice();
    if (kind === 2 && sets.length > 0) sets[randomBelow(random, sets.length)] += step;
    const spoilt = {
      ...matching,
      certificate: { ...matching.certificate, vertexDual: duals, setDual: sets },
    };
    const { ok } = checkCertificate(small, spoilt);
    expect(ok).toBe(provesByDefinition(small, spoilt));
    expect(checkCertificate(small, matching).ok && provesByDefinition(small, matching)).toBe(true);
    if (!ok) rejected++;
  }
  expect(rejected).toBeGreaterThan(150);
});

test('larger sets: every pair of 200, and one dual spoilt far from anything', () => {
  for (const kind of [
    'odd tight clusters',
    '500 copies on a place',
    'exponential spread',
    'lattice with holes',
  ]) {
    const large = plane(pointSets[kind](200, createRandom(3)));
    const matching = exactMatching(large);
    expect(checkCertificate(large, matching).reason).toBe(null);
    expect(provesByDefinition(large, matching)).toBe(true);
    const { vertexDual } = matching.certificate;
    const raised = changed(vertexDual, 17, vertexDual[17] + 1);
    raised[150]--;
    const spoilt = { ...matching, certificate: { ...matching.certificate, vertexDual: raised } };
    expect(checkCertificate(large, spoilt).ok).toBe(provesByDefinition(large, spoilt));
  }
});

test('a matching that is not said to be optimal is checked for its bound alone', () => {
  const early = exactMatching(problem, { shouldStop: () => true });
  expect(checkCertificate(problem, early).reason).toBe(null);
  expect(checkCertificate(problem, { ...early, optimal: true }).ok).toBe(false);
  const { vertexDual } = early.certificate;
  const raised = { ...early.certificate, vertexDual: vertexDual.map((dual) => 3 * dual) };
  expect(checkCertificate(problem, { ...early, certificate: raised }).reason).toMatch(
    /negative reduced cost/,
  );
  const boast = { ...early.certificate, lowerBound: sound.total };
  expect(checkCertificate(problem, { ...early, certificate: boast }).reason).toMatch(/lower bound/);
});

test('a bound is never above the total, and within a hair of it', () => {
  for (const points of Object.values(pointSets)) {
    const { total, certificate } = exactMatching(plane(points(200, createRandom(4))));
    expect(certificate.lowerBound).toBeLessThanOrEqual(total);
    expect(total - certificate.lowerBound).toBeLessThanOrEqual(200 / certificate.scale);
  }
});
