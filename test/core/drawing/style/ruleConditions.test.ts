import { describe, expect, test } from 'vitest';
import { mediaHolds, supportHolds } from '../../../../src/core/drawing/style/ruleConditions.ts';

// Media Queries Level 4, §3; null where it depends on a window.
describe('media', () => {
  test.each([
    ['', true],
    ['all', true],
    ['SCREEN', true],
    ['print', false],
    ['not print', true],
    ['only screen', true],
    ['print, screen', true],
    ['not screen', false],
    ['(prefers-color-scheme: light)', true],
    ['(prefers-color-scheme: dark)', false],
    ['screen and (prefers-color-scheme: dark)', false],
    ['screen and (not (prefers-color-scheme: dark))', true],
    ['(prefers-color-scheme: dark) or (hover)', true],
    ['(prefers-color-scheme: light) and (hover: none)', false],
    ['not (prefers-color-scheme: dark)', true],
    ['((hover))', true],
    ['(prefers-reduced-motion)', false],
    ['(min-width: 100px)', null],
    ['(width > 100px)', null],
    ['print and (min-width: 100px)', false],
    ['screen, (min-width: 100px)', true],
    ['(min-width: 100px) and (prefers-color-scheme: dark)', false],
    ['(hover) and (hover) or (hover)', null],
    ['((', null],
    [`${'('.repeat(50)}hover${')'.repeat(50)}`, null],
  ])('%s', (text, expected) => {
    expect(mediaHolds(text)).toBe(expected);
  });
});

// CSS Conditional Rules Module Level 3, §6.
describe('supports', () => {
  const declared = (name: string, value: string): boolean | null => (name === 'x' ? value === '1px' : null);
  test.each([
    ['(x: 1px)', true],
    ['(x: no)', false],
    ['not (x: no)', true],
    ['(x: 1px) and (x: no)', false],
    ['(x: 1px) or (other: y)', true],
    ['(other: y)', null],
    ['((x: 1px) and (not (x: no)))', true],
    ['selector(a > b)', true],
    ['selector(nope)', false],
    ['font-tech(color-COLRv1)', null],
  ])('%s', (text, expected) => {
    expect(supportHolds(text, declared, (selector) => selector !== 'nope')).toBe(expected);
  });
});
