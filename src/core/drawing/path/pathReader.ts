import type { PathSink } from '../stroke/subPathSink.js';
import { PathCommands } from './pathCommands.js';
import { readPathByGrammar } from './pathGrammar.js';
import { PathTokens, readPathTokens } from './pathTokens.js';
import { TextCursor } from './textCursor.js';
import { PathTracer, tracePath } from './tracePath.js';

/** Characters of a drawing's path data that go through the grammar, about 2 MB/s of it. */
const GRAMMAR_CHARACTERS = 200_000;
/** The packaged grammar takes `23.` for a number, as SVG 1.1 did. */
const TRAILING_POINT = /\.(?!\d)/;

/** Commands that are read before they are drawn. */
const AT_ONCE = 16_384;

/**
 * Reads path data by the packaged grammar while there is little of it, and by our own tokens for long
 * data and for data with an error, of which the grammar gives nothing. Both give the same commands.
 */
export class PathReader {
  readonly commands = new PathCommands();
  private readonly cursor = new TextCursor();
  private readonly tokens = new PathTokens(this.cursor, this.commands);
  private spent = 0;

  /** Fills `commands`; returns the offset of the first error, after which nothing is read, or -1. */
  read(data: string): number {
    return this.readShort(data) ? -1 : readPathTokens(data, this.cursor, this.commands);
  }

  /** Draws the path, also where it is too long to be read first; returns as `read` does. */
  draw(data: string, sink: PathSink): number {
    if (this.readShort(data)) {
      tracePath(this.commands, sink);
      return -1;
    }
    const { tokens } = this;
    const tracer = new PathTracer(sink);
    tokens.begin(data);
    while (tokens.next(AT_ONCE)) tracer.draw(this.commands);
    return tokens.error;
  }

  /** Whether the data is `none`, or short enough and right by the grammar. */
  private readShort(data: string): boolean {
    if (data.length < 100 && data.trim() === 'none') {
      this.commands.clear();
      return true;
    }
    if (this.spent + data.length > GRAMMAR_CHARACTERS || TRAILING_POINT.test(data)) return false;
    this.spent += data.length;
    return readPathByGrammar(data, this.commands);
  }
}
