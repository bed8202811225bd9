import { describe, expect, test } from 'vitest';
import { FindingLog } from '../../../../src/core/drawing/findingLog.ts';
import { LineIndex } from '../../../../src/core/drawing/markup/lineIndex.ts';
import { readTree, type SvgElement } from '../../../../src/core/drawing/markup/svgTree.ts';
import { DEFAULT_LIMITS } from '../../../../src/core/drawing/readingLimits.ts';
import { readSelectorList } from '../../../../src/core/drawing/style/readSelector.ts';
import { SelectorMatcher } from '../../../../src/core/drawing/style/selectorMatcher.ts';

const NO_SCOPE = { namespaces: new Map<string, string>(), nesting: null };
const TEXT = `<svg xmlns="http://www.w3.org/2000/svg" id="o">
  <g id="a" class="k"><rect id="b"/><circle id="c" class="x y"/><rect id="d" class="x"/></g>
  <g id="e" xml:lang="de-AT"><a id="f" href="#q"><path id="g" data-v="one two"/></a><path id="h" data-v="ONE"/></g>
</svg>`;

function idsOf(selector: string): string {
  const tree = readTree(TEXT, new LineIndex(TEXT), new FindingLog(), DEFAULT_LIMITS);
  const matcher = new SelectorMatcher(tree);
  const list = readSelectorList(selector, NO_SCOPE) ?? [];
  const ids: string[] = [];
  const visit = (element: SvgElement): void => {
    if (list.some((s) => matcher.matches(s, element, null))) ids.push(tree.attributeOf(element, 'id') ?? '');
    for (const child of element.children) if (typeof child !== 'string') visit(child);
  };
  visit(tree.root);
  return ids.join('');
}

// Selectors Level 4.
describe('which elements a selector matches', () => {
  test.each([
    ['*', 'oabcdefgh'],
    ['rect', 'bd'],
    ['.x', 'cd'],
    ['.x.y', 'c'],
    ['#c, #h', 'ch'],
    ['g > rect', 'bd'],
    ['svg path', 'gh'],
    ['rect + circle', 'c'],
    ['rect ~ .x', 'cd'],
    ['g + g path', 'gh'],
    ['[data-v]', 'gh'],
    ['[data-v~=two]', 'g'],
    ['[data-v="one" i]', 'h'],
    ['[data-v^=one]', 'g'],
    [':root', 'o'],
    ['rect:first-child', 'b'],
    ['rect:last-of-type', 'd'],
    [':nth-child(2n)', 'ceh'],
    [':nth-child(1 of .x)', 'c'],
    [':nth-last-child(1)', 'odegh'],
    ['g *:not(.x, path)', 'bf'],
    [':is(#b, .y)', 'bc'],
    ['g:has(> circle)', 'a'],
    ['rect:has(+ circle)', 'b'],
    [':link', 'f'],
    [':lang(de)', 'efgh'],
    ['g:empty, rect:empty', 'bd'],
    ['path:hover, path::before', ''],
  ])('%s', (selector, ids) => {
    expect(idsOf(selector)).toBe(ids);
  });
});

describe('selectors that are not read', () => {
  test.each([
    ...[
      '',
      ' ',
      '.',
      '#1',
      'a >',
      '> a',
      'a > > b',
      'a,',
      ',a',
      'a:nope',
      'a::nope',
      '[a',
      '[a=]',
      'a||b',
      'q|a',
    ],
    ...[':not()', ':nth-child(x)', ':nth-child(2x)', ':is(a', 'a{', '.1a', ':has()', 'a '.repeat(2000)],
  ])('%j', (text) => {
    expect(readSelectorList(text, NO_SCOPE)).toBeNull();
  });
});

describe('specificity', () => {
  const of = (text: string): number | undefined => readSelectorList(text, NO_SCOPE)?.[0].specificity;

  // Selectors Level 4, §17, its examples.
  test.each([
    ['*', 0],
    ['LI', 1],
    ['UL LI', 2],
    ['H1 + *[REL=up]', 1001],
    ['UL OL LI.red', 1003],
    ['LI.red.level', 2001],
    ['#x34y', 1_000_000],
    ['#s12:not(FOO)', 1_000_001],
    ['.foo :is(.bar, #baz)', 1_001_000],
    [':is(em, #foo)', 1_000_000],
    ['.qux:where(em, #foo#bar#baz)', 1000],
    [':nth-child(even of li, .item)', 2000],
    [':not(em, strong#foo)', 1_000_001],
  ])('%s', (text, expected) => {
    expect(of(text)).toBe(expected);
  });
});
