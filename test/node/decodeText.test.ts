import { gzipSync } from 'node:zlib';
import { describe, expect, test } from 'vitest';
import { decodeText, NotText } from '../../src/node/decodeText.ts';

const TEXT = '<?xml version="1.0"?>\n<svg><desc>é€𝄞</desc></svg>';

function whyNot(bytes: Uint8Array, limit?: number): string {
  try {
    decodeText(bytes, limit);
  } catch (error) {
    if (error instanceof NotText) return error.why;
    throw error;
  }
  throw new Error('it was read');
}

const bigEndian = (text: string): Buffer => Buffer.from(text, 'utf16le').swap16();
const mark = (...bytes: number[]) => Buffer.from(bytes);

describe('encodings that are read', () => {
  // XML 1.0, appendix F: what the first bytes say.
  test.each([
    ['UTF-8', Buffer.from(TEXT)],
    ['UTF-8 with a mark', Buffer.concat([mark(0xef, 0xbb, 0xbf), Buffer.from(TEXT)])],
    [
      'UTF-16, little end first, with a mark',
      Buffer.concat([mark(0xff, 0xfe), Buffer.from(TEXT, 'utf16le')]),
    ],
    ['UTF-16, big end first, with a mark', Buffer.concat([mark(0xfe, 0xff), bigEndian(TEXT)])],
    ['UTF-16, little end first, without', Buffer.from(TEXT, 'utf16le')],
    ['UTF-16, big end first, without', bigEndian(TEXT)],
    ['gzip', gzipSync(TEXT)],
    ['gzip around UTF-16', gzipSync(Buffer.concat([mark(0xfe, 0xff), bigEndian(TEXT)]))],
    ['gzip in two members', Buffer.concat([gzipSync(TEXT.slice(0, 9)), gzipSync(TEXT.slice(9))])],
  ])('%s', (_, bytes) => {
    expect(decodeText(bytes)).toBe(TEXT);
  });

  // The Encoding Standard's names and tables.
  test.each([
    ['iso-8859-1', [0xe9, 0xdf], 'éß'],
    ['ISO-8859-1', [0x80], '€'],
    ['windows-1252', [0x80, 0x9c, 0xe9], '€œé'],
    ['windows-1251', [0xc6], 'Ж'],
    ['iso-8859-15', [0xa4], '€'],
    ['shift_jis', [0x82, 0xa0], 'あ'],
    ['us-ascii', [0x41], 'A'],
    ['utf-8', [0xc3, 0xa9], 'é'],
  ])('declared as %s', (encoding, bytes, text) => {
    const head = `<?xml version="1.0" encoding='${encoding}'?><a>`;
    expect(decodeText(Buffer.concat([Buffer.from(head), mark(...bytes)]))).toBe(head + text);
  });

  test('a mark outdoes what is declared, and so does what can be read at all', () => {
    const declared = '<?xml version="1.0" encoding="iso-8859-1"?><a>é</a>';
    expect(decodeText(Buffer.concat([mark(0xef, 0xbb, 0xbf), Buffer.from(declared)]))).toBe(declared);
    const wide = '<?xml version="1.0" encoding="utf-16"?><a>é</a>';
    expect(decodeText(Buffer.from(wide))).toBe(wide);
    const narrow = '<?xml version="1.0" encoding="utf-8"?><a>é</a>';
    expect(decodeText(Buffer.from(narrow, 'utf16le'))).toBe(narrow);
  });
});

describe('bytes that are no text are refused, with their kind or the place', () => {
  test.each([
    [
      'Latin-1 that does not say so',
      Buffer.from('<svg>\n\u00e9</svg>', 'latin1'),
      /UTF-8: byte 6, in line 2, is 0xe9; .*windows-1252/,
    ],
    ['an overlong form', mark(0x3c, 0xc0, 0x80), /byte 1, in line 1, is 0xc0/],
    ['half a pair in UTF-8', mark(0x3c, 0xed, 0xa0, 0x80), /byte 1,/],
    ['a character cut off', mark(0x3c, 0x0a, 0xe2, 0x82), /byte 4, in line 2, is missing/],
    ['UTF-16 cut off', Buffer.from(TEXT, 'utf16le').subarray(0, 21), /UTF-16LE: byte 21, .* is missing/],
    ['half a pair in UTF-16', Buffer.from('<\n\n\ud800x', 'utf16le'), /UTF-16LE: byte \d+, in line 3,/],
    [
      'what is declared and does not hold',
      Buffer.concat([Buffer.from('<?xml version="1.0" encoding="shift_jis"?>\n'), mark(0x82, 0x20)]),
      /SHIFT_JIS: byte 44, in line 2, is 0x20; save it/,
    ],
    ['a PNG', mark(0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a), /^is not text but a PNG picture: .*SVG/],
    ['a JPEG', mark(0xff, 0xd8, 0xff, 0xe0), /a JPEG picture/],
    ['a GIF', Buffer.from('GIF89a'), /a GIF picture/],
    ['a PDF', Buffer.from('%PDF-1.4\n'), /a PDF document/],
    ['a ZIP', Buffer.from('PK\x03\x04'), /a ZIP archive/],
    ['a PNG, packed', gzipSync(mark(0x89, 0x50, 0x4e, 0x47, 0x0d)), /a PNG picture/],
    ['bytes of no known kind', mark(0x89, 0x51, 0x4e, 0x47), /byte 0, in line 1, is 0x89/],
    ['UTF-32 with a mark', mark(0xff, 0xfe, 0, 0, 0x3c, 0, 0, 0), /UTF-32/],
    ['UTF-32 without', mark(0, 0, 0, 0x3c), /UTF-32/],
    ['UTF-32, the other end first', mark(0x3c, 0, 0, 0), /UTF-32/],
    ['EBCDIC', mark(0x4c, 0x6f, 0xa7, 0x94), /EBCDIC/],
    ['an unknown encoding', Buffer.from('<?xml version="1.0" encoding="klingon"?>'), /not known, klingon/],
    ['gzip cut off', gzipSync(TEXT).subarray(0, 30), /cut off/],
    [
      'gzip damaged',
      Buffer.concat([mark(0x1f, 0x8b, 8, 0, 0, 0, 0, 0, 0, 3), Buffer.alloc(30, 0xff)]),
      /damaged/,
    ],
    ['gzip in gzip', gzipSync(gzipSync(TEXT)), /twice/],
  ])('%s', (_, bytes, why) => {
    expect(whyNot(bytes)).toMatch(why);
  });

  test('a file may unpack to just so much, and no more', () => {
    const packed = gzipSync(Buffer.alloc(5000, 32));
    expect(decodeText(packed, 5000)).toHaveLength(5000);
    expect(whyNot(packed, 4999)).toMatch(/limit unpackedBytes \(4999\); --limit unpackedBytes=N lifts it/);
  });

  test('the first wrong byte is found far on, in any encoding', () => {
    const far = Buffer.concat([Buffer.from('<a>\n'.repeat(50_000)), mark(0xff)]);
    expect(whyNot(far)).toMatch(/byte 200000, in line 50001, is 0xff/);
    const head = Buffer.from('<?xml version="1.0" encoding="euc-kr"?>\n');
    expect(whyNot(Buffer.concat([head, far]))).toMatch(/byte 200040, in line 50002/);
  });
});
