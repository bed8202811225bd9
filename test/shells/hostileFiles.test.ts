import { spawnSync } from 'node:child_process';
import { closeSync, mkdtempSync, openSync, readFileSync, rmSync, writeFileSync, writeSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { afterAll, describe, expect, test } from 'vitest';
import { BIN } from '../support/runCli.ts';

const USAGE = new URL('../support/usage.js', import.meta.url).href;
const MOST_SECONDS = 10;
const MOST_MIB = 2000;

const folder = mkdtempSync(join(tmpdir(), 'fewlift-hostile-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

interface Outcome {
  readonly code: number | null;
  readonly err: string;
  readonly seconds: number;
  readonly mib: number;
}

/** Runs the command line under the default flags of Node.js, as a user would. */
function survey(path: string, input?: Buffer, ...options: string[]): Outcome {
  const { status, stderr } = spawnSync(
    process.execPath,
    ['--import', USAGE, BIN, 'survey', path, ...options],
    {
      cwd: folder,
      input: input ?? '',
      encoding: 'utf8',
      timeout: 100_000,
    },
  );
  const [, seconds, mib] = /\nusage (\S+) s (\S+) MiB\n$/.exec(stderr) ?? [];
  return {
    code: status,
    err: stderr.replace(/\nusage .*\n$/, ''),
    seconds: Number(seconds),
    mib: Number(mib),
  };
}

/** One or two lines that say it, no stack, within the bounds. Processor time: others may be at work. */
function expectRefusal(outcome: Outcome, message: RegExp): void {
  expect(outcome.err).toMatch(message);
  expect(outcome.err.trimEnd().split('\n').length).toBeLessThanOrEqual(2);
  expect(outcome.err.length).toBeLessThan(600);
  expect(outcome.code).toBe(3);
  expect(outcome.seconds).toBeLessThan(MOST_SECONDS);
  expect(outcome.mib).toBeLessThan(MOST_MIB);
}

const HEAD = '<svg xmlns="http://www.w3.org/2000/svg" width="9mm" height="9mm" fill="none" stroke="red">';

/** Writes `head`, then a piece so many times, then `tail`. */
function write(name: string, head: string, piece: string, times: number, tail: string): string {
  const file = openSync(join(folder, name), 'w');
  const block = piece.repeat(Math.min(times, 10_000));
  writeSync(file, head);
  let left = times;
  for (; left >= 10_000; left -= 10_000) writeSync(file, block);
  writeSync(file, piece.repeat(left) + tail);
  closeSync(file);
  return name;
}

function doctype(declarations: string, body: string): string {
  return `<!DOCTYPE svg [${declarations}]>\n${HEAD}${body}</svg>`;
}

/** Each entity ten of the one before: 10⁴⁰ characters at the end. */
const LAUGHS = Array.from({ length: 40 }, (_, i) => `<!ENTITY e${i + 1} "${`&e${i};`.repeat(10)}">`).join('');
/** Ten million zeros in ten thousand bytes. */
const ZEROS = gzipSync(Buffer.alloc(10_000_000));
const BOMB = Buffer.concat(Array.from({ length: 1000 }, () => ZEROS));

/** Name, how it is made, what is said. */
const FILES: [string, (name: string) => unknown, RegExp][] = [
  [
    'laughs.svg',
    (name) => write(name, doctype(`<!ENTITY e0 "ha">${LAUGHS}`, '<text>&e40;</text>'), '', 0, ''),
    /entityCharacters \(4000000\); --limit entityCharacters=N lifts it.*line 2, column/,
  ],
  [
    'laughing-elements.svg',
    (name) => write(name, doctype(`<!ENTITY e0 "<g/>">${LAUGHS}`, '&e40;'), '', 0, ''),
    /entityCharacters \(4000000\)/,
  ],
  [
    'quadratic.svg',
    (name) =>
      write(
        name,
        `<!DOCTYPE svg [<!ENTITY a "${'a'.repeat(100_000)}">]>${HEAD}<desc>`,
        '&a;',
        100_000,
        '</desc></svg>',
      ),
    /"a" expands past the limit entityCharacters/,
  ],
  [
    'laughing-parameters.svg',
    (name) => {
      const levels = LAUGHS.replace(/ENTITY e/g, 'ENTITY % e').replace(/&/g, '&#37;');
      write(name, doctype(`<!ENTITY % e0 "<!-- -->">${levels}%e40;`, ''), '', 0, '');
    },
    /entity.*past the limit entityCharacters/,
  ],
  [
    'itself.svg',
    (name) => write(name, doctype('<!ENTITY a "<g>&b;</g>"><!ENTITY b "&a;">', '&a;'), '', 0, ''),
    /contains itself/,
  ],
  [
    'deep.svg',
    (name) => write(name, HEAD, '<g>', 100_000, '</g>'.repeat(100_000)),
    /past the limit depth \(1024\); --limit depth=N lifts it \(line 1, column/,
  ],
  ['unclosed.svg', (name) => write(name, HEAD, '<g>\n', 1_000_000, ''), /past the limit depth/],
  [
    'long-path.svg',
    (name) => write(name, `${HEAD}<path d="M0 0`, 'l1 2 3 4 5 6 7', 10_000_000, '"/></svg>'),
    /past the limit attributeCharacters \(128000000\); --limit attributeCharacters=N lifts it \(line 1/,
  ],
  [
    'attributes.svg',
    (name) => {
      const names = Array.from({ length: 400_000 }, (_, i) => ` a${i}="${i}"`).join('');
      write(name, `${HEAD}<path d="M0 0L1"${names}/></svg>`, '', 0, '');
    },
    /nothing.*stroke[\s\S]*path data/,
  ],
  [
    'huge-numbers.svg',
    (name) =>
      write(name, `${HEAD}<path d="M0 0`, 'L1e308 -1e308 1e-320 999999999999999999999', 300_000, '"/></svg>'),
    /nothing.*stroke[\s\S]*coordinates beyond/,
  ],
  [
    'numbers-of-digits.svg',
    (name) => write(name, `${HEAD}<path d="M0 0L1`, '1234567890', 5_000_000, ' 1"/></svg>'),
    /nothing.*stroke/,
  ],
  ['cut-off.svg', (name) => write(name, HEAD, '<path d="M0 0L1 1"/>\n', 1_000_000, '<path d="M0'), /cut off/],
  [
    'latin.svg',
    (name) => writeFileSync(join(folder, name), Buffer.from(`${HEAD}\n<!-- caf\u00e9 --></svg>`, 'latin1')),
    /not text in UTF-8: byte 99, in line 2, is 0xe9; save it as UTF-8/,
  ],
  ['zeros.svg', (name) => writeFileSync(join(folder, name), Buffer.alloc(10_000_000)), /UTF-32/],
  [
    'zeros-inside.svg',
    (name) => write(name, HEAD, '\0', 1000, '</svg>'),
    /character that XML does not allow \(code 0\) \(line 1, column 91\)/,
  ],
  [
    'bomb.svgz',
    (name) => writeFileSync(join(folder, name), BOMB),
    /limit unpackedBytes \(500000000\); --limit/,
  ],
];

describe('files made to hurt end in a clear error within ten seconds and two gigabytes', () => {
  test.each(FILES)('%s', (name, make, message) => {
    make(name);
    expectRefusal(survey(name), message);
    rmSync(join(folder, name));
  });

  test('the bomb on standard input', () => {
    expectRefusal(survey('-', BOMB), /standard input unpacks to more bytes than the limit/);
  });
});

test('a packed drawing is read like any other', () => {
  const drawing = Buffer.from(`${HEAD}<path d="M0 0L9 9"/></svg>`);
  writeFileSync(join(folder, 'plain.svg'), drawing);
  writeFileSync(join(folder, 'packed.svgz'), gzipSync(drawing));
  const read = (path: string, input?: Buffer) => {
    const { code, err } = survey(path, input, '--json');
    return { code, err };
  };
  expect(read('packed.svgz')).toEqual(read('plain.svg'));
  expect(read('-', gzipSync(drawing)).code).toBe(0);
  expect(readFileSync(join(folder, 'packed.svgz'))).toEqual(gzipSync(drawing));
});
