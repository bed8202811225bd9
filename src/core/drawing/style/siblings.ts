import type { SvgElement } from '../markup/svgTree.js';

/** The places of elements among their siblings, found when first asked for; O(children) once a parent. */
export class Siblings {
  private readonly elements = new Map<SvgElement, readonly SvgElement[]>();
  private readonly indices: Uint32Array;
  /** How many of a family have each name, and the place of each element among them, from 1. */
  private readonly counts = new Map<SvgElement, ReadonlyMap<string, number>>();
  private readonly placesOfType: Uint32Array;

  constructor(elementCount: number) {
    this.indices = new Uint32Array(elementCount);
    this.placesOfType = new Uint32Array(elementCount);
  }

  /** The children of a parent that are elements, those of other namespaces too. */
  in(parent: SvgElement): readonly SvgElement[] {
    let list = this.elements.get(parent);
    if (!list) {
      list = parent.children.filter((child): child is SvgElement => typeof child !== 'string');
      list.forEach((child, i) => {
        this.indices[child.number] = i;
      });
      this.elements.set(parent, list);
    }
    return list;
  }

  /** Its place in `in(parent)`, from 0. */
  indexOf(element: SvgElement, parent: SvgElement): number {
    this.in(parent);
    return this.indices[element.number];
  }

  /** Its place among its siblings of the same name and namespace, from 1. */
  placeOfType(element: SvgElement, parent: SvgElement, fromEnd: boolean): number {
    let counts = this.counts.get(parent);
    if (!counts) {
      const counted = new Map<string, number>();
      for (const child of this.in(parent)) {
        const place = (counted.get(typeOf(child)) ?? 0) + 1;
        counted.set(typeOf(child), place);
        this.placesOfType[child.number] = place;
      }
      counts = counted;
      this.counts.set(parent, counts);
    }
    const place = this.placesOfType[element.number];
    return fromEnd ? (counts.get(typeOf(element)) ?? 0) + 1 - place : place;
  }
}

function typeOf(element: SvgElement): string {
  return element.isSvg ? element.name : `:${element.name}`;
}
