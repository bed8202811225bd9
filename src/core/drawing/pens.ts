import { type Drawing, NO_LAYER } from './drawing.js';

export type PenRule = 'colour' | 'layer' | 'one';

export interface Pen {
  readonly name: string;
  readonly colour: string;
  /** Width of the first stroke that it draws, mm: how the drawing looks, not what the pen does. */
  readonly widthMm: number;
}

/** Which pen draws which stroke; pens in the order in which the drawing first needs them. */
export interface PenPlan {
  readonly pens: readonly Pen[];
  readonly penOfStroke: Uint32Array;
}

/** Shares the strokes out among pens by colour, by layer, or gives all to one. O(strokes). */
export function planPens(drawing: Drawing, rule: PenRule): PenPlan {
  const { strokes, colours, layers } = drawing;
  const pens: Pen[] = [];
  const penOfKey = new Map<number, number>();
  const penOfStroke = new Uint32Array(strokes.count);
  for (let s = 0; s < strokes.count; s++) {
    const key = rule === 'colour' ? strokes.colour[s] : rule === 'layer' ? strokes.layer[s] : 0;
    let pen = penOfKey.get(key);
    if (pen === undefined) {
      pen = pens.length;
      penOfKey.set(key, pen);
      const colour = colours[strokes.colour[s]] ?? '#000000';
      const layer = key === NO_LAYER ? undefined : layers[key];
      const name =
        rule === 'colour'
          ? colour
          : rule === 'layer'
            ? (layer?.label ?? layer?.id ?? (key === NO_LAYER ? 'no layer' : `layer ${key + 1}`))
            : 'pen';
      pens.push({ name, colour, widthMm: strokes.widthMm[s] });
    }
    penOfStroke[s] = pen;
  }
  return { pens, penOfStroke };
}

/** The strokes of each pen, in document order. */
export function strokesOfPens(plan: PenPlan): Uint32Array[] {
  const lists: number[][] = plan.pens.map(() => []);
  plan.penOfStroke.forEach((pen, stroke) => {
    lists[pen].push(stroke);
  });
  return lists.map((list) => Uint32Array.from(list));
}
