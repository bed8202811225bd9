import { path, svg } from './svg.js';

const PETAL = 'M0 8C12 -2 34 -2 50 8C34 18 12 18 0 8Z';
const CENTRE = [60, 58];
/** Length of the petals of each ring and by how many degrees it is turned; a petal is 16/50 as high as long. */
const RINGS = [
  [50, 0],
  [37.5, 22.5],
  [25, 0],
];

/** One petal twenty-four times around a centre, all meeting there, and a few sprigs and beads. */
export function motifSheet() {
  const [cx, cy] = CENTRE;
  const petals = RINGS.flatMap(([length, turn]) =>
    Array.from(
      { length: 8 },
      (_, i) =>
        `<use href="#petal" x="${cx}" y="${cy - 0.16 * length}" width="${length}" height="${0.32 * length}" transform="rotate(${45 * i + turn} ${cx} ${cy})"/>`,
    ),
  );
  const sprigs = [
    [12, 12, 45],
    [108, 12, 135],
    [108, 104, 225],
    [12, 104, 315],
  ].map(([x, y, turn]) => `<use href="#sprig" transform="translate(${x} ${y}) rotate(${turn})"/>`);
  const beads = Array.from({ length: 9 }, (_, i) => `<use href="#bead" x="${20 + 10 * i}" y="122"/>`);
  return svg(
    120,
    132,
    'A sheet of motifs',
    [
      '<defs>',
      '<symbol id="petal" viewBox="0 0 50 16" overflow="visible">',
      `<path stroke-linejoin="round" d="${PETAL}"/>`,
      '</symbol>',
      '<g id="sprig">',
      path('M0 0H12'),
      path('M2 0C3 -4 6 -5 9 -5C8 -2 6 0 2 0Z'),
      path('M2 0C3 4 6 5 9 5C8 2 6 0 2 0Z'),
      '<circle cx="13.5" cy="0" r="1.5"/>',
      '</g>',
      '<g id="bead">',
      path('M-5 0L0 -4L5 0L0 4Z'),
      '<circle r="1.6"/>',
      '</g>',
      '</defs>',
      ...petals,
      ...sprigs,
      ...beads,
    ],
    { stroke: '#6c2a6a' },
  );
}
