import { constants, isUtf8 } from 'node:buffer';
import { DEFAULT_LIMITS } from '../core/index.js';
import { firstBadByte } from './firstBadByte.js';
import { NotText } from './notText.js';
import { otherKind } from './otherKind.js';
import { isCompressed, unpack } from './unpack.js';

export { NotText } from './notText.js';

/**
 * The text of a file, compressed by gzip (as .svgz is) or not: by its byte order mark, by the zeros that
 * UTF-16 has between its characters, by the encoding that its XML declaration names, else UTF-8 (XML 1.0,
 * appendix F). Where mark and declaration disagree the mark holds, as in browsers.
 *
 * Throws NotText on bytes that are not valid there, with the place of the first, so that nothing is read
 * from a picture by accident; and where it unpacks to more than `unpackedBytes`.
 */
export function decodeText(file: Uint8Array, unpackedBytes: number = DEFAULT_LIMITS.unpackedBytes): string {
  const bytes = isCompressed(file) ? unpack(file, unpackedBytes) : file;
  if (isCompressed(bytes)) throw new NotText('is compressed twice: unpack it once (gunzip)');
  const kind = otherKind(bytes);
  if (kind !== null) throw new NotText(`is not text but ${kind}: export or trace it as SVG first`);
  return decode(bytes, encodingOf(bytes));
}

function encodingOf(bytes: Uint8Array): string {
  const [a = -1, b = -1, c = -1, d = -1] = bytes;
  if (a === 0xef && b === 0xbb && c === 0xbf) return 'utf-8';
  const isWide = (a === 0xff && b === 0xfe && c === 0 && d === 0) || (a === 0 && b === 0 && d !== -1);
  if (isWide || (b === 0 && c === 0 && d === 0)) {
    throw new NotText('is in UTF-32, which is not read: save it as UTF-8');
  }
  if (a === 0xff && b === 0xfe) return 'utf-16le';
  if (a === 0xfe && b === 0xff) return 'utf-16be';
  if (b === 0 && isBeginning(a)) return 'utf-16le';
  if (a === 0 && isBeginning(b)) return 'utf-16be';
  if (a === 0x4c && b === 0x6f && c === 0xa7 && d === 0x94) {
    throw new NotText('is in EBCDIC, which is not read: save it as UTF-8');
  }
  return declaredEncoding(bytes) ?? 'utf-8';
}

/** `<` or white space. */
function isBeginning(byte: number): boolean {
  return byte === 0x3c || byte === 0x20 || (byte >= 0x09 && byte <= 0x0d);
}

const DECLARATION = /^\s*<\?xml\s[^>]*?\sencoding\s*=\s*["']([^"'<>]*)["']/;
/** Encodings whose declaration cannot be read in bytes of one character each, so that it must be wrong. */
const OF_WIDE_CHARACTERS = /^(?:utf-?16|utf-?32|ucs-?[24]|iso-10646-ucs-[24]|unicode)(?:le|be)?$/i;

function declaredEncoding(bytes: Uint8Array): string | null {
  const head = bufferOf(bytes.subarray(0, 1024)).toString('latin1');
  const declared = DECLARATION.exec(head)?.[1].trim();
  return declared === undefined || OF_WIDE_CHARACTERS.test(declared) ? null : declared;
}

function decode(bytes: Uint8Array, encoding: string): string {
  const decoder = decoderFor(encoding);
  const name = decoder.encoding;
  // Asked first, since decoders of some versions of Node.js end the process instead of throwing.
  const atLeast = name === 'utf-8' ? 0 : bytes.length / (name.startsWith('utf-16') ? 2 : 1);
  if (atLeast > constants.MAX_STRING_LENGTH) throw tooLong();
  try {
    if (name === 'windows-1252') return decodeWindows1252(bytes);
    if (name !== 'utf-8') return decoder.decode(bytes);
    if (isUtf8(bytes)) {
      const start = bytes[0] === 0xef && bytes[1] === 0xbb && bytes[2] === 0xbf ? 3 : 0;
      return bufferOf(bytes, start).toString('utf8');
    }
  } catch (error) {
    if ((error as { code?: unknown }).code === 'ERR_STRING_TOO_LONG') throw tooLong();
  }
  throw notInEncoding(bytes, name, encoding);
}

/** The same bytes as a Buffer, not copied. */
function bufferOf({ buffer, byteOffset, length }: Uint8Array, from = 0): Buffer {
  return Buffer.from(buffer, byteOffset + from, length - from);
}

/** Characters of the bytes 0x80 to 0x9f (Encoding Standard, index windows-1252). */
const WINDOWS_1252 =
  '\u20ac\x81\u201a\u0192\u201e\u2026\u2020\u2021\u02c6\u2030\u0160\u2039\u0152\x8d\u017d\x8f' +
  '\x90\u2018\u2019\u201c\u201d\u2022\u2013\u2014\u02dc\u2122\u0161\u203a\u0153\x9d\u017e\u0178';

/** By our own table: decoders of some versions of Node.js take these bytes for control characters. */
function decodeWindows1252(bytes: Uint8Array): string {
  return bufferOf(bytes)
    .toString('latin1')
    .replace(/[\x80-\x9f]/g, (c) => WINDOWS_1252[c.charCodeAt(0) - 0x80]);
}

function tooLong(): NotText {
  return new NotText('holds more text than Node.js can keep in one piece (about 500 MB): split it');
}

function notInEncoding(bytes: Uint8Array, name: string, encoding: string): NotText {
  const { offset, line } = firstBadByte(bytes, name);
  const shown = encoding.slice(0, 40).toUpperCase();
  const byte = offset < bytes.length ? ` is 0x${bytes[offset].toString(16).padStart(2, '0')}` : ' is missing';
  const advice =
    name === 'utf-8'
      ? 'save it as UTF-8, or name its encoding at the very start: <?xml version="1.0" encoding="windows-1252"?> for one saved as Latin-1 or Windows-1252'
      : 'save it as UTF-8, or name the encoding that it is in';
  return new NotText(`is not text in ${shown}: byte ${offset}, in line ${line},${byte}; ${advice}`);
}

function decoderFor(encoding: string) {
  try {
    return new TextDecoder(encoding, { fatal: true });
  } catch {
    throw new NotText(`names an encoding that is not known, ${encoding.slice(0, 40)}: save it as UTF-8`);
  }
}
