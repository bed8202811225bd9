/**
 * Files that are often taken for drawings, by their first bytes (ISO/IEC 15948 for PNG, ITU-T T.81 for JPEG,
 * GIF89a, ISO 32000 for PDF; ZIP's "PK" from memory).
 */
const KINDS: readonly (readonly [readonly number[], string])[] = [
  [[0x89, 0x50, 0x4e, 0x47], 'a PNG picture'],
  [[0xff, 0xd8, 0xff], 'a JPEG picture'],
  [[0x47, 0x49, 0x46, 0x38], 'a GIF picture'],
  [[0x25, 0x50, 0x44, 0x46], 'a PDF document'],
  [[0x50, 0x4b, 0x03, 0x04], 'a ZIP archive'],
];

/** What a file is that is no text of a drawing, with its article; null where that is not known. */
export function otherKind(bytes: Uint8Array): string | null {
  const kind = KINDS.find(([start]) => start.every((byte, i) => bytes[i] === byte));
  return kind ? kind[1] : null;
}
