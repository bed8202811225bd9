import { type Drawing, NO_LAYER } from './drawing.js';
import { isNamed } from './penName.js';

export type PenRule = 'colour' | 'layer' | 'one';

/** One tool: what it is called and how its lines look in the drawing. */
export interface Pen {
  readonly name: string;
  /** What it is called in the drawing, before it was given another name. */
  readonly was: string;
  readonly colour: string;
  /** Width of the first stroke that it draws, mm: how the drawing looks, not what the pen does. */
  readonly widthMm: number;
}

/** Which pen draws which stroke. */
export interface PenPlan {
  readonly pens: readonly Pen[];
  readonly penOfStroke: Uint32Array;
}

/** How pens are called and in which order they draw; names as in the drawing, or as given anew. */
export interface PenNames {
  /** These pens first, in this order; the others after them as first met. */
  readonly penOrder: readonly string[];
  /** Old name and new name; pens with the same new name become one. */
  readonly penNames: readonly (readonly [string, string])[];
}

export const NO_PEN_NAMES: PenNames = { penOrder: [], penNames: [] };

/** Dashed lines often mean something else than solid ones, a fold for instance, so their pen is another. */
const DASHED = ' dashed';

/**
 * Shares the strokes out among pens by colour, by layer, or gives all to one; by colour, dashed lines are
 * kept apart from solid ones. Pens come in the order in which the drawing first needs them, but for those
 * that `names` puts first. O(strokes).
 */
export function planPens(drawing: Drawing, rule: PenRule, names: PenNames = NO_PEN_NAMES): PenPlan {
  const { strokes, colours } = drawing;
  const pens: Pen[] = [];
  const penOfKey = new Map<number, number>();
  const penOfNewName = new Map<string, number>();
  const penOfStroke = new Uint32Array(strokes.count);
  for (let s = 0; s < strokes.count; s++) {
    const key =
      rule === 'colour' ? 2 * strokes.colour[s] + strokes.dashed[s] : rule === 'layer' ? strokes.layer[s] : 0;
    let pen = penOfKey.get(key);
    if (pen === undefined) {
      const was = nameOf(drawing, s, rule);
      const renamed = names.penNames.find(([old]) => isNamed({ name: was, was }, old))?.[1];
      pen = renamed === undefined ? undefined : penOfNewName.get(renamed);
      if (pen === undefined) {
        const colour = colours[strokes.colour[s]] ?? '#000000';
        pen = pens.push({ name: renamed ?? was, was, colour, widthMm: strokes.widthMm[s] }) - 1;
        if (renamed !== undefined) penOfNewName.set(renamed, pen);
      }
      penOfKey.set(key, pen);
    }
    penOfStroke[s] = pen;
  }
  return inOrder({ pens, penOfStroke }, names.penOrder);
}

function nameOf({ strokes, colours, layers }: Drawing, stroke: number, rule: PenRule): string {
  if (rule === 'one') return 'pen';
  if (rule === 'colour') {
    return `${colours[strokes.colour[stroke]] ?? '#000000'}${strokes.dashed[stroke] ? DASHED : ''}`;
  }
  const number = strokes.layer[stroke];
  if (number === NO_LAYER) return 'no layer';
  return layers[number]?.label ?? layers[number]?.id ?? `layer ${number + 1}`;
}

function inOrder(plan: PenPlan, order: readonly string[]): PenPlan {
  if (order.length === 0) return plan;
  const rank = plan.pens.map((pen) => {
    const wanted = order.findIndex((name) => isNamed(pen, name));
    return wanted < 0 ? order.length : wanted;
  });
  const sorted = plan.pens.map((_, pen) => pen).sort((a, b) => rank[a] - rank[b] || a - b);
  const newNumber = new Uint32Array(sorted.length);
  sorted.forEach((pen, number) => {
    newNumber[pen] = number;
  });
  return {
    pens: sorted.map((pen) => plan.pens[pen]),
    penOfStroke: plan.penOfStroke.map((pen) => newNumber[pen]),
  };
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
