/** Disjoint closed intervals in ascending order, flat: start, end, start, end … */
export type Intervals = number[];

/** Adds [from, to] in place, joining what is at most `slack` apart. O(intervals). */
export function addInterval(list: Intervals, from: number, to: number, slack: number): void {
  let start = 0;
  while (start < list.length && list[start + 1] < from - slack) start += 2;
  let end = start;
  let low = from;
  let high = to;
  while (end < list.length && list[end] <= to + slack) {
    low = Math.min(low, list[end]);
    high = Math.max(high, list[end + 1]);
    end += 2;
  }
  list.splice(start, end - start, low, high);
}

/** The parts of [from, to] that are not in the list. */
export function gapsIn(list: Intervals, from: number, to: number): Intervals {
  const gaps: Intervals = [];
  let at = from;
  for (let i = 0; i < list.length && list[i] < to; i += 2) {
    if (list[i + 1] <= at) continue;
    if (list[i] > at) gaps.push(at, list[i]);
    at = list[i + 1];
  }
  if (at < to) gaps.push(at, to);
  return gaps;
}

/** The parts of [from, to] that are in the list. */
export function partsIn(list: Intervals, from: number, to: number): Intervals {
  const parts: Intervals = [];
  for (let i = 0; i < list.length && list[i] < to; i += 2) {
    const low = Math.max(from, list[i]);
    const high = Math.min(to, list[i + 1]);
    if (high > low) parts.push(low, high);
  }
  return parts;
}

export function totalLength(list: Intervals): number {
  let sum = 0;
  for (let i = 0; i < list.length; i += 2) sum += list[i + 1] - list[i];
  return sum;
}
