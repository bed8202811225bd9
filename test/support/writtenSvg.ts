import parsePath from 'svg-path-parser';
import { arcFromEndpoints } from '../../src/core/geometry/arc.ts';
import { SegmentBuilder, type Segments } from '../../src/core/geometry/segments.ts';

export interface WrittenGroup {
  readonly attributes: ReadonlyMap<string, string>;
  readonly paths: readonly string[];
}

/** The groups of a text that `writeSvg` made, by its lines: no reader of ours takes part. */
export function groupsOf(svg: string): WrittenGroup[] {
  return [...svg.matchAll(/^<g ([^>]*)>\n([\s\S]*?)^<\/g>$/gm)].map(([, head, body]) => ({
    attributes: new Map([...head.matchAll(/([\w:-]+)="([^"]*)"/g)].map(([, name, value]) => [name, value])),
    paths: [...body.matchAll(/<path d="([^"]*)"\/>/g)].map(([, d]) => d),
  }));
}

/** The segments of one path's data, parsed by svg-path-parser; `closed` where it ends in Z. */
export function segmentsOfPath(d: string): { segments: Segments; closed: boolean } {
  const builder = new SegmentBuilder();
  let [x0, y0, startX, startY] = [0, 0, 0, 0];
  let [mirrorX, mirrorY] = [0, 0];
  let closed = false;
  for (const c of parsePath(d)) {
    const isRelative = c.code !== 'Z' && c.code === c.code.toLowerCase();
    const [baseX, baseY] = isRelative ? [x0, y0] : [0, 0];
    const command = c.code.toUpperCase();
    let x = c.x === undefined ? x0 : baseX + c.x;
    let y = c.y === undefined ? y0 : baseY + c.y;
    if (command === 'Z') [x, y] = [startX, startY];
    if (command === 'M') [startX, startY] = [x, y];
    else if (command === 'L' || command === 'H' || command === 'V') builder.line(x0, y0, x, y);
    else if (command === 'C' || command === 'S') {
      const [ax, ay] =
        command === 'C' ? [baseX + c.x1!, baseY + c.y1!] : [2 * x0 - mirrorX, 2 * y0 - mirrorY];
      [mirrorX, mirrorY] = [baseX + c.x2!, baseY + c.y2!];
      builder.cubic(x0, y0, ax, ay, mirrorX, mirrorY, x, y);
    } else if (command === 'A') {
      const arc = arcFromEndpoints(x0, y0, c.rx!, c.ry!, c.xAxisRotation!, c.largeArc!, c.sweep!, x, y);
      if (typeof arc === 'string') throw new Error(`an arc that is none: ${arc}`);
      builder.arc(x0, y0, x, y, arc.cx, arc.cy, arc.ux, arc.uy, arc.vx, arc.vy, arc.theta0, arc.sweep);
    } else if (command === 'Z') {
      closed = true;
      if (x0 !== x || y0 !== y) builder.line(x0, y0, x, y);
    } else {
      throw new Error(`unexpected command ${c.code}`);
    }
    [x0, y0] = [x, y];
  }
  return { segments: builder.finish(), closed };
}
