/** Copies that one drawing may make: a kilobyte of `use` in `use` could ask for billions. */
const MOST_COPIES = 100_000;
const MOST_COPIED_ELEMENTS = 1_000_000;
const MOST_COPIED_SEGMENTS = 5_000_000;
const MOST_COPIED_CHARACTERS = 100_000_000;
const DEEPEST = 256;

/** Counts what `use` makes and says when it is enough. */
export class CopyLimits {
  /** The limit asked about last. */
  limit = 0;
  private copies = 0;
  private elements = 0;
  private segments = 0;
  private characters = 0;

  allowsDepth(depth: number): boolean {
    this.limit = DEEPEST;
    return depth < DEEPEST;
  }

  allowsCopy(): boolean {
    this.limit = MOST_COPIES;
    return this.copies++ < MOST_COPIES;
  }

  /** Asked before each element inside a copy; `characters` is how much there is to read in it. */
  allowsElement(characters: number): boolean {
    this.elements++;
    this.characters += characters;
    const counts = [this.elements, this.segments, this.characters];
    const limits = [MOST_COPIED_ELEMENTS, MOST_COPIED_SEGMENTS, MOST_COPIED_CHARACTERS];
    const passed = limits.findIndex((limit, i) => counts[i]! > limit);
    if (passed >= 0) this.limit = limits[passed]!;
    return passed < 0;
  }

  addSegments(count: number): void {
    this.segments += count;
  }
}
