/// <reference path="../vendor.d.ts" />
import type { SelectorNode } from 'css-tree/selector-parser';
import { unescaped } from './cssText.js';
import type { Combinator, NthTest } from './selector.js';

/** A selector that is wrong, or not among those read here. */
export class NotRead extends Error {}

const AT = { kind: 'nth', a: 0, b: 1, fromEnd: false, ofType: false, of: null } as const satisfies NthTest;

/** Places with names of their own (Selectors Level 4, §14). */
export const NTH_SHORT: ReadonlyMap<string, readonly NthTest[]> = new Map<string, readonly NthTest[]>([
  ['first-child', [AT]],
  ['last-child', [{ ...AT, fromEnd: true }]],
  ['only-child', [AT, { ...AT, fromEnd: true }]],
  ['first-of-type', [{ ...AT, ofType: true }]],
  ['last-of-type', [{ ...AT, ofType: true, fromEnd: true }]],
  [
    'only-of-type',
    [
      { ...AT, ofType: true },
      { ...AT, ofType: true, fromEnd: true },
    ],
  ],
]);

/** A node's children; none where it cannot have any. */
export function childrenOf(node: SelectorNode): SelectorNode[] {
  return node.children?.toArray() ?? [];
}

/** The selectors in a functional pseudo-class, one or a list. */
export function selectorsIn(argument: SelectorNode | undefined): SelectorNode[] {
  if (!argument) return [];
  return argument.type === 'SelectorList' ? childrenOf(argument) : [argument];
}

/** Throws NotRead for combinators that are not read here. */
export function combinatorOf(node: SelectorNode): Combinator {
  const name = String(node.name);
  if (name === ' ' || name === '>' || name === '+' || name === '~') return name;
  throw new NotRead();
}

/** The string or name that a node stands for, escapes read. */
export function textIn(node: SelectorNode | string | null): string {
  if (node === null || typeof node === 'string') return node ?? '';
  return node.type === 'String' ? String(node.value) : unescaped(String(node.name));
}

/** Whether `&` stands anywhere in a selector. */
export function mentionsNesting(node: SelectorNode): boolean {
  return (
    node.type === 'NestingSelector' ||
    childrenOf(node).some(mentionsNesting) ||
    (node.type === 'Nth' && node.selector !== null && mentionsNesting(node.selector))
  );
}
