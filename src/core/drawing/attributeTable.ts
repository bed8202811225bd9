import { Column } from './column.js';

const DECODED = 0xffffffff;

/**
 * The attributes of all elements as columns: a name's number and where its value stands in the text.
 * Values become strings only when asked for, so a drawing with millions of them fits, and names are
 * numbers, so none can collide with a prototype's.
 */
export class AttributeTable {
  readonly names: string[] = [];
  private readonly numberOfName = new Map<string, number>();
  /** Attributes of element e: from first[e] up to first[e + 1], or to the last. */
  private readonly first = new Column();
  private readonly name = new Column();
  private readonly from = new Column();
  private readonly to = new Column();
  private readonly decoded: string[] = [];

  constructor(private readonly text: string) {}

  /** What follows belongs to the next element; returns its number, from 0. */
  beginElement(): number {
    return this.first.push(this.name.length);
  }

  /** A value as it stands in the text from `from` to `to`. */
  add(name: number, from: number, to: number): void {
    this.name.push(name);
    this.from.push(from);
    this.to.push(to);
  }

  /** A value that differs from the text, because it had references. */
  addDecoded(name: number, value: string): void {
    this.add(name, this.decoded.push(value) - 1, DECODED);
  }

  numberOf(name: string): number {
    let number = this.numberOfName.get(name);
    if (number === undefined) {
      number = this.names.push(name) - 1;
      this.numberOfName.set(name, number);
    }
    return number;
  }

  begin(element: number): number {
    return this.first.values[element]!;
  }

  end(element: number): number {
    return element + 1 < this.first.length ? this.first.values[element + 1]! : this.name.length;
  }

  nameAt(i: number): string {
    return this.names[this.name.values[i]!]!;
  }

  nameNumberAt(i: number): number {
    return this.name.values[i]!;
  }

  valueAt(i: number): string {
    const from = this.from.values[i]!;
    const to = this.to.values[i]!;
    return to === DECODED ? this.decoded[from]! : this.text.slice(from, to);
  }

  /** The value of an element's attribute, or null. O(attributes of the element). */
  get(element: number, name: string): string | null {
    const number = this.numberOfName.get(name);
    if (number === undefined) return null;
    const end = this.end(element);
    for (let i = this.begin(element); i < end; i++) {
      if (this.name.values[i] === number) return this.valueAt(i);
    }
    return null;
  }
}
