/**
 * What one reading may ask of the machine. Ordinary drawings stay far below; what goes past a limit is
 * refused or left out, with the limit's name and value in the finding.
 */
export interface ReadingLimits {
  /** Bytes that a compressed file may unpack to. */
  readonly unpackedBytes: number;
  /** Elements in one another. */
  readonly depth: number;
  /** Elements in the document, those that entities bring included. */
  readonly elements: number;
  /** Characters of one attribute's value. */
  readonly attributeCharacters: number;
  /** Characters that entities and default attributes may add to the document. */
  readonly entityCharacters: number;
  /** Characters that are kept of the title and of the description. */
  readonly textCharacters: number;
  /** Lines, curves and arcs. */
  readonly segments: number;
  /** Dashes cut from dashed lines. */
  readonly dashes: number;
  /** `use` in what `use` copies. */
  readonly copyDepth: number;
  /** Copies that `use` makes. */
  readonly copies: number;
  /** Elements in those copies, the same for their segments and for the characters of their attributes. */
  readonly copiedElements: number;
  readonly copiedSegments: number;
  readonly copiedCharacters: number;
  /** Comparisons of style rules with elements, beside fifty for each element. */
  readonly styleComparisons: number;
  /** Characters of style sheets; those that go past it are left aside whole. */
  readonly styleCharacters: number;
}

/** Far above what drawings have, and within two gigabytes of memory. */
export const DEFAULT_LIMITS: ReadingLimits = {
  unpackedBytes: 500_000_000,
  depth: 1024,
  elements: 5_000_000,
  attributeCharacters: 128_000_000,
  entityCharacters: 4_000_000,
  textCharacters: 100_000,
  segments: 20_000_000,
  dashes: 2_000_000,
  copyDepth: 256,
  copies: 100_000,
  copiedElements: 1_000_000,
  copiedSegments: 5_000_000,
  copiedCharacters: 100_000_000,
  styleComparisons: 20_000_000,
  styleCharacters: 8_000_000,
};

/** The name of a limit, as findings and `--limit` have it. */
export type LimitName = keyof ReadingLimits;

/** The defaults where nothing is asked. Throws RangeError where a limit is not a number of at least 0. */
export function limitsFrom(asked: Partial<ReadingLimits>): ReadingLimits {
  const limits: Record<LimitName, number> = { ...DEFAULT_LIMITS };
  for (const name of LIMIT_NAMES) {
    const value = asked[name] ?? limits[name];
    if (!(value >= 0)) throw new RangeError(`the limit ${name} must be a number of at least 0, not ${value}`);
    limits[name] = value;
  }
  return limits;
}

/** The names of all limits. */
export const LIMIT_NAMES = Object.keys(DEFAULT_LIMITS) as LimitName[];
