/** Copies that one drawing may make: a kilobyte of `use` in `use` could ask for billions. */
const MOST_COPIES = 100_000;
const MOST_COPIED_ELEMENTS = 1_000_000;
const MOST_COPIED_SEGMENTS = 5_000_000;
const DEEPEST = 256;

/** Counts what `use` makes and says when it is enough. */
export class CopyLimits {
  /** The limit asked about last. */
  limit = 0;
  private copies = 0;
  private elements = 0;
  private segments = 0;

  allowsDepth(depth: number): boolean {
    this.limit = DEEPEST;
    return depth < DEEPEST;
  }

  allowsCopy(): boolean {
    this.limit = MOST_COPIES;
    return this.copies++ < MOST_COPIES;
  }

  /** Asked before each element inside a copy. */
  allowsElement(): boolean {
    this.limit = this.segments >= MOST_COPIED_SEGMENTS ? MOST_COPIED_SEGMENTS : MOST_COPIED_ELEMENTS;
    return this.segments < MOST_COPIED_SEGMENTS && this.elements++ < MOST_COPIED_ELEMENTS;
  }

  addSegments(count: number): void {
    this.segments += count;
  }
}
