import type { CertifiedMatching, MatchingProblem } from '../../src/core/matching/problem.ts';
import { costOf } from './matchingProblems.ts';

/**
 * The definition of a proof by duality (Edmonds 1965), pair by pair over the complete graph and set by set, in
 * whole numbers of any size; for a few hundred vertices. False where anything in it does not hold.
 */
export function provesByDefinition(problem: MatchingProblem, matching: CertifiedMatching): boolean {
  const { n } = problem;
  const { mate } = matching;
  const { scale, vertexDual, setDual, setFirst, setEnd, setMembers } = matching.certificate;
  const sets = Array.from(setDual, (dual, i) => ({
    dual,
    members: new Set(setMembers.subarray(setFirst[i], setEnd[i])),
    size: setEnd[i] - setFirst[i],
  }));
  for (const { dual, members, size } of sets) {
    if (!(dual >= 0) || members.size !== size || size % 2 === 0) return false;
    const leaving = [...members].filter((v) => !members.has(mate[v])).length;
    if (dual > 0 && leaving !== 1) return false;
  }
  const whole = [...vertexDual, ...setDual].every(Number.isInteger);
  if (!whole || vertexDual.length !== n || mate.length !== n) return false;
  let dualSum = 0n;
  for (const dual of [...vertexDual, ...setDual]) dualSum += BigInt(dual);
  let primal = 0n;
  for (let u = 0; u < n; u++) {
    if (mate[u] === u || mate[mate[u]] !== u) return false;
    for (let v = u + 1; v < n; v++) {
      const cost = 2n * BigInt(Math.floor(scale * costOf(problem, u, v)));
      let reduced = cost - BigInt(vertexDual[u]) - BigInt(vertexDual[v]);
      for (const { dual, members } of sets) if (members.has(u) !== members.has(v)) reduced -= BigInt(dual);
      if (reduced < 0n || (mate[u] === v && reduced !== 0n)) return false;
      if (mate[u] === v) primal += cost;
    }
  }
  return primal === dualSum && BigInt(Math.ceil(matching.certificate.lowerBound * scale * 2)) <= dualSum;
}
