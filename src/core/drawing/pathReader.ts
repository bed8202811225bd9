import { PathCommands } from './pathCommands.js';
import { readPathByGrammar } from './pathGrammar.js';
import { readPathTokens } from './pathTokens.js';
import { TextCursor } from './textCursor.js';

/** Characters of a drawing's path data that go through the grammar, about 2 MB/s of it. */
const GRAMMAR_CHARACTERS = 200_000;

/** The packaged grammar takes `23.` for a number, as SVG 1.1 did. */
const TRAILING_POINT = /\.(?!\d)/;

/**
 * Reads path data by the packaged grammar while there is little of it, and by our own tokens for long
 * data and for data with an error, of which the grammar gives nothing. Both give the same commands.
 */
export class PathReader {
  readonly commands = new PathCommands();
  private readonly cursor = new TextCursor();
  private spent = 0;

  /** Fills `commands`; returns the offset of the first error, after which nothing is read, or -1. */
  read(data: string): number {
    if (data.trim() === 'none') {
      this.commands.clear();
      return -1;
    }
    if (this.spent + data.length <= GRAMMAR_CHARACTERS && !TRAILING_POINT.test(data)) {
      this.spent += data.length;
      if (readPathByGrammar(data, this.commands)) return -1;
    }
    return readPathTokens(data, this.cursor, this.commands);
  }
}
