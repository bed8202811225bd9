import { createHash } from 'node:crypto';
import { expect, test } from 'vitest';
import { SEGMENT_SIZE, SegmentBuilder } from '../../../src/core/geometry/segments.ts';

/** A builder with n segments, all kinds in turn, each with numbers of its own. */
function built(n: number): SegmentBuilder {
  const builder = new SegmentBuilder();
  for (let i = 0; i < n; i++) {
    const v = 100 * i;
    if (i % 3 === 0) builder.line(v, v + 1, v + 2, v + 3);
    else if (i % 3 === 1) builder.cubic(v, v + 1, v + 4, v + 5, v + 6, v + 7, v + 2, v + 3);
    else builder.arc(v, v + 1, v + 2, v + 3, v + 4, v + 5, v + 6, v + 7, v + 8, v + 9, v + 10, v + 11);
  }
  return builder;
}

/** What tells long columns apart in little time. */
function bytesOf(column: Float64Array | Uint32Array): string {
  return createHash('sha256').update(column).digest('hex');
}

// Above some 16,000 segments the columns are kept in chunks.
test.each([0, 1, 100, 16_385, 100_000])('%i segments come out as they went in', (n) => {
  const { count, kind, offset, data } = built(n).finish();
  expect([count, kind.length, offset.length]).toEqual([n, n, n]);
  let at = 0;
  for (let i = 0; i < n; i++) {
    const size = SEGMENT_SIZE[i % 3];
    if (kind[i] !== i % 3 || offset[i] !== at) throw new Error(`segment ${i} stands elsewhere`);
    for (let k = 0; k < size; k++) if (data[at + k] !== 100 * i + k) throw new Error(`number ${k} of ${i}`);
    at += size;
  }
  expect(data).toHaveLength(at);
});

test('a builder goes on after it was asked', () => {
  const builder = built(50_000);
  const before = builder.finish();
  builder.line(1, 2, 3, 4);
  const after = builder.finish();
  expect(before.count).toBe(50_000);
  expect(after.count).toBe(50_001);
  expect([...after.data.slice(-4)]).toEqual([1, 2, 3, 4]);
  expect(bytesOf(after.data.slice(0, -4))).toBe(bytesOf(before.data));
});

test('what is appended is the same, also a part of it', () => {
  const source = built(60_000).finish();
  const whole = new SegmentBuilder();
  whole.append(source);
  const copy = whole.finish();
  expect(bytesOf(copy.data)).toBe(bytesOf(source.data));
  expect(bytesOf(copy.offset)).toBe(bytesOf(source.offset));
  const part = new SegmentBuilder();
  part.append(source, 3, 7);
  expect([...part.finish().kind]).toEqual([0, 1, 2, 0]);
  expect(part.finish().data[0]).toBe(300);
});
