import type { Drawing } from '../../src/core/drawing/drawing.ts';
import { readDrawing } from '../../src/core/drawing/readDrawing.ts';
import { ARC, CUBIC, LINE, SEGMENT_SIZE } from '../../src/core/geometry/segments.ts';

/** A root of 100 mm × 100 mm whose user unit is 1 mm, so that numbers come out as they went in. */
export const IN_MM = 'xmlns="http://www.w3.org/2000/svg" width="100mm" height="100mm" viewBox="0 0 100 100"';

export function readBody(body: string, root = IN_MM): Drawing {
  return readDrawing(`<svg ${root}>${body}</svg>`);
}

/** The strokes of a black path with this data. */
export function readPath(d: string): string[] {
  return textsOf(readBody(`<path d="${d}" fill="none" stroke="black"/>`));
}

/**
 * Each stroke as text: its start, then `L x,y`, `C a b x,y` or `A c u v theta0 sweep x,y` per segment,
 * `Z` where it is closed, `.` alone for a dot. Numbers are rounded to `decimals` places.
 */
export function textsOf(drawing: Drawing, decimals = 6): string[] {
  const { strokes } = drawing;
  const { kind, offset, data } = strokes.segments;
  const scale = 10 ** decimals;
  const number = (v: number): string => String(Math.round(v * scale) / scale + 0);
  const points = (from: number, to: number): string => {
    const out: string[] = [];
    for (let k = from; k < to; k += 2) out.push(`${number(data[k])},${number(data[k + 1])}`);
    return out.join(' ');
  };
  const texts: string[] = [];
  for (let s = 0; s < strokes.count; s++) {
    const start = offset[strokes.first[s]];
    let text = points(start, start + 2);
    for (let i = strokes.first[s]; i < strokes.first[s + 1]; i++) {
      const o = offset[i];
      if (strokes.dot[s]) text += ' .';
      else if (kind[i] === LINE) text += ` L ${points(o + 2, o + 4)}`;
      else if (kind[i] === CUBIC) text += ` C ${points(o + 4, o + 8)} ${points(o + 2, o + 4)}`;
      else {
        text += ` A ${points(o + 4, o + 10)} ${number(data[o + 10])} ${number(data[o + 11])} ${points(o + 2, o + 4)}`;
      }
    }
    texts.push(strokes.closed[s] ? `${text} Z` : text);
  }
  return texts;
}

export function codesOf(drawing: Drawing): string[] {
  return drawing.findings.map((f) => f.code);
}

/** The finding with this code; fails where there is none. */
export function findingOf(drawing: Drawing, code: string): Drawing['findings'][number] {
  const finding = drawing.findings.find((f) => f.code === code);
  if (!finding) throw new Error(`no finding ${code}, only ${codesOf(drawing).join(', ')}`);
  return finding;
}

/** What `Drawing` promises and this one breaks, checked from the definition; empty where all holds. */
export function brokenPromises(drawing: Drawing): string[] {
  const broken: string[] = [];
  const { strokes, colours, layers, places } = drawing;
  const { segments, first } = strokes;
  const { kind, offset, data } = segments;
  const claim = (holds: boolean, what: string): void => {
    if (!holds) broken.push(what);
  };
  claim(first.length === strokes.count + 1 && first[0] === 0, 'first has one entry per stroke and one more');
  claim(first[strokes.count] === segments.count, 'segments all belong to strokes');
  claim(drawing.widthMm >= 0 && drawing.heightMm >= 0 && Number.isFinite(drawing.widthMm), 'page has a size');
  for (let s = 0; s < strokes.count; s++) {
    claim(first[s + 1] > first[s], `stroke ${s} has segments`);
    claim(strokes.colour[s] < colours.length, `stroke ${s} has a colour`);
    claim(strokes.element[s] < places.length, `stroke ${s} has a place`);
    claim(strokes.layer[s] === 0xffffffff || strokes.layer[s] < layers.length, `stroke ${s} has a layer`);
    claim(strokes.widthMm[s] >= 0 && Number.isFinite(strokes.widthMm[s]), `stroke ${s} has a width`);
    for (let i = first[s]; i < first[s + 1]; i++) {
      const o = offset[i];
      const numbers = data.subarray(o, o + SEGMENT_SIZE[kind[i]]);
      claim(numbers.every(Number.isFinite), `segment ${i} has finite numbers`);
      const zero = numbers[0] === numbers[2] && numbers[1] === numbers[3];
      if (strokes.dot[s]) claim(kind[i] === LINE && zero, `dot ${s} is a line to itself`);
      else if (kind[i] === LINE) claim(!zero, `segment ${i} has a length`);
      else if (kind[i] === CUBIC) claim(new Set(numbers).size > 2 || !zero, `segment ${i} has a length`);
      else claim(kind[i] === ARC, `segment ${i} has a kind`);
      if (i === first[s]) continue;
      const before = offset[i - 1];
      claim(
        data[before + 2] === data[o] && data[before + 3] === data[o + 1],
        `segment ${i} joins the one before`,
      );
    }
    if (!strokes.closed[s]) continue;
    const start = offset[first[s]];
    const end = offset[first[s + 1] - 1];
    claim(
      data[start] === data[end + 2] && data[start + 1] === data[end + 3],
      `stroke ${s} ends where it starts`,
    );
  }
  return broken;
}
