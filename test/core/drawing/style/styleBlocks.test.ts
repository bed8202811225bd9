import { describe, expect, test } from 'vitest';
import { readStyleBlocks, type StyleItem } from '../../../../src/core/drawing/style/styleBlocks.ts';

function shown(items: readonly StyleItem[]): string {
  return items
    .map((item) => {
      if (item.kind === 'declaration') return item.text;
      const inside = item.items === null ? ';' : `{${shown(item.items)}}`;
      return `${item.kind === 'at-rule' ? `@${item.name} ` : ''}${item.prelude}${inside}`;
    })
    .join('|');
}
const blocks = (text: string, tooDeep: number[] = []): string =>
  shown(readStyleBlocks(text, (at) => tooDeep.push(at)));

// CSS Syntax Module Level 3, §5.4, "Parser Algorithms".
describe('the frame of a sheet', () => {
  test.each([
    ['a{x:y}', 'a{x:y}'],
    [' a , b { x : y ; z : w } ', 'a , b{x : y|z : w}'],
    ['a{x:y;.b{c:d}e:f}', 'a{x:y|.b{c:d}|e:f}'],
    ['a{b:hover{c:d}}', 'a{b:hover{c:d}}'],
    ['a{--x:{b:c};d:e}', 'a{--x:{b:c}|d:e}'],
    ['@media x{a{b:c}}', '@media x{a{b:c}}'],
    ['@import "a;b";@charset "x";c{}', '@import "a;b";|@charset "x";|c{}'],
    ['a{@media x{b:c;d{e:f}}}', 'a{@media x{b:c|d{e:f}}}'],
    ['a{b:url(c;d}e)}', 'a{b:url(c;d}e)}'],
    ['a{b:"}"}', 'a{b:"}"}'],
    ['a[b="{"]{c:d}', 'a[b="{"]{c:d}'],
    ['/* a{ */b{c:d}', 'b{c:d}'],
    ['<!-- a{b:c} --> d{}', 'a{b:c}|d{}'],
    ['a{b:c}}d{e:f}', 'a{b:c}|}d{e:f}'],
    ['a{b:c', 'a{b:c}'],
    ['a{b:c;d{e:f', 'a{b:c|d{e:f}}'],
    ['a', ''],
    ['', ''],
    ['a{;;b:c;;}', 'a{b:c}'],
  ])('%s', (text, expected) => {
    expect(blocks(text)).toBe(expected);
  });

  test('blocks too deep are passed over, and what follows is read', () => {
    const places: number[] = [];
    const text = `${'a{'.repeat(40)}x:y${'}'.repeat(40)}b{c:d}`;
    expect(blocks(text, places).endsWith('|b{c:d}')).toBe(true);
    expect(places).toEqual([65]);
  });
});
