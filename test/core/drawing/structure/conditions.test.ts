import { describe, expect, test } from 'vitest';
import { holds } from '../../../../src/core/drawing/structure/conditions.ts';
import { codesOf, findingOf, readBody } from '../../../support/readStrokes.ts';

// As Chromium answers where the languages of its user are en-US and en (SVG 2, "systemLanguage").
describe('systemLanguage', () => {
  test.each(['en', 'en-US', 'en-GB', 'EN', 'de, en', 'de,en-us', ' en '])('%j holds', (languages) => {
    expect(holds(new Map([['systemLanguage', languages]]))).toBe(true);
  });

  test.each(['', 'e', 'fr', '*', 'en us', 'fr-en'])('%j does not', (languages) => {
    expect(holds(new Map([['systemLanguage', languages]]))).toBe(false);
  });

  test('a switch that chose by language is said', () => {
    const line = '<path d="M1 1h9" stroke="red"/>';
    const drawing = readBody(`<switch><g systemLanguage="fr">${line}</g><g>${line}</g></switch>`);
    expect(drawing.strokes.count).toBe(1);
    expect(findingOf(drawing, 'language-assumed').values).toEqual({ asked: 'fr', count: 1 });
    expect(codesOf(readBody(`<switch><g>${line}</g><g systemLanguage="fr"/></switch>`))).toEqual([]);
  });
});
