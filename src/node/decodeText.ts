/** Bytes that are no text; `why` says it to a person. */
export class NotText extends Error {
  constructor(readonly why: string) {
    super(why);
  }
}

/**
 * The text of a file: by its byte order mark, by the encoding its XML declaration names, else UTF-8.
 * Throws NotText on bytes that are not valid there, so that nothing is read from a picture by accident.
 */
export function decodeText(bytes: Uint8Array): string {
  const [a, b] = bytes;
  if (a === 0x1f && b === 0x8b) throw new NotText('is compressed: unpack it first (gunzip)');
  if (a === 0xff && b === 0xfe) return decode(bytes, 'utf-16le');
  if (a === 0xfe && b === 0xff) return decode(bytes, 'utf-16be');
  const head = String.fromCharCode(...bytes.subarray(0, 200));
  const declared = /^(?:\xef\xbb\xbf)?<\?xml[^>]*?\sencoding\s*=\s*["']([A-Za-z0-9._-]+)["']/.exec(head);
  return decode(bytes, declared ? declared[1] : 'utf-8');
}

function decode(bytes: Uint8Array, encoding: string): string {
  const decoder = decoderFor(encoding);
  try {
    return decoder.decode(bytes);
  } catch {
    throw new NotText(
      `is not text in ${encoding}: a drawing is expected, as SVG in UTF-8 or with its encoding named`,
    );
  }
}

function decoderFor(encoding: string) {
  try {
    return new TextDecoder(encoding, { fatal: true });
  } catch {
    throw new NotText(`names an encoding that is not known, ${encoding.slice(0, 40)}: save it as UTF-8`);
  }
}
