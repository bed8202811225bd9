import { Unreadable } from '../findingLog.js';
import type { Decoded } from './entities.js';
import type { MarkupLexer } from './markupLexer.js';

/** Says which references meant nothing; they stand at `offset`. */
export function reportReferences(
  lexer: MarkupLexer,
  value: Pick<Decoded, 'unknown' | 'external'>,
  offset: number,
): void {
  const place = () => lexer.placeAt(offset);
  if (value.unknown !== null) lexer.log.add('unknown-entity', place, { entity: value.unknown });
  if (value.external !== null) lexer.log.add('external-entity', place, { entity: `&${value.external};` });
}

/** Does what may throw Unreadable without a place: what entities refuse has the place of the reference. */
export function withPlace<T>(lexer: MarkupLexer, offset: number, work: () => T): T {
  try {
    return work();
  } catch (error) {
    if (!(error instanceof Unreadable)) throw error;
    throw new Unreadable(error.code, error.place ?? lexer.placeAt(offset), error.values);
  }
}
