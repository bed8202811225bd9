import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { PathCommands } from '../../../../src/core/drawing/path/pathCommands.ts';
import { readPathByGrammar } from '../../../../src/core/drawing/path/pathGrammar.ts';
import { PathReader } from '../../../../src/core/drawing/path/pathReader.ts';
import { readPathTokens } from '../../../../src/core/drawing/path/pathTokens.ts';
import { TextCursor } from '../../../../src/core/drawing/path/textCursor.ts';

/** The commands one to a word: `M 1 2`, `L 3 4`. */
function words(commands: PathCommands): string[] {
  const arity: Record<string, number> = { M: 2, L: 2, H: 1, V: 1, C: 6, S: 4, Q: 4, T: 2, A: 7, Z: 0 };
  const out: string[] = [];
  let at = 0;
  for (let i = 0; i < commands.count; i++) {
    const letter = String.fromCharCode(commands.codes[i]);
    const end = at + arity[letter.toUpperCase()];
    out.push([letter, ...commands.numbers.subarray(at, end)].join(' '));
    at = end;
  }
  expect(at).toBe(commands.used);
  return out;
}

function byTokens(data: string): { words: string[]; error: number } {
  const commands = new PathCommands();
  const error = readPathTokens(data, new TextCursor(), commands);
  return { words: words(commands), error };
}

function byGrammar(data: string): string[] | null {
  const commands = new PathCommands();
  return readPathByGrammar(data, commands) ? words(commands) : null;
}

describe('legal path data', () => {
  // SVG 2, "The grammar for path data": the examples of the text and of the notes to the EBNF.
  test.each([
    ['M 100 100 L 200 200', ['M 100 100', 'L 200 200']],
    ['M100 100L200 200', ['M 100 100', 'L 200 200']],
    ['M 100 200 L 200 100 -100 -200', ['M 100 200', 'L 200 100', 'L -100 -200']],
    ['M 100-200', ['M 100 -200']],
    ['M 0.6.5', ['M 0.6 0.5']],
    ['m 1 2 3 4', ['M 1 2', 'l 3 4']],
    ['M1,2m3,4,5,6', ['M 1 2', 'm 3 4', 'l 5 6']],
    ['M0 0a1 1 0 00 10 0', ['M 0 0', 'a 1 1 0 0 0 10 0']],
    ['M0 0a1 1 0 0110 0', ['M 0 0', 'a 1 1 0 0 1 10 0']],
    ['M0 0A5,5,0,1,0,10,0 1 1 0 11.5.5', ['M 0 0', 'A 5 5 0 1 0 10 0', 'A 1 1 0 1 1 0.5 0.5']],
    ['M1e2-1E-2h+.5', ['M 100 -0.01', 'h 0.5']],
    ['M0 0zm1 1Z', ['M 0 0', 'Z', 'm 1 1', 'Z']],
    ['\t\n\r M0 0 \n', ['M 0 0']],
    ['', []],
    [' ', []],
  ])('%j', (data, expected) => {
    expect(byTokens(data)).toEqual({ words: expected, error: -1 });
    expect(byGrammar(data)).toEqual(expected);
  });

  // SVG 1.1 allowed it, SVG 2 does not, and browsers draw nothing from there on.
  test('a trailing point is an error, though the packaged grammar takes it', () => {
    expect(byTokens('M2 3L23. 4')).toEqual({ words: ['M 2 3'], error: 5 });
    const reader = new PathReader();
    expect(reader.read('M2 3L23. 4')).toBe(5);
    expect(words(reader.commands)).toEqual(['M 2 3']);
  });

  // An error by the grammar of SVG 2; Chromium goes on.
  test('a comma before a command or the end is passed over, after a closepath it is an error', () => {
    const reader = new PathReader();
    expect(reader.read('M0 0,L9 9 , z')).toBe(-1);
    expect(words(reader.commands)).toEqual(['M 0 0', 'L 9 9', 'Z']);
    expect(reader.read('M0 0L9 9,')).toBe(-1);
    expect(reader.read('M0 0z,L9 9')).toBe(5);
    expect(reader.read('M0 0L9 9,,L1 1')).toBe(9);
  });

  // SVG 2 counts form feed as white space and lets radii have a sign; the packaged grammar does neither.
  test('what the packaged grammar refuses is read by our tokens', () => {
    const reader = new PathReader();
    expect(byGrammar('M0 0\fL1 1')).toBeNull();
    expect(reader.read('M0 0\fL1 1')).toBe(-1);
    expect(words(reader.commands)).toEqual(['M 0 0', 'L 1 1']);
    expect(reader.read('M0 0A-5-5 0 0 1 3 4')).toBe(-1);
    expect(words(reader.commands)).toEqual(['M 0 0', 'A -5 -5 0 0 1 3 4']);
  });

  // SVG 2, "The d property": `none` draws nothing and is no error.
  test('none', () => {
    const reader = new PathReader();
    expect(reader.read(' none ')).toBe(-1);
    expect(reader.commands.count).toBe(0);
  });
});

