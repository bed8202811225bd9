import type { Certificate } from './problem.js';

/**
 * The sets of a certificate as a nest. In its depth-first order every set is a run of vertices, and what two
 * vertices share of the duals is the least over the steps from the one to the other: a range minimum, looked up
 * in a table of powers of two (Bender & Farach-Colton, LATIN 2000).
 */
export interface Nest {
  /** By vertex: y(v) and the duals of all sets around v. */
  readonly whole: Float64Array;
  /** By vertex: its place in the order. */
  readonly position: Int32Array;
  /** The duals of the sets that hold the vertices at all places from `from` to `to`, both included, from < to. */
  sharedAlong(from: number, to: number): number;
  /** The duals of the sets that hold both u and v. */
  sharedBy(u: number, v: number): number;
}

/** Null where two sets overlap: taken from large to small, all members of a set must lie in the same set so far. */
export function nestOf(n: number, certificate: Certificate): Nest | null {
  const { vertexDual, setDual, setFirst, setEnd, setMembers } = certificate;
  const sets = setDual.length;
  const order = Array.from(setDual, (_, i) => i);
  order.sort((a, b) => setEnd[b] - setFirst[b] - (setEnd[a] - setFirst[a]) || a - b);
  const around = new Int32Array(sets);
  const innermost = new Int32Array(n).fill(-1);
  const depthDual = new Float64Array(sets);
  for (const i of order) {
    const outer = innermost[setMembers[setFirst[i]]];
    around[i] = outer;
    depthDual[i] = setDual[i] + (outer < 0 ? 0 : depthDual[outer]);
    for (let k = setFirst[i]; k < setEnd[i]; k++) {
      if (innermost[setMembers[k]] !== outer) return null;
      innermost[setMembers[k]] = i;
    }
  }
  const whole = vertexDual.map((dual, v) => dual + (innermost[v] < 0 ? 0 : depthDual[innermost[v]]));
  const { position, steps } = depthFirst(n, around, innermost, depthDual);
  const sharedAlong = rangeMinimum(steps);
  return {
    whole,
    position,
    sharedAlong,
    sharedBy(u, v) {
      const a = position[u];
      const b = position[v];
      return a < b ? sharedAlong(a, b) : sharedAlong(b, a);
    },
  };
}

/** The order, and for each step from place i to i + 1 the duals of the sets around both. */
function depthFirst(
  n: number,
  around: Int32Array,
  innermost: Int32Array,
  depthDual: Float64Array,
): { position: Int32Array; steps: Float64Array } {
  // Chains of what lies directly in a set (in none: in the last chain): vertices, and sets as ~set.
  const head = new Int32Array(around.length + 1).fill(n);
  const nextVertex = new Int32Array(n);
  const nextSet = new Int32Array(around.length);
  const chainOf = (set: number): number => (set < 0 ? around.length : set);
  for (let v = n - 1; v >= 0; v--) {
    nextVertex[v] = head[chainOf(innermost[v])];
    head[chainOf(innermost[v])] = v;
  }
  for (let i = around.length - 1; i >= 0; i--) {
    nextSet[i] = head[chainOf(around[i])];
    head[chainOf(around[i])] = ~i;
  }
  const position = new Int32Array(n);
  const steps = new Float64Array(n);
  let at = 0;
  let set = -1;
  let here = head[around.length];
  let low = 0;
  for (;;) {
    if (here === n) {
      if (set < 0) return { position, steps };
      here = nextSet[set];
      set = around[set];
      low = Math.min(low, set < 0 ? 0 : depthDual[set]);
    } else if (here >= 0) {
      if (at > 0) steps[at - 1] = low;
      position[here] = at++;
      low = set < 0 ? 0 : depthDual[set];
      here = nextVertex[here];
    } else {
      set = ~here;
      here = head[set];
    }
  }
}

function rangeMinimum(values: Float64Array): (from: number, to: number) => number {
  const levels = [values];
  for (let reach = 1; 2 * reach < values.length; reach *= 2) {
    const below = levels[levels.length - 1];
    const level = new Float64Array(values.length);
    for (let i = 0; i + 2 * reach <= values.length; i++) level[i] = Math.min(below[i], below[i + reach]);
    levels.push(level);
  }
  return (from, to) => {
    // The steps from … to − 1.
    const level = 31 - Math.clz32(to - from);
    return Math.min(levels[level][from], levels[level][to - 2 ** level]);
  };
}
