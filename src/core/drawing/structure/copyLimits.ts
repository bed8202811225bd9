import type { LimitName, ReadingLimits } from '../readingLimits.js';

/** Counts what `use` makes and says when it is enough: a kilobyte of `use` in `use` could ask for billions. */
export class CopyLimits {
  private copies = 0;
  private elements = 0;
  private segments = 0;
  private characters = 0;

  constructor(private readonly limits: ReadingLimits) {}

  /** Each of these asks for one more and names the limit that stands against it, or null. */
  passedByDepth(depth: number): LimitName | null {
    return depth < this.limits.copyDepth ? null : 'copyDepth';
  }

  passedByCopy(): LimitName | null {
    return this.copies++ < this.limits.copies ? null : 'copies';
  }

  /** Asked before each element inside a copy; `characters` is how much there is to read in it. */
  passedByElement(characters: number): LimitName | null {
    const { limits } = this;
    this.elements++;
    this.characters += characters;
    if (this.elements > limits.copiedElements) return 'copiedElements';
    if (this.segments > limits.copiedSegments) return 'copiedSegments';
    return this.characters > limits.copiedCharacters ? 'copiedCharacters' : null;
  }

  addSegments(count: number): void {
    this.segments += count;
  }
}
