import { line, svg } from './svg.js';

/** The puzzle house, its eight lines in no good order. */
export function oneStrokeHouse() {
  const [left, right, floor, eaves, ridge] = [10, 110, 170, 70, 20];
  const lines = [
    line(left, eaves, right, eaves),
    line(right, floor, left, eaves),
    line(60, ridge, left, eaves),
    line(left, floor, right, floor),
    line(right, eaves, 60, ridge),
    line(left, floor, left, eaves),
    line(right, eaves, left, floor),
    line(right, eaves, right, floor),
  ];
  return svg(120, 180, 'A house in one stroke', lines);
}
