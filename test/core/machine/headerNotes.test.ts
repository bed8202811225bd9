import fc from 'fast-check';
import { expect, test } from 'vitest';
import { fromComment, toComment } from '../../../src/core/machine/commentText.ts';
import {
  formatHeaderNotes,
  formatPenNote,
  readHeaderNote,
  readPenNote,
} from '../../../src/core/machine/headerNotes.ts';

// NISTIR 6556 §3.3.4, §E.2: printable characters and no bracket.
test('any text fits a comment and comes back', () => {
  fc.assert(
    fc.property(fc.string({ unit: 'binary', maxLength: 30 }), (text) => {
      const comment = toComment(text, 400);
      expect(comment).toMatch(/^[\x20-\x7e]*$/);
      expect(comment).not.toMatch(/[()!?~%;]/);
      expect(fromComment(comment)).toBe(text);
    }),
  );
});

test('a text that is too long is cut between characters', () => {
  expect(toComment('abcdefghij', 10)).toBe('abcdefghij');
  expect(toComment('abcdefghijk', 10)).toBe('abcdefg...');
  expect(toComment('abcé(é', 10)).toBe('abc...');
});

test('text that looks like an escape is not one', () => {
  expect(fromComment(toComment('\\u0041'))).toBe('\\u0041');
});

test('header notes come back', () => {
  const notes = {
    pageWidthMm: 210,
    pageHeightMm: 296.999999,
    homeXMm: -1.5,
    homeYMm: 0,
    raisedHeightMm: 3,
    downHeightMm: -0.25,
  };
  const back = Object.assign({}, ...formatHeaderNotes(notes, 3).map(readHeaderNote));
  expect(back).toEqual(notes);
});

test('a pen comes back by name and colour, whatever its name', () => {
  fc.assert(
    fc.property(fc.string({ unit: 'binary', maxLength: 13 }), (name) => {
      const pen = { name, colour: '#c00000' };
      expect(readPenNote(formatPenNote(2, 3, pen))).toEqual(pen);
    }),
  );
  expect(readPenNote('run 3')).toBeNull();
  expect(readHeaderNote('run 3')).toEqual({});
});
