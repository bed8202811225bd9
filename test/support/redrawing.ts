import { LINE } from '../../src/core/geometry/segments.ts';
import { randomBelow } from '../../src/core/structures/random.ts';
import {
  asCubic,
  type Chain,
  endOf,
  flattened,
  isClosed,
  reversed,
  rounded,
  type Segment,
  spanOf,
  startOf,
} from './chains.ts';
import type { DrawnStroke } from './lineDrawings.ts';

/** How a drawing may be drawn without harm. */
export interface Style {
  readonly flattenMm: number | null;
  readonly stepMm: number;
  readonly keepRepeats: boolean;
}

/**
 * The same lines drawn otherwise: in another order and direction, cut at any place, rings begun
 * elsewhere, lines as cubics, gaps bridged, repeats and dots on lines left out, numbers rounded.
 */
export function redrawn(strokes: readonly DrawnStroke[], random: () => number, style: Style): Chain[] {
  const chains: Chain[] = [];
  const sides = new Set<string>();
  let previous: DrawnStroke | null = null;
  for (const stroke of strokes) {
    const { kind } = stroke;
    let { chain } = stroke;
    if (kind === 'dot-on-line' && random() < 0.5) continue;
    if (kind === 'lattice' && !style.keepRepeats && random() < 0.7) {
      chains.push(...newSides(chain, sides));
      continue;
    }
    if (kind === 'gapped' && previous?.kind === 'gapped' && random() < 0.7) {
      const bridged = bridgedOnto(chains[chains.length - 1], chain, random);
      if (bridged) {
        chains[chains.length - 1] = bridged;
        previous = stroke;
        continue;
      }
    }
    previous = stroke;
    if (isClosed(chain) && random() < 0.6) chain = turned(chain, random);
    chains.push(chain);
  }
  const drawn = chains.flatMap((chain) => {
    if (chain.dot) return [rounded(chain, style.stepMm)];
    let parts = random() < 0.5 ? cut(chain, random) : [chain];
    if (random() < 0.2) parts = parts.map((p) => ({ ...p, segments: p.segments.map(asCubic) }));
    if (style.flattenMm !== null) parts = parts.map((p) => flattened(p, style.flattenMm ?? 1));
    parts = parts.map((p) => (random() < 0.5 ? reversed(p) : p));
    return parts.map((p) => rounded(p, style.stepMm));
  });
  return shuffled(drawn, random);
}

export function shuffled<T>(items: readonly T[], random: () => number): T[] {
  const result = [...items];
  for (let i = result.length - 1; i > 0; i--) {
    const j = randomBelow(random, i + 1);
    [result[i], result[j]] = [result[j], result[i]];
  }
  return result;
}

/** The sides of a square that were not drawn yet. */
function newSides(chain: Chain, drawn: Set<string>): Chain[] {
  const fresh: Chain[] = [];
  for (const segment of chain.segments) {
    const [x0, y0, x1, y1] = segment.data.map((v) => v.toFixed(6));
    const key = [`${x0} ${y0}`, `${x1} ${y1}`].sort().join();
    if (drawn.has(key)) continue;
    drawn.add(key);
    fresh.push({ ...chain, segments: [segment] });
  }
  return fresh;
}

/** Both chains as one run with a straight bridge between, where they lie end to start. */
function bridgedOnto(first: Chain, second: Chain, random: () => number): Chain | null {
  const [a, b] = [endOf(first), startOf(second)];
  if (first.pen !== second.pen || (a[0] - b[0]) ** 2 + (a[1] - b[1]) ** 2 > 0.05 ** 2) return null;
  const bridge: Segment = { kind: LINE, data: [...a, ...b] };
  const halves = random() < 0.5 ? [bridge] : [spanOf(bridge, 0, 0.4), spanOf(bridge, 0.4, 1)];
  return { ...first, segments: [...first.segments, ...halves, ...second.segments] };
}

/** A ring begun at another place, at a joint or within a segment. */
function turned(chain: Chain, random: () => number): Chain {
  const k = randomBelow(random, chain.segments.length);
  const { segments } = chain;
  if (random() < 0.4) return { ...chain, segments: [...segments.slice(k), ...segments.slice(0, k)] };
  const t = 0.1 + 0.8 * random();
  return {
    ...chain,
    segments: [
      spanOf(segments[k], t, 1),
      ...segments.slice(k + 1),
      ...segments.slice(0, k),
      spanOf(segments[k], 0, t),
    ],
  };
}

/** The chain in two or three runs, cut within segments or only drawn in more segments. */
function cut(chain: Chain, random: () => number): Chain[] {
  const parts: Segment[][] = [[]];
  for (const segment of chain.segments) {
    const t = 0.05 + 0.9 * random();
    if (random() < 0.5) {
      parts[parts.length - 1].push(segment);
      continue;
    }
    parts[parts.length - 1].push(spanOf(segment, 0, t));
    // A bridge is drawn in one run, and a stroke as small as one too.
    const [x0, y0, x1, y1] = segment.data;
    const isShort = segment.kind === LINE && (x1 - x0) ** 2 + (y1 - y0) ** 2 < 1;
    if (!isShort && random() < 0.6) parts.push([]);
    parts[parts.length - 1].push(spanOf(segment, t, 1));
  }
  return parts.map((segments) => ({ ...chain, segments }));
}
