/** What is said of one element: its attributes, and over them its style. */
export interface Specified extends ReadonlyMap<string, string> {
  /** Names of those that are values of CSS properties, from a sheet or a style attribute. */
  readonly styled: { readonly size: number; has(name: string): boolean };
}

interface Slot {
  value: string;
  /** The rounds of `clear` in which the name has a value, and one from style. */
  round: number;
  styledRound: number;
}

/**
 * A map that is cleared for every element of a drawing: names keep their slots, so that neither clearing
 * nor filling it again makes anything new (an engine's own map allocates its table anew).
 */
export class SpecifiedValues implements Specified {
  private readonly slots = new Map<string, Slot>();
  private round = 1;
  private count = 0;
  private styledCount = 0;
  readonly styled: Specified['styled'];

  constructor() {
    const values = this;
    this.styled = {
      get size() {
        return values.styledCount;
      },
      has: (name) => this.slots.get(name)?.styledRound === this.round,
    };
  }

  get size(): number {
    return this.count;
  }

  get(name: string): string | undefined {
    const slot = this.slots.get(name);
    return slot !== undefined && slot.round === this.round ? slot.value : undefined;
  }

  has(name: string): boolean {
    return this.slots.get(name)?.round === this.round;
  }

  set(name: string, value: string): void {
    this.fill(name, value);
  }

  setStyled(name: string, value: string): void {
    const slot = this.fill(name, value);
    if (slot.styledRound !== this.round) this.styledCount++;
    slot.styledRound = this.round;
  }

  private fill(name: string, value: string): Slot {
    let slot = this.slots.get(name);
    if (slot === undefined) {
      slot = { value, round: 0, styledRound: 0 };
      this.slots.set(name, slot);
    }
    if (slot.round !== this.round) this.count++;
    slot.round = this.round;
    slot.value = value;
    return slot;
  }

  /** The value is no longer one from style. */
  unstyle(name: string): void {
    const slot = this.slots.get(name);
    if (slot === undefined || slot.styledRound !== this.round) return;
    slot.styledRound = 0;
    this.styledCount--;
  }

  delete(name: string): void {
    const slot = this.slots.get(name);
    if (slot === undefined || slot.round !== this.round) return;
    slot.round = 0;
    this.count--;
  }

  clear(): void {
    this.round++;
    this.count = 0;
    this.styledCount = 0;
  }

  *entries(): MapIterator<[string, string]> {
    for (const [name, slot] of this.slots) if (slot.round === this.round) yield [name, slot.value];
  }

  [Symbol.iterator](): MapIterator<[string, string]> {
    return this.entries();
  }

  *keys(): MapIterator<string> {
    for (const [name] of this.entries()) yield name;
  }

  *values(): MapIterator<string> {
    for (const [, value] of this.entries()) yield value;
  }

  forEach(work: (value: string, name: string, map: ReadonlyMap<string, string>) => void): void {
    for (const [name, value] of this.entries()) work(value, name, this);
  }
}
