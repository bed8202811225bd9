import { type Affine, IDENTITY, multiply } from '../../geometry/affine.js';
import { angleOrNumber } from '../style/angle.js';
import { argumentsOf, evaluate } from '../style/calc.js';
import { wordsOf } from '../style/cssText.js';
import { readLength, type WrittenLength } from '../style/length.js';
import {
  flattened,
  fromAffine,
  type Matrix4,
  multiply4,
  perspective4,
  rotation4,
  scaling4,
  translation4,
} from './matrix4.js';
import { tangent, turned } from './turn.js';

/** User units of a length along an axis, percentages of the reference box. */
export type LengthAlong = (length: WrittenLength, axis: 'x' | 'y' | 'z') => number;

/** The parts of an element's transform in CSS, as written; null where it has none. */
export interface WrittenTransform {
  readonly translate: string | null;
  readonly rotate: string | null;
  readonly scale: string | null;
  /** The list of functions. */
  readonly list: string | null;
}

const CALL = /^([a-z][a-z0-9]*)\((.*)\)$/is;
/** More functions or longer text than any list in earnest. */
const MOST_FUNCTIONS = 1000;
const LONGEST = 20_000;

/**
 * The map of CSS transforms (CSS Transforms Module Level 1 and 2): the functions in two dimensions exactly;
 * those in three flattened onto the page in the end. null where a part is not valid.
 */
export function cssTransform(written: WrittenTransform, along: LengthAlong): Affine | null {
  const product = new Product(along);
  const { translate, rotate, scale, list } = written;
  const isValid =
    (translate === null || product.translateProperty(translate)) &&
    (rotate === null || product.rotateProperty(rotate)) &&
    (scale === null || product.scaleProperty(scale)) &&
    (list === null || product.list(list));
  const map = isValid ? product.map() : null;
  return map?.every(Number.isFinite) ? map : null;
}

/** Whether a value of one of those properties is valid. */
export function isTransform(property: keyof WrittenTransform, value: string): boolean {
  const nothing: WrittenTransform = { translate: null, rotate: null, scale: null, list: null };
  return cssTransform({ ...nothing, [property]: value }, ({ value: v }) => v) !== null;
}

class Product {
  private flat: Affine = IDENTITY;
  /** Takes over from `flat` at the first function in three dimensions. */
  private deep: Matrix4 | null = null;

  constructor(private readonly along: LengthAlong) {}

  map(): Affine {
    return this.deep ? flattened(this.deep) : this.flat;
  }

  list(text: string): boolean {
    if (text.length > LONGEST) return false;
    const words = callsIn(text);
    if (words.length === 1 && words[0].toLowerCase() === 'none') return true;
    return (
      words.length > 0 &&
      words.length <= MOST_FUNCTIONS &&
      words.every((word) => {
        const call = CALL.exec(word);
        return call !== null && this.call(call[1].toLowerCase(), argumentsOf(call[2]));
      })
    );
  }

  translateProperty(text: string): boolean {
    if (text.toLowerCase() === 'none') return true;
    const words = wordsOf(text);
    return words.length <= 3 && this.call(words.length === 3 ? 'translate3d' : 'translate', words);
  }

  scaleProperty(text: string): boolean {
    if (text.toLowerCase() === 'none') return true;
    const words = wordsOf(text);
    return words.length <= 3 && this.call(words.length === 3 ? 'scale3d' : 'scale', words);
  }

  rotateProperty(text: string): boolean {
    if (text.toLowerCase() === 'none') return true;
    const words = wordsOf(text);
    if (words.length === 1) return this.call('rotate', words);
    const at = words.findIndex((word) => angle(word) !== null && number(word) === null);
    if (at !== 0 && at !== words.length - 1) return false;
    const axis = words.filter((_, i) => i !== at);
    if (axis.length === 1 && /^[xyz]$/i.test(axis[0]))
      return this.call(`rotate${axis[0].toLowerCase()}`, [words[at]]);
    return axis.length === 3 && this.call('rotate3d', [...axis, words[at]]);
  }

  private add(map: Affine): true {
    if (this.deep) this.deep = multiply4(this.deep, fromAffine(map));
    else this.flat = multiply(this.flat, map);
    return true;
  }

  private addDeep(matrix: Matrix4): true {
    this.deep = multiply4(this.deep ?? fromAffine(this.flat), matrix);
    return true;
  }

