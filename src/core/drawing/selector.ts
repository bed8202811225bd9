/** What one compound selector is held against. */
export interface Subject {
  readonly name: string;
  readonly id: string | null;
  readonly classes: ReadonlySet<string>;
}

/** A type, ids and classes that must all hold for one element. */
interface Compound {
  readonly name: string | null;
  readonly ids: readonly string[];
  readonly classes: readonly string[];
}

/** Compounds from right to left; `isChild[i]` where compound i must be a child of compound i + 1. */
export interface Selector {
  readonly compounds: readonly Compound[];
  readonly isChild: readonly boolean[];
  /** Ids, classes and types, weighed so that they compare as Selectors Level 3, §9, has it. */
  readonly specificity: number;
}

/** More compounds than this are not read: real ones have up to five. */
const MOST_COMPOUNDS = 12;
const COMPOUND = /^(\*|[A-Za-z_][\w-]*)?((?:[.#][\w\u0080-\uffff-]+)*)$/;

/**
 * A selector made of types, classes and ids, and of the descendant and child combinators (Selectors
 * Level 3, §8.1, §8.2); null for any other.
 */
export function readSelector(text: string): Selector | null {
  const words = text.replace(/>/g, ' > ').trim().split(/\s+/).reverse();
  const compounds: Compound[] = [];
  const isChild: boolean[] = [];
  let specificity = 0;
  let child = false;
  for (const word of words) {
    if (word === '>') {
      if (child || compounds.length === 0) return null;
      child = true;
      continue;
    }
    const match = COMPOUND.exec(word);
    if (!match || word === '' || compounds.length === MOST_COMPOUNDS) return null;
    if (compounds.length > 0) isChild.push(child);
    child = false;
    const parts = match[2].match(/[.#][^.#]+/g) ?? [];
    const ids = parts.filter((p) => p.startsWith('#')).map((p) => p.slice(1));
    const classes = parts.filter((p) => p.startsWith('.')).map((p) => p.slice(1));
    const name = match[1] === undefined || match[1] === '*' ? null : match[1];
    compounds.push({ name, ids, classes });
    specificity += ids.length * 1_000_000 + classes.length * 1000 + (name === null ? 0 : 1);
  }
  return child ? null : { compounds, isChild, specificity };
}

/**
 * Whether the selector matches `path[0]`, whose ancestors follow it in `path`. `step` is called for each
 * comparison and ends the search by returning false.
 */
export function matches(selector: Selector, path: readonly Subject[], step: () => boolean): boolean {
  return matchesFrom(selector, 0, path, 0, step);
}

function matchesFrom(
  selector: Selector,
  compound: number,
  path: readonly Subject[],
  at: number,
  step: () => boolean,
): boolean {
  if (!step() || !holds(selector.compounds[compound], path[at])) return false;
  if (compound + 1 === selector.compounds.length) return true;
  const last = selector.isChild[compound] ? Math.min(at + 1, path.length - 1) : path.length - 1;
  for (let up = at + 1; up <= last; up++) {
    if (matchesFrom(selector, compound + 1, path, up, step)) return true;
  }
  return false;
}

function holds(compound: Compound, subject: Subject): boolean {
  return (
    (compound.name === null || compound.name === subject.name) &&
    compound.ids.every((id) => id === subject.id) &&
    compound.classes.every((name) => subject.classes.has(name))
  );
}
