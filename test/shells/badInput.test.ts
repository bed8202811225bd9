import { spawnSync } from 'node:child_process';
import { closeSync, existsSync, mkdirSync, openSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { BIN, type CliResult, fewlift, inFolder, svgOf } from '../support/runCli.ts';

/** A line of message and one for each reason, no stack trace, nothing on standard output. */
function expectRefusal(result: CliResult, code: number, message: RegExp): void {
  expect(result.err).toMatch(message);
  expect(result.err.trimEnd().split('\n').length).toBeLessThanOrEqual(4);
  expect(result.err).not.toMatch(/^\s+at /m);
  expect(result.out).toBe('');
  expect(result.code).toBe(code);
}

// The first eight bytes of every PNG file (ISO/IEC 15948, W3C PNG Specification §5.2), and some more.
const PNG = Buffer.from([
  0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13, 0x49, 0x48, 0x44, 0x52,
]);

const FILES: [string, string | Buffer, RegExp][] = [
  ['empty.svg', '', /empty/],
  ['blank.svg', '  \n\n ', /empty|not SVG/],
  ['truncated.svg', svgOf('<g><path d="M0 0L10 10"/><path d="M5 5').slice(0, 150), /cut off.*line 1/],
  ['picture.svg', PNG, /not text/],
  ['packed.svg', Buffer.from([0x1f, 0x8b, 8, 0, 0]), /compressed/],
  ['latin.svg', Buffer.from(svgOf('<title>\u00e9</title>'), 'latin1'), /not text in UTF-8: byte .*encoding/],
  ['strange.svg', `<?xml version="1.0" encoding="x-none"?>${svgOf('')}`, /encoding.*x-none/],
  ['letters.svg', svgOf('<text>Hi</text>', 'width="9mm" height="9mm"'), /nothing.*stroke[\s\S]*1 text/],
  ['page.svg', '<html><body>no drawing</body></html>', /not SVG.*html/],
  ['words.svg', 'a shopping list', /not SVG.*shopping/],
  ['two.svg', `${svgOf('')}${svgOf('')}`, /second root/],
  [
    'filled.svg',
    svgOf('<rect width="9" height="9" fill="red" stroke="none"/>'),
    /nothing.*stroke[\s\S]*filled/,
  ],
  [
    'reasons.svg',
    svgOf('<text>Hi</text>\n<rect width="9" height="9" fill="red" stroke="none"/>\n<path d="M500 0v9"/>'),
    /nothing.*stroke[\s\S]*filled.*line 2, column 1, <rect>[\s\S]*page.*line 3, column 1, <path>[\s\S]*text.*line 1/,
  ],
  ['nothing.svg', svgOf(''), /nothing.*stroke/],
  ['nan.svg', svgOf('<path d="MNaN 0L10 10"/>'), /nothing.*stroke[\s\S]*path data/],
  ['huge.svg', svgOf('<path d="M1e400 0L10 10"/>'), /nothing.*stroke[\s\S]*path data/],
];

describe('what cannot be read: exit code 3', () => {
  test.each(FILES)('%s', (name, content, message) => {
    inFolder((folder, names) => {
      writeFileSync(join(folder, name), content);
      const before = names();
      expectRefusal(fewlift(['tour', name, '-o', 'out.svg', '-o', 'out.gcode'], '', folder), 3, message);
      expect(names()).toEqual(before);
    });
  });

  test('a directory, a missing file, nothing on standard input', () => {
    inFolder((folder, names) => {
      mkdirSync(join(folder, 'd.svg'));
      expectRefusal(fewlift(['tour', 'd.svg', '-o', 'out.svg'], '', folder), 3, /d\.svg.*directory/);
      expectRefusal(fewlift(['tour', 'none.svg', '-o', 'out.svg'], '', folder), 3, /none\.svg.*no such file/);
      expectRefusal(fewlift(['tour', '-', '-o', 'out.svg'], '', folder), 3, /standard input.*empty/);
      expect(names()).toEqual(['d.svg']);
    });
  });

  test('a bad path keeps what stands before the fault, and says where it is', () => {
    const { code, out, err } = fewlift(['tour', '-'], svgOf('<path id="p" d="M10 10L20 10L1e400 30"/>'));
    expect(code).toBe(0);
    expect(out).toContain('20 10');
    expect(err).toMatch(/path data is wrong at character \d+.*line 1, column 117, <path> id p/);
  });
});

describe('wrong usage: exit code 2', () => {
  const cases: [string, string[], RegExp][] = [
    ['a negative length', ['tour', 'a.svg', '--snap', '-1'], /snap.*below 0/],
    ['no length', ['tour', 'a.svg', '--snap', 'wide'], /snap.*length/],
    ['no accuracy', ['tour', 'a.svg', '--accuracy', '0'], /accuracy.*above 0/],
    [
      'an accuracy that G-code cannot hold',
      ['tour', 'a.svg', '--accuracy', '0.0005', '-o', 'x.gcode'],
      /0\.001 mm/,
    ],
    ['a home beyond all reach', ['tour', 'a.svg', '--home', '1e200,0'], /home/],
    ['an unknown option', ['tour', 'a.svg', '--fast'], /unknown option.*--fast/],
    ['an unknown command', ['draw', 'a.svg'], /unknown command.*draw/],
    ['an unknown choice', ['tour', 'a.svg', '--end', 'nowhere'], /end.*home, anywhere/],
    ['no drawing', ['tour'], /missing required argument/],
    ['an output of no known kind', ['tour', 'a.svg', '-o', 'a.pdf'], /a\.pdf.*extension/],
    ['several drawings, one output', ['tour', 'a.svg', 'b.svg', '-o', 'c.svg'], /--out-dir/],
    ['the input as output', ['tour', 'a.svg', '-o', './a.svg'], /overwrite.*--in-place/],
    ['one output twice', ['tour', 'a.svg', '-o', 'b.svg', '-o', './b.svg'], /twice/],
    ['report and drawing together', ['tour', 'a.svg', '--json', '-o', '-'], /standard output/],
    ['half a place', ['tour', 'a.svg', '--home', '5'], /home.*two lengths/],
    ['a seed that is no number', ['tour', 'a.svg', '--seed', 'x'], /seed.*whole number/],
  ];
  test.each(cases)('%s', (_, args, message) => {
    inFolder((folder, names) => {
      writeFileSync(join(folder, 'a.svg'), svgOf('<path d="M0 0L9 9"/>'));
      expectRefusal(fewlift(args, '', folder), 2, message);
      expect(names()).toEqual(['a.svg']);
    });
  });
});

describe('what cannot be written: exit code 5', () => {
  test.skipIf(!existsSync('/dev/full'))('standard output is full', () => {
    inFolder((folder) => {
      writeFileSync(join(folder, 'a.svg'), svgOf('<path d="M0 0L9 9"/>'));
      for (const command of ['tour', 'survey']) {
        const full = openSync('/dev/full', 'w');
        const { status, stderr } = spawnSync(process.execPath, [BIN, command, 'a.svg'], {
          cwd: folder,
          stdio: ['ignore', full, 'pipe'],
          encoding: 'utf8',
        });
        closeSync(full);
        expect([status, /^\s+at /m.test(stderr)]).toEqual([5, false]);
      }
    });
  });

  test('no such folder, or a folder in the way: nothing is written, other outputs neither', () => {
    inFolder((folder, names) => {
      writeFileSync(join(folder, 'a.svg'), svgOf('<path d="M0 0L9 9"/>'));
      mkdirSync(join(folder, 'taken.svg'));
      const missing = fewlift(['tour', 'a.svg', '-o', 'b.svg', '-o', 'no/such/c.svg'], '', folder);
      expectRefusal(missing, 5, /could not write.*no such/);
      const taken = fewlift(['tour', 'a.svg', '-o', 'b.svg', '-o', 'taken.svg'], '', folder);
      expectRefusal(taken, 5, /could not write.*directory/);
      expect(names()).toEqual(['a.svg', 'taken.svg']);
    });
  });
});
