import { columns, count, fineMm, mm, size } from './figures.js';
import type { Survey } from './survey.js';

/** A survey in a few lines for a terminal. */
export function surveyTable(survey: Survey): string {
  const { drawing, network, nearMisses, pens, layers } = survey;
  const title = drawing.title ? ` "${drawing.title}"` : '';
  const kinds = [
    count(drawing.strokes - drawing.closed - drawing.dots, 'open line'),
    count(drawing.closed, 'closed line'),
    count(drawing.dots, 'dot'),
  ];
  const facts = [
    ['page', `${size(drawing.widthMm)} x ${size(drawing.heightMm)} mm`],
    ['strokes', `${drawing.strokes} (${kinds.join(', ')}) of ${count(drawing.elements, 'element')}`],
    ['drawn', mm(drawing.drawnMm)],
    ['repeats', repeats(network)],
    ['components', `${network.components}, with ends up to ${network.snapMm} mm apart joined`],
    ['odd vertices', `${network.oddVertices}`],
    ['loose ends', looseEnds(nearMisses)],
    ['fewest runs', `${network.fewestRuns}`],
    [
      'travel',
      `at least ${mm(network.boundMm)}; ${mm(network.nearestNeighbourMm)} if always on to the nearest end`,
    ],
  ];
  const wide = Math.max(...facts.map(([name]) => name.length));
  const lines = [
    `${drawing.name}${title}`,
    ...facts.map(([name, fact]) => `  ${name.padEnd(wide)}  ${fact}`),
  ];
  if (pens.length > 1) {
    const head = ['pen', 'strokes', 'drawn', 'components', 'odd', 'fewest runs', 'least travel'];
    lines.push(
      ...columns([
        head,
        ...pens.map((p) => [
          p.pen,
          `${p.strokes}`,
          mm(p.drawnMm),
          `${p.components}`,
          `${p.oddVertices}`,
          `${p.fewestRuns}`,
          mm(p.boundMm),
        ]),
      ]),
    );
  }
  if (layers.length > 1) {
    lines.push(
      ...columns([
        ['layer', 'strokes'],
        ...layers.map((l) => [l.layer ?? '(outside layers)', `${l.strokes}`]),
      ]),
    );
  }
  return lines.join('\n');
}

function looseEnds({ count: n, leastMm, greatestMm, places }: Survey['nearMisses']): string {
  if (n === 0) return 'none that nearly meet';
  const gaps = n === 1 ? fineMm(leastMm) : `${fineMm(leastMm)} to ${fineMm(greatestMm)}`;
  const first = places.map(({ x, y }) => `(${size(x)}, ${size(y)})`).join(' ');
  return `${n} nearly meet, gaps of ${gaps}; first at ${first}`;
}

function repeats({ repeatedMm, repeatedDots }: Survey['network']): string {
  const parts = [];
  if (repeatedMm > 0) parts.push(`${mm(repeatedMm)} of lines`);
  if (repeatedDots > 0) parts.push(count(repeatedDots, 'dot'));
  return parts.length > 0 ? `${parts.join(' and ')} stand there more than once` : 'none';
}
