const BLOCK = 1 << 16;

/**
 * Where bytes stop being text in an encoding: the offset of the first byte that is wrong, or the length
 * where the last character is not complete; and its line. O(bytes), asked only when all is lost.
 */
export function firstBadByte(bytes: Uint8Array, encoding: string): { offset: number; line: number } {
  const offset = encoding === 'utf-8' ? firstBadUtf8(bytes) : firstRefused(bytes, encoding);
  let line = 1;
  const step = encoding.startsWith('utf-16') ? 2 : 1;
  const low = encoding === 'utf-16be' ? 1 : 0;
  for (let at = 0; at + step <= offset; at += step) {
    if (bytes[at + low] === 10 && (step === 1 || bytes[at + 1 - low] === 0)) line++;
  }
  return { offset, line };
}

/** Well-formed UTF-8 as the Unicode Standard has it (chapter 3, table 3-7). */
function firstBadUtf8(bytes: Uint8Array): number {
  let at = 0;
  while (at < bytes.length) {
    const a = bytes[at];
    let more = 0;
    let from = 0x80;
    let to = 0xbf;
    if (a >= 0x80) {
      if (a >= 0xc2 && a <= 0xdf) more = 1;
      else if (a >= 0xe0 && a <= 0xef) more = 2;
      else if (a >= 0xf0 && a <= 0xf4) more = 3;
      else return at;
      if (a === 0xe0) from = 0xa0;
      else if (a === 0xed) to = 0x9f;
      else if (a === 0xf0) from = 0x90;
      else if (a === 0xf4) to = 0x8f;
    }
    for (let k = 1; k <= more; k++) {
      if (at + k >= bytes.length) return bytes.length;
      const c = bytes[at + k];
      if (c < from || c > to) return at;
      from = 0x80;
      to = 0xbf;
    }
    at += more + 1;
  }
  return at;
}

/** For other encodings: the byte at which the decoder gives up. */
function firstRefused(bytes: Uint8Array, encoding: string): number {
  let good = 0;
  const passes = (decoder: InstanceType<typeof TextDecoder>, from: number, to: number): boolean => {
    try {
      decoder.decode(bytes.subarray(from, to), { stream: true });
      return true;
    } catch {
      return false;
    }
  };
  let decoder = new TextDecoder(encoding, { fatal: true });
  while (good < bytes.length && passes(decoder, good, good + BLOCK)) good += BLOCK;
  if (good >= bytes.length) return bytes.length;
  decoder = new TextDecoder(encoding, { fatal: true });
  for (let at = 0; at < good; at += BLOCK) passes(decoder, at, at + BLOCK);
  while (good < bytes.length && passes(decoder, good, good + 1)) good++;
  return good;
}
