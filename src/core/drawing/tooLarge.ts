import { Unreadable } from './findingLog.js';

/**
 * Does work that throws RangeError only where the engine cannot make a string or array so long; this then
 * leaves the reading as a text that is too large.
 */
export function orTooLarge<T>(work: () => T): T {
  try {
    return work();
  } catch (error) {
    if (error instanceof RangeError) throw new Unreadable('too-large', null);
    throw error;
  }
}
