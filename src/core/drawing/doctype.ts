import type { Entities } from './entities.js';

/**
 * Passes over a document type declaration that starts at `start` (`<!DOCTYPE`), taking its internal
 * general entities. External subsets and parameter entities are not followed: nothing is ever fetched.
 *
 * @returns the offset after its `>`, or -1 where the text ends inside it.
 */
export function skipDoctype(text: string, start: number, entities: Entities): number {
  let at = start + 9;
  let inSubset = false;
  while (at < text.length) {
    const c = text[at];
    if (c === '"' || c === "'") {
      const end = text.indexOf(c, at + 1);
      if (end < 0) return -1;
      at = end + 1;
    } else if (c === '<' && inSubset) {
      const end = skipDeclaration(text, at, entities);
      if (end < 0) return -1;
      at = end;
    } else if (c === '>' && !inSubset) {
      return at + 1;
    } else {
      if (c === '[') inSubset = true;
      else if (c === ']') inSubset = false;
      at++;
    }
  }
  return -1;
}

const ENTITY = /<!ENTITY\s+([^\s%"'<>]+)\s+(?:"([^"]*)"|'([^']*)')\s*>/y;

/** Passes over one markup declaration, comment or processing instruction of the internal subset. */
function skipDeclaration(text: string, start: number, entities: Entities): number {
  if (text.startsWith('<!--', start)) return after(text, '-->', start + 4);
  if (text.startsWith('<?', start)) return after(text, '?>', start + 2);
  ENTITY.lastIndex = start;
  const match = ENTITY.exec(text);
  if (match) {
    entities.declare(match[1], match[2] ?? match[3] ?? '');
    return ENTITY.lastIndex;
  }
  for (let at = start + 1; at < text.length; at++) {
    const c = text[at];
    if (c === '>') return at + 1;
    if (c === '"' || c === "'") {
      at = text.indexOf(c, at + 1);
      if (at < 0) return -1;
    }
  }
  return -1;
}

function after(text: string, mark: string, from: number): number {
  const at = text.indexOf(mark, from);
  return at < 0 ? -1 : at + mark.length;
}
