/**
 * Calls `visit(segment, t0, t1)` for each whole or part segment of a piece of a stroke, in order.
 * Parts of no extent are passed over.
 */
export function walkSpan(
  startSegment: number,
  startT: number,
  endSegment: number,
  endT: number,
  visit: (segment: number, t0: number, t1: number) => void,
): void {
  for (let i = startSegment; i <= endSegment; i++) {
    const t0 = i === startSegment ? startT : 0;
    const t1 = i === endSegment ? endT : 1;
    if (t1 > t0) visit(i, t0, t1);
  }
}
