import { line, path, svg } from './svg.js';

const FOLD = '#00798c';
const CUT = '#c8443f';

/** Front, side, back and side in a row, a flap to glue on the left, a lid and a bottom that tuck in. */
export function giftBox() {
  const [wide, deep, high, tuck, glue, dust, dashes] = [60, 40, 30, 12, 10, 22, '3 2'];
  const [left, top] = [20, 62];
  const bottom = top + high;
  // Edges of the panels, from left to right.
  const x = [left, left + wide, left + wide + deep, left + 2 * wide + deep, left + 2 * (wide + deep)];

  const folds = [
    line(x[0], top, x[0], bottom),
    line(x[1], top, x[1], bottom),
    line(x[2], top, x[2], bottom),
    line(x[3], top, x[3], bottom),
    // Lid on the back panel, bottom on the front panel, each with its tuck.
    line(x[2], top, x[3], top),
    line(x[2], top - deep, x[3], top - deep),
    line(x[0], bottom, x[1], bottom),
    line(x[0], bottom + deep, x[1], bottom + deep),
    // Dust flaps on the sides.
    line(x[1], top, x[2], top),
    line(x[3], top, x[4], top),
    line(x[1], bottom, x[2], bottom),
    line(x[3], bottom, x[4], bottom),
  ];

  /** Three sides of a lid and its tuck with two round corners; `out` is -1 upwards, 1 downwards. */
  const lid = (x0, x1, y, out) => {
    const [edge, end, r] = [y + out * deep, y + out * (deep + tuck), 10];
    const [a, b, shoulder] = [x0 + 0.5, x1 - 0.5, end - out * r];
    const arc = `A${r} ${r} 0 0 ${out < 0 ? 1 : 0}`;
    return path(
      `M${x0} ${y}V${edge}L${a} ${shoulder}${arc} ${a + r} ${end}H${b - r}${arc} ${b} ${shoulder}L${x1} ${edge}V${y}`,
    );
  };
  const flap = (x0, x1, y, out) =>
    path(
      `M${x0} ${y}L${x0 + 1} ${y + out * 6}L${x0 + 6} ${y + out * dust}H${x1 - 6}L${x1 - 1} ${y + out * 6}L${x1} ${y}`,
    );
  const cuts = [
    lid(x[2], x[3], top, -1),
    line(x[4], top, x[4], bottom),
    flap(x[1], x[2], bottom, 1),
    line(x[1], top, x[0], top),
    flap(x[3], x[4], top, -1),
    line(x[2], bottom, x[3], bottom),
    lid(x[0], x[1], bottom, 1),
    flap(x[1], x[2], top, -1),
    path(`M${x[0]} ${top}L${x[0] - glue} ${top + 4}V${bottom - 4}L${x[0]} ${bottom}`),
    flap(x[3], x[4], bottom, 1),
  ];
  return svg(230, 154, 'A gift box, 60 x 40 x 30 mm', [
    `<g id="fold" aria-label="fold" stroke="${FOLD}" stroke-dasharray="${dashes}">`,
    ...folds,
    '</g>',
    `<g id="cut" aria-label="cut" stroke="${CUT}">`,
    ...cuts,
    '</g>',
  ]);
}
