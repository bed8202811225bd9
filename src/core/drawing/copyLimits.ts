/** Copies that one drawing may make: a kilobyte of `use` in `use` could ask for billions. */
const MOST_COPIES = 100_000;
const MOST_COPIED_ELEMENTS = 1_000_000;
const MOST_COPIED_SEGMENTS = 5_000_000;
const MOST_COPIED_CHARACTERS = 100_000_000;
const DEEPEST = 256;

/** Counts what `use` makes and says when it is enough. */
export class CopyLimits {
  /** The limit asked about last, and what it is a number of. */
  limit = 0;
  of: 'levels' | 'copies' | 'elements' | 'segments' | 'characters' = 'copies';
  private copies = 0;
  private elements = 0;
  private segments = 0;
  private characters = 0;

  allowsDepth(depth: number): boolean {
    this.limit = DEEPEST;
    this.of = 'levels';
    return depth < DEEPEST;
  }

  allowsCopy(): boolean {
    this.limit = MOST_COPIES;
    this.of = 'copies';
    return this.copies++ < MOST_COPIES;
  }

  /** Asked before each element inside a copy; `characters` is how much there is to read in it. */
  allowsElement(characters: number): boolean {
    this.elements++;
    this.characters += characters;
    if (this.elements > MOST_COPIED_ELEMENTS) return this.passed(MOST_COPIED_ELEMENTS, 'elements');
    if (this.segments > MOST_COPIED_SEGMENTS) return this.passed(MOST_COPIED_SEGMENTS, 'segments');
    return this.characters <= MOST_COPIED_CHARACTERS || this.passed(MOST_COPIED_CHARACTERS, 'characters');
  }

  private passed(limit: number, of: CopyLimits['of']): false {
    this.limit = limit;
    this.of = of;
    return false;
  }

  addSegments(count: number): void {
    this.segments += count;
  }
}