describe('path data with an error is read up to it', () => {
  test.each([
    // SVG 2, "Error handling in path data": this one draws a line from 10,10 to 20,20.
    ['M 10,10 L 20,20,30', ['M 10 10', 'L 20 20'], 18],
    ['L 1 1', [], 0],
    ['M 1', [], 3],
    ['M 1 2 x 3', ['M 1 2'], 6],
    ['M 1 2 L 3 4 C 1 2 3 4 5', ['M 1 2', 'L 3 4'], 23],
    ['M 1 2 c 1 1 2 2 3 3 4 4 5', ['M 1 2', 'c 1 1 2 2 3 3'], 25],
    ['M 1 2 A 1 1 0 2 0 5 5', ['M 1 2'], 14],
    ['M 1 2,,', ['M 1 2'], 6],
    ['M 1 2,,3 4', ['M 1 2'], 6],
    ['M 1 2 Z 3 4', ['M 1 2', 'Z'], 8],
    ['M 1 2 L NaN 4', ['M 1 2'], 8],
    ['M 1 2 L Infinity 4', ['M 1 2'], 8],
    ['M 1 2 L 3 4 5 1e400 6 7', ['M 1 2', 'L 3 4'], 14],
    ['M 1 2 L -1e309 4', ['M 1 2'], 8],
    ['M 1 2 L 3em 4', ['M 1 2'], 9],
  ])('%j', (data, expected, error) => {
    expect(byTokens(data)).toEqual({ words: expected, error });
    expect(byGrammar(data)).toBeNull();
    const reader = new PathReader();
    expect(reader.read(data)).toBe(error);
    expect(words(reader.commands)).toEqual(expected);
  });
});

/** A number in one of the spellings of the grammar. */
const number = fc.oneof(
  fc.integer({ min: -999, max: 999 }).map(String),
  fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e6, max: 1e6 }).map((v) => String(v)),
  fc.tuple(fc.constantFrom('', '-', '+'), fc.nat(99), fc.nat(9)).map(([sign, f, e]) => `${sign}.${f}e-${e}`),
  fc.tuple(fc.constantFrom('', '-'), fc.nat(99), fc.nat(999)).map(([sign, i, f]) => `${sign}${i}.${f}E+1`),
);
const space = fc.constantFrom(' ', ',', ' , ', '\n', '\t ', ' ,\r\n');
const radius = number.map((n) => n.replace(/^[+-]/, ''));

function argumentsOf(letter: string): fc.Arbitrary<string> {
  const count = { M: 2, L: 2, H: 1, V: 1, C: 6, S: 4, Q: 4, T: 2 }[letter.toUpperCase()] ?? 0;
  if (letter.toUpperCase() === 'A') {
    return fc
      .tuple(
        radius,
        radius,
        number,
        fc.constantFrom('0', '1'),
        fc.constantFrom('0', '1'),
        number,
        number,
        space,
      )
      .map(([rx, ry, turn, large, sweep, x, y, s]) => [rx, ry, turn, large + sweep + x, y].join(s));
  }
  return fc
    .tuple(fc.array(number, { minLength: count, maxLength: count }), space)
    .map(([numbers, s]) => numbers.join(s));
}

