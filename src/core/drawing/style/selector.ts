/** What a compound asks of one element. */
export type Test =
  | { readonly kind: 'type'; readonly name: string }
  | { readonly kind: 'namespace'; readonly isSvg: boolean }
  | { readonly kind: 'id'; readonly id: string }
  | { readonly kind: 'class'; readonly name: string }
  | AttributeTest
  | NthTest
  | { readonly kind: 'is'; readonly negated: boolean; readonly list: readonly Selector[] }
  /** Selectors whose leftmost compound is `anchor`, the element itself. */
  | { readonly kind: 'has'; readonly list: readonly Selector[]; readonly besides: boolean }
  | { readonly kind: 'lang'; readonly ranges: readonly string[] }
  | { readonly kind: 'anchor' | 'root' | 'empty' | 'link' | 'always' | 'never' };

/** `[name operator value]` (Selectors Level 4, §6). */
export interface AttributeTest {
  readonly kind: 'attribute';
  /** As in the document, prefix included; without one where `anyPrefix`. */
  readonly name: string;
  readonly anyPrefix: boolean;
  /** '' asks only whether it is there. */
  readonly operator: '' | '=' | '~=' | '|=' | '^=' | '$=' | '*=';
  readonly value: string;
  readonly ignoreCase: boolean;
}

/** Its place among its siblings, from 1, is a·n + b for some n from 0. */
export interface NthTest {
  readonly kind: 'nth';
  readonly a: number;
  readonly b: number;
  readonly fromEnd: boolean;
  readonly ofType: boolean;
  /** Only siblings that match one of these count; null counts all. */
  readonly of: readonly Selector[] | null;
}

export type Combinator = ' ' | '>' | '+' | '~';

/** Compounds from right to left; `combinators[i]` stands between compound i and i + 1. */
export interface Selector {
  readonly compounds: readonly (readonly Test[])[];
  readonly combinators: readonly Combinator[];
  /** Ids, classes and types, weighed so that they compare as Selectors Level 4, §15, has it. */
  readonly specificity: number;
}

export const ID_WEIGHT = 1_000_000;
export const CLASS_WEIGHT = 1000;
export const TYPE_WEIGHT = 1;

/** That of `:is()` and nested rules: the most specific of a list; 0 where it is empty. */
export function highestSpecificity(list: readonly Selector[]): number {
  let highest = 0;
  for (const { specificity } of list) highest = Math.max(highest, specificity);
  return highest;
}
