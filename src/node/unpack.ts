import { gunzipSync } from 'node:zlib';
import { NotText } from './notText.js';

/** Whether bytes begin as gzip does (RFC 1952 §2.3.1). */
export function isCompressed(bytes: Uint8Array): boolean {
  return bytes[0] === 0x1f && bytes[1] === 0x8b;
}

/** Unpacks gzip; throws NotText where it is damaged, or as soon as there are more bytes than `limit`. */
export function unpack(bytes: Uint8Array, limit: number): Uint8Array {
  try {
    return gunzipSync(bytes, { maxOutputLength: limit, chunkSize: 1 << 20 });
  } catch (error) {
    const { code } = error as { code?: unknown };
    if (code === 'ERR_BUFFER_TOO_LARGE') {
      throw new NotText(
        `unpacks to more bytes than the limit unpackedBytes (${limit}); --limit unpackedBytes=N lifts it`,
      );
    }
    throw new NotText(
      code === 'Z_BUF_ERROR'
        ? 'is compressed (gzip) and cut off: copy it again'
        : 'looks compressed (gzip), but is damaged: copy it again',
    );
  }
}