const command = fc
  .constantFrom(...'mlhvcsqtazMLHVCSQTAZ')
  .chain((letter) =>
    letter.toUpperCase() === 'Z'
      ? fc.constant(letter)
      : fc
          .tuple(fc.array(argumentsOf(letter), { minLength: 1, maxLength: 3 }), space)
          .map(([sets, s]) => letter + sets.join(s)),
  );

/** Path data made from the grammar of SVG 2. */
const pathData = fc
  .tuple(argumentsOf('M'), fc.array(command, { maxLength: 30 }), fc.constantFrom('', ' ', '\n'))
  .map(([start, commands, s]) => [`M${start}`, ...commands].join(s));

describe('two independent readers', () => {
  test('agree on every path made from the grammar', () => {
    fc.assert(
      fc.property(pathData, (data) => {
        const tokens = byTokens(data);
        expect(tokens.error).toBe(-1);
        expect(byGrammar(data)).toEqual(tokens.words);
      }),
      { numRuns: 400 },
    );
  });

  test('agree on whether data with a random change is legal', () => {
    const change = fc.tuple(fc.nat(400), fc.constantFrom('', 'e', '.', '-', ',', 'x', 'Z', '1', 'M', ' '));
    fc.assert(
      fc.property(pathData, change, (data, [at, text]) => {
        const changed = data.slice(0, at) + text + data.slice(at + 1);
        const tokens = byTokens(changed);
        const grammar = byGrammar(changed);
        // What the two are known to see differently: a trailing point; signed radii, a comma before a command.
        if (tokens.error >= 0 && grammar) expect(changed).toMatch(/\.(?!\d)/);
        else if (tokens.error < 0 && grammar) expect(grammar).toEqual(tokens.words);
        else if (tokens.error < 0) expect(changed).toMatch(/a|,\s*(?:[a-z]|$)/i);
      }),
      { numRuns: 400 },
    );
  });

  test('agree across the cuts that long data is parsed in', () => {
    const letters = 'LlHvCSqTaZm';
    let data = 'M0 0';
    for (let i = 0; i < 5000; i++) {
      const letter = letters[(i * 7 + (i >> 5)) % letters.length];
      const count = { L: 2, l: 2, H: 1, v: 1, C: 6, S: 4, q: 4, T: 2, m: 2, Z: 0, a: 7 }[letter] ?? 0;
      const numbers = Array.from({ length: count }, (_, k) =>
        letter === 'a' && (k === 3 || k === 4) ? k - 3 : i % 97,
      );
      data += letter + numbers.join(' ');
    }
    expect(byGrammar(data)).toEqual(byTokens(data).words);
  });

  test('an error stops both at the same command: the words before it are those of the legal part', () => {
    fc.assert(
      fc.property(pathData, (data) => {
        const whole = byTokens(data).words;
        expect(byTokens(`${data} L 1`).words).toEqual(whole);
        expect(byTokens(`${data} ! M 1 1`).words).toEqual(whole);
      }),
      { numRuns: 100 },
    );
  });
});

describe('numbers', () => {
  test('are the double nearest to the text, as the language itself reads it', () => {
    const digits = fc.string({ unit: fc.constantFrom(...'0123456789'), minLength: 1, maxLength: 24 });
    const text = fc
      .tuple(fc.constantFrom('', '-'), digits, digits, fc.integer({ min: -30, max: 30 }), fc.nat(3))
      .map(([sign, a, b, e, form]) => sign + [a, `${a}.${b}`, `.${b}`, `${a}.${b}e${e}`][form]);
    fc.assert(
      fc.property(text, (t) => {
        const cursor = new TextCursor().reset(t);
        expect(cursor.number()).toBe(true);
        expect(cursor.at).toBe(t.length);
        expect(cursor.value).toBe(Number(t) + 0);
      }),
      { numRuns: 1000 },
    );
  });
});