  /** Applies one function; false where its arguments are wrong. */
  private call(name: string, words: readonly string[]): boolean {
    const count = words.length;
    switch (name) {
      case 'matrix': {
        const n = numbers(words, 6);
        return n !== null && this.add([n[0], n[1], n[2], n[3], n[4], n[5]]);
      }
      case 'matrix3d': {
        const n = numbers(words, 16);
        return n !== null && this.addDeep(n);
      }
      case 'translate':
        return (count === 1 || count === 2) && this.translate(words[0], words[1] ?? '0', null);
      case 'translatex':
        return count === 1 && this.translate(words[0], '0', null);
      case 'translatey':
        return count === 1 && this.translate('0', words[0], null);
      case 'translatez':
        return count === 1 && this.translate('0', '0', words[0]);
      case 'translate3d':
        return count === 3 && this.translate(words[0], words[1], words[2]);
      case 'scale':
        return (count === 1 || count === 2) && this.scale(words[0], words[1] ?? words[0], null);
      case 'scalex':
        return count === 1 && this.scale(words[0], '1', null);
      case 'scaley':
        return count === 1 && this.scale('1', words[0], null);
      case 'scalez':
        return count === 1 && this.scale('1', '1', words[0]);
      case 'scale3d':
        return count === 3 && this.scale(words[0], words[1], words[2]);
      case 'rotate':
      case 'rotatez': {
        const a = count === 1 ? angle(words[0]) : null;
        return a !== null && this.add(turned(a));
      }
      case 'rotatex':
      case 'rotatey': {
        const a = count === 1 ? angle(words[0]) : null;
        return (
          a !== null && this.addDeep(rotation4(name === 'rotatex' ? 1 : 0, name === 'rotatey' ? 1 : 0, 0, a))
        );
      }
      case 'rotate3d': {
        const axis = count === 4 ? numbers(words.slice(0, 3), 3) : null;
        const a = count === 4 ? angle(words[3]) : null;
        return axis !== null && a !== null && this.addDeep(rotation4(axis[0], axis[1], axis[2], a));
      }
      case 'skew':
        return (count === 1 || count === 2) && this.skew(words[0], words[1] ?? '0');
      case 'skewx':
        return count === 1 && this.skew(words[0], '0');
      case 'skewy':
        return count === 1 && this.skew('0', words[0]);
      case 'perspective': {
        if (count !== 1) return false;
        if (words[0].toLowerCase() === 'none') return true;
        const distance = this.length(words[0], 'z');
        return distance !== null && distance >= 0 && this.addDeep(perspective4(distance));
      }
      default:
        return false;
    }
  }

  private translate(x: string, y: string, z: string | null): boolean {
    const dx = this.length(x, 'x');
    const dy = this.length(y, 'y');
    if (dx === null || dy === null) return false;
    if (z === null) return this.add([1, 0, 0, 1, dx, dy]);
    const dz = this.length(z, 'z');
    return dz !== null && this.addDeep(translation4(dx, dy, dz));
  }

  private scale(x: string, y: string, z: string | null): boolean {
    const sx = number(x, 100);
    const sy = number(y, 100);
    if (sx === null || sy === null) return false;
    if (z === null) return this.add([sx, 0, 0, sy, 0, 0]);
    const sz = number(z, 100);
    return sz !== null && this.addDeep(scaling4(sx, sy, sz));
  }

  private skew(x: string, y: string): boolean {
    const ax = angle(x);
    const ay = angle(y);
    return ax !== null && ay !== null && this.add([1, tangent(ay), tangent(ax), 1, 0, 0]);
  }

  private length(text: string, axis: 'x' | 'y' | 'z'): number | null {
    const length = readLength(text);
    if (!length || (length.unit === '' && length.value !== 0)) return null;
    if (axis === 'z' && length.unit === '%') return null;
    return this.along(length, axis);
  }
}

/** Calls one after the other, with or without space between them. */
function callsIn(text: string): string[] {
  return wordsOf(text).flatMap((word) => {
    const calls: string[] = [];
    let from = 0;
    let depth = 0;
    for (let at = 0; at < word.length; at++) {
      if (word[at] === '(') depth++;
      else if (word[at] === ')' && --depth === 0) {
        calls.push(word.slice(from, at + 1));
        from = at + 1;
      }
    }
    return from < word.length ? [...calls, word.slice(from)] : calls;
  });
}

/** A plain number; with `percent` also a percentage, over that. */
function number(text: string, percent: number | null = null): number | null {
  const value = evaluate(text, (v, unit) => {
    if (unit === '') return { kind: 'number', value: v };
    return unit === '%' && percent !== null ? { kind: 'number', value: v / percent } : null;
  });
  return value?.value ?? null;
}

function numbers(words: readonly string[], count: number): number[] | null {
  const list = words.map((word) => number(word));
  return list.length === count && list.every((v): v is number => v !== null) ? list : null;
}

/** Degrees; of numbers without a unit only 0 is an angle. */
function angle(text: string): number | null {
  const value = evaluate(text, angleOrNumber);
  return value && (value.kind === 'angle' || value.value === 0) ? value.value : null;
}
