import { describe, expect, test } from 'vitest';
import { checkCertificate } from '../../../src/core/matching/certificate.ts';
import { exactMatching } from '../../../src/core/matching/exact.ts';
import type { Certificate, CertifiedMatching } from '../../../src/core/matching/problem.ts';
import { createRandom } from '../../../src/core/structures/random.ts';
import { plane, pointSets } from '../../support/matchingProblems.ts';

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

test('a bound is never above the total, and within a hair of it', () => {
  for (const points of Object.values(pointSets)) {
    const { total, certificate } = exactMatching(plane(points(200, createRandom(4))));
    expect(certificate.lowerBound).toBeLessThanOrEqual(total);
    expect(total - certificate.lowerBound).toBeLessThanOrEqual(200 / certificate.scale);
  }
});
