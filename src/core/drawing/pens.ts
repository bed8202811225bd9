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

/** Dashed lines often mean something else than solid ones, a fold for instance, so their pen is another. */
const DASHED = ' dashed';

/**
 * Shares the strokes out among pens by colour, by layer, or gives all to one; by colour, dashed lines are
 * kept apart from solid ones. O(strokes).
 */
export function planPens(drawing: Drawing, rule: PenRule): PenPlan {
  const { strokes, colours, layers } = drawing;
  const pens: Pen[] = [];
  const penOfKey = new Map<number, number>();
  const penOfStroke = new Uint32Array(strokes.count);
  for (let s = 0; s < strokes.count; s++) {
    const key =
      rule === 'colour' ? 2 * strokes.colour[s] + strokes.dashed[s] : rule === 'layer' ? strokes.layer[s] : 0;
    let pen = penOfKey.get(key);
    if (pen === undefined) {
      pen = pens.length;
      penOfKey.set(key, pen);
      const colour = colours[strokes.colour[s]] ?? '#000000';
      const layer = key === NO_LAYER ? undefined : layers[key];
      const name =
        rule === 'colour'
          ? `${colour}${strokes.dashed[s] ? DASHED : ''}`
          : rule === 'layer'
            ? (layer?.label ?? layer?.id ?? (key === NO_LAYER ? 'no layer' : `layer ${key + 1}`))
            : 'pen';
      pens.push({ name, colour, widthMm: strokes.widthMm[s] });
    }
    penOfStroke[s] = pen;
  }
  return { pens, penOfStroke };
}

/** The name of the pen that draws the solid lines of the same colour. */
export function solidPenName(name: string): string {
  return name.endsWith(DASHED) ? name.slice(0, -DASHED.length) : name;
}

/** The strokes of each pen, in document order. */
export function strokesOfPens(plan: PenPlan): Uint32Array[] {
  const lists: number[][] = plan.pens.map(() => []);
  plan.penOfStroke.forEach((pen, stroke) => {
    lists[pen].push(stroke);
  });
  return lists.map((list) => Uint32Array.from(list));
}
