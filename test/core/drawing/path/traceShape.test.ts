import { describe, expect, test } from 'vitest';
import { brokenPromises, codesOf, findingOf, readBody, textsOf } from '../../../support/readStrokes.ts';

function shape(markup: string): string[] {
  const drawing = readBody(`<g fill="none" stroke="black">${markup}</g>`);
  expect(brokenPromises(drawing)).toEqual([]);
  return textsOf(drawing);
}

// Starts, directions and equivalent paths as SVG 2, chapter "Basic Shapes", gives them.
describe('shapes draw their equivalent path', () => {
  test.each([
    ['<line x1="1" y1="2" x2="3" y2="4"/>', '<path d="M1 2L3 4"/>'],
    ['<line x2="3"/>', '<path d="M0 0L3 0"/>'],
    ['<rect x="1" y="2" width="10" height="4"/>', '<path d="M1 2H11V6H1Z"/>'],
    ['<polyline points="1,2 3,4 5,2"/>', '<path d="M1 2 3 4 5 2"/>'],
    ['<polyline points="1 2-3-4.5.5"/>', '<path d="M1 2-3-4.5.5"/>'],
    ['<polygon points="1,2,3,4,5,2"/>', '<path d="M1 2 3 4 5 2Z"/>'],
    ['<polygon points="1,2 3,4 1,2"/>', '<path d="M1 2 3 4 1 2Z"/>'],
  ])('%s', (markup, path) => {
    expect(shape(markup)).toEqual(shape(path));
  });

  test('circle: from 3 o’clock, clockwise on the screen, four quarter arcs', () => {
    expect(shape('<circle cx="5" cy="6" r="2"/>')).toEqual([
      '7,6 A 5,6 2,0 0,2 0 1.570796 5,8 A 5,6 2,0 0,2 1.570796 1.570796 3,6 ' +
        'A 5,6 2,0 0,2 3.141593 1.570796 5,4 A 5,6 2,0 0,2 4.712389 1.570796 7,6 Z',
    ]);
  });

  test('ellipse: a radius that is auto takes the other', () => {
    expect(shape('<ellipse cx="5" cy="6" rx="3" ry="2"/>')[0]).toMatch(/^8,6 A 5,6 3,0 0,2 0 1\.570796 5,8 /);
    const circle = shape('<circle cx="5" cy="6" r="2"/>');
    expect(shape('<ellipse cx="5" cy="6" rx="2"/>')).toEqual(circle);
    expect(shape('<ellipse cx="5" cy="6" ry="2" rx="auto"/>')).toEqual(circle);
    expect(shape('<ellipse cx="5" cy="6"/>')).toEqual([]);
  });

  test('rounded rectangle: starts after the first corner, arcs clockwise', () => {
    expect(shape('<rect x="1" y="2" width="10" height="8" rx="3" ry="2"/>')).toEqual([
      '4,2 L 8,2 A 8,4 3,0 0,2 4.712389 1.570796 11,4 L 11,8 A 8,8 3,0 0,2 0 1.570796 8,10 ' +
        'L 4,10 A 4,8 3,0 0,2 1.570796 1.570796 1,8 L 1,4 A 4,4 3,0 0,2 3.141593 1.570796 4,2 Z',
    ]);
  });

  test('corner radii: auto takes the other, half the side is the most, 0 is square', () => {
    const rounded = shape('<rect width="10" height="8" rx="2" ry="2"/>');
    expect(shape('<rect width="10" height="8" rx="2"/>')).toEqual(rounded);
    expect(shape('<rect width="10" height="8" ry="2" rx="auto"/>')).toEqual(rounded);
    const oval = shape('<rect width="10" height="8" rx="99" ry="99"/>');
    expect(oval).toEqual(shape('<rect width="10" height="8" rx="5" ry="4"/>'));
    expect(oval[0]).not.toContain('L');
    const square = shape('<rect width="10" height="8"/>');
    expect(shape('<rect width="10" height="8" rx="0" ry="3"/>')).toEqual(square);
    expect(shape('<rect width="10" height="8" rx="-1"/>')).toEqual(square);
  });

  test('percentages: x of the width, y of the height, r of the diagonal over √2', () => {
    const drawing = readBody(
      '<line x1="10%" y1="10%" x2="50%" y2="50%" stroke="black"/><circle r="50%" stroke="black"/>',
      'xmlns="http://www.w3.org/2000/svg" width="30mm" height="40mm" viewBox="0 0 30 40"',
    );
    // √((30² + 40²)/2) = 35.355339…, half of it 17.67767.
    expect(textsOf(drawing)[0]).toBe('3,4 L 15,20');
    expect(textsOf(drawing)[1]).toMatch(/^17\.67767,0 /);
  });

  test('lengths with units count in user units: 1mm is 96/25.4 of them', () => {
    expect(shape('<line x1="25.4mm" y1="1in" x2="72pt" y2="48px"/>')).toEqual(['96,96 L 96,48']);
    expect(shape('<line x2="2em" y2="1ex" font-size="10"/>')).toEqual(['0,0 L 20,5']);
  });
});

describe('shapes without a size', () => {
  test.each([
    '<rect width="10" height="0"/>',
    '<rect width="10"/>',
    '<circle r="0"/>',
    '<circle/>',
    '<ellipse rx="0" ry="2"/>',
    '<polyline points=""/>',
    '<polyline/>',
    '<path/>',
    '<path d=""/>',
    '<path d="none"/>',
    '<path d="M1 1"/>',
  ])('%s draws nothing and is counted', (markup) => {
    const drawing = readBody(`<g fill="none" stroke="black">${markup}</g>`);
    expect(drawing.strokes.count).toBe(0);
    expect(codesOf(drawing)).toEqual(['nothing-to-draw']);
    expect(drawing.elementCount).toBe(1);
  });

  test.each([
    ['<rect width="-10" height="1"/>', { attribute: 'width', found: -10 }],
    ['<circle r="-1"/>', { attribute: 'r', found: -1 }],
    ['<circle r="1furlong"/>', { attribute: 'r', found: '1furlong' }],
  ])('%s is wrong and said so', (markup, values) => {
    const drawing = readBody(`<g fill="none" stroke="black">${markup}</g>`);
    expect(drawing.strokes.count).toBe(0);
    expect(drawing.findings.map((f) => f.values)).toContainEqual({ ...values, count: 1 });
  });
});

describe('lists of points with an error draw up to it', () => {
  test('a lone last number', () => {
    const drawing = readBody('<polyline points="1 1 2 2 3" stroke="black"/>');
    expect(textsOf(drawing)).toEqual(['1,1 L 2,2']);
    expect(findingOf(drawing, 'points-odd').severity).toBe('warning');
  });

  test('something that is no number', () => {
    const drawing = readBody('<polygon points="1 1 2 2 3 1 x 4 5" stroke="black"/>');
    expect(textsOf(drawing)).toEqual(['1,1 L 2,2 L 3,1 L 1,1 Z']);
    expect(findingOf(drawing, 'points-error').values).toMatchObject({ offset: 12, found: 'x 4 5' });
  });
});

// A polygon of one point is M x,y Z by its equivalent path: a dot where caps are round.
test('polygon and line of no length are dots with round caps', () => {
  expect(shape('<polygon points="3 4" stroke-linecap="round"/>')).toEqual(['3,4 .']);
  expect(shape('<line x1="1" y1="1" x2="1" y2="1" stroke-linecap="square"/>')).toEqual(['1,1 .']);
});
