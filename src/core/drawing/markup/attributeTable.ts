import { Column } from '../column.js';
import { isQualifiedName } from './xmlCharacters.js';

/** Ordinary, `xmlns`, `xmlns:…`, and with any other prefix. */
export type NameKind = 0 | 1 | 2 | 3;

const DECODED = 0xffffffff;
const MANY = 32;

/**
 * The attributes of all elements as columns: a name's number and where its value stands in the text.
 * Values become strings only when asked for, so a drawing with millions of them fits, and names are
 * numbers, so none can collide with a prototype's.
 */
export class AttributeTable {
  readonly names: string[] = [];
  /** What stands before the colon of each name, null where there is none. */
  readonly prefixes: (string | null)[] = [];
  /** By name: 0 for an ordinary one, else one that has to do with namespaces. */
  readonly kinds: NameKind[] = [];
  private readonly numberOfName = new Map<string, number>();
  /** Attributes of element e: from first[e] up to first[e + 1], or to the last. */
  private readonly first = new Column();
  private readonly name = new Column();
  private readonly from = new Column();
  private readonly to = new Column();
  private readonly decoded: string[] = [];
  private readonly manyNames = new Set<number>();

  constructor(private readonly text: string) {}

  get elementCount(): number {
    return this.first.length;
  }

  /** What follows belongs to the next element; returns its number, from 0. */
  beginElement(): number {
    return this.first.push(this.name.length);
  }

  /** Whether the current element has an attribute of this name. A set serves a hostile tag of thousands. */
  isRepeated(name: number): boolean {
    const { manyNames } = this;
    const begin = this.begin(this.first.length - 1);
    const end = this.name.length;
    if (end - begin < MANY) {
      for (let i = begin; i < end; i++) if (this.name.values[i] === name) return true;
      return false;
    }
    if (end - begin === MANY) {
      manyNames.clear();
      for (let i = begin; i < end; i++) manyNames.add(this.name.values[i]);
    }
    const before = manyNames.size;
    return manyNames.add(name).size === before;
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

  /** Below 0 where it is no legal name. */
  numberOf(name: string): number {
    let number = this.numberOfName.get(name);
    if (number === undefined) {
      if (!isQualifiedName(name)) return -1;
      number = this.names.push(name) - 1;
      const colon = name.indexOf(':');
      const prefix = colon < 0 ? null : name.slice(0, colon);
      this.prefixes.push(prefix);
      this.kinds.push(name === 'xmlns' ? 1 : prefix === 'xmlns' ? 2 : prefix === null ? 0 : 3);
      this.numberOfName.set(name, number);
    }
    return number;
  }

  begin(element: number): number {
    return this.first.values[element];
  }

  end(element: number): number {
    return element + 1 < this.first.length ? this.first.values[element + 1] : this.name.length;
  }

  /** Characters of an element's values. */
  sizeOf(element: number): number {
    let size = 0;
    for (let i = this.begin(element), end = this.end(element); i < end; i++) {
      const from = this.from.values[i];
      const to = this.to.values[i];
      size += to === DECODED ? this.decoded[from].length : to - from;
    }
    return size;
  }

  nameAt(i: number): string {
    return this.names[this.name.values[i]];
  }

  nameNumberAt(i: number): number {
    return this.name.values[i];
  }

  valueAt(i: number): string {
    const from = this.from.values[i];
    const to = this.to.values[i];
    return to === DECODED ? this.decoded[from] : this.text.slice(from, to);
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
