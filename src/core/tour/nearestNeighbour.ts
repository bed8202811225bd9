import Flatbush from 'flatbush';

/** The index is built anew when this share of it is drawn, so that searches never wade through what is gone. */
const STALE_SHARE = 1 / 8;

/**
 * Travel of the plainest ordering, for orientation: always to the nearest end of a line not yet drawn,
 * from home and, if closed, back. Line i goes from (`x[2i]`, `y[2i]`) to (`x[2i + 1]`, `y[2i + 1]`).
 * About n log n.
 */
export function nearestNeighbourTravel(
  x: ArrayLike<number>,
  y: ArrayLike<number>,
  homeX: number,
  homeY: number,
  closed: boolean,
): number {
  const drawn = new Uint8Array(x.length / 2);
  let left = Array.from(drawn, (_, i) => i);
  let travel = 0;
  let [atX, atY] = [homeX, homeY];
  while (left.length > 0) {
    const lines = left;
    const index = new Flatbush(2 * lines.length);
    for (const i of lines) {
      index.add(x[2 * i], y[2 * i]);
      index.add(x[2 * i + 1], y[2 * i + 1]);
    }
    index.finish();
    const batch = Math.max(1, Math.ceil(lines.length * STALE_SHARE));
    for (let k = 0; k < batch; k++) {
      const [found] = index.neighbors(atX, atY, 1, Number.POSITIVE_INFINITY, (p) => !drawn[lines[p >> 1]]);
      const line = lines[found >> 1];
      const end = 2 * line + (found & 1);
      const dx = x[end] - atX;
      const dy = y[end] - atY;
      travel += Math.sqrt(dx * dx + dy * dy);
      drawn[line] = 1;
      atX = x[end ^ 1];
      atY = y[end ^ 1];
    }
    left = lines.filter((i) => !drawn[i]);
  }
  const back = Math.sqrt((homeX - atX) * (homeX - atX) + (homeY - atY) * (homeY - atY));
  return closed ? travel + back : travel;
}
