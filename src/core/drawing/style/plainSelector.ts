import { CLASS_WEIGHT, ID_WEIGHT, type Selector, type Test, TYPE_WEIGHT } from './selector.js';

const PLAIN = /^(?:([a-z][\w-]*)|\.([a-z_][\w-]*)|#([a-z_][\w-]*))$/i;

/** What most selectors of drawings are, one type, class or id, without the trouble of parsing. */
export function readPlainSelector(text: string): Selector | null {
  const match = PLAIN.exec(text);
  if (!match) return null;
  const [, type, name, id] = match;
  const [test, specificity]: [Test, number] = type
    ? [{ kind: 'type', name: type }, TYPE_WEIGHT]
    : name
      ? [{ kind: 'class', name }, CLASS_WEIGHT]
      : [{ kind: 'id', id }, ID_WEIGHT];
  return { compounds: [[test]], combinators: [], specificity };
}
