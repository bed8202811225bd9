import { expect, test } from 'vitest';
import { PathCommands } from '../../../../src/core/drawing/path/pathCommands.ts';
import { readPathByGrammar } from '../../../../src/core/drawing/path/pathGrammar.ts';
import { PathReader } from '../../../../src/core/drawing/path/pathReader.ts';
import { PathTokens, readPathTokens } from '../../../../src/core/drawing/path/pathTokens.ts';
import { TextCursor } from '../../../../src/core/drawing/path/textCursor.ts';
import { tracePath } from '../../../../src/core/drawing/path/tracePath.ts';
import type { PathSink } from '../../../../src/core/drawing/stroke/subPathSink.ts';
import { createRandom } from '../../../../src/core/structures/random.ts';
import { randomPath } from '../../../support/randomPaths.ts';

const cursor = new TextCursor();

function text(commands: PathCommands): string {
  return `${commands.codes.subarray(0, commands.count)} ${commands.numbers.subarray(0, commands.used)}`;
}

/**
 * Where the packaged grammar and SVG 2 as browsers read it part: `5.` is a number in SVG 1.1 only; form
 * feeds and signed radii are legal in SVG 2 only; a comma before a command is passed over by browsers; a
 * number beyond the range of a double ends the path for both of our readers.
 */
const GRAMMAR_REFUSES = /\f|[aA]|,\s*(?:[a-zA-Z]|$)/;
const GRAMMAR_ACCEPTS = /\.(?!\d)/;

test('the packaged grammar and our tokens agree on 20,000 random paths', () => {
  const random = createRandom(4);
  const grammar = new PathCommands();
  const tokens = new PathCommands();
  let legal = 0;
  for (let i = 0; i < 20_000; i++) {
    const hasSlip = i % 2 === 1;
    const data = randomPath(random, hasSlip);
    const accepted = readPathByGrammar(data, grammar);
    const error = readPathTokens(data, cursor, tokens);
    if (!hasSlip && !(accepted && error < 0)) expect.fail(`not legal to both: ${JSON.stringify(data)}`);
    if (accepted && error < 0) {
      legal++;
      if (text(grammar) !== text(tokens)) expect.fail(`different commands: ${JSON.stringify(data)}`);
    } else if (accepted && !GRAMMAR_ACCEPTS.test(data)) {
      expect.fail(`legal by the grammar only: ${JSON.stringify(data)}, we stop at ${error}`);
    } else if (!accepted && error < 0 && !GRAMMAR_REFUSES.test(data)) {
      expect.fail(`legal by our tokens only: ${JSON.stringify(data)}`);
    }
  }
  expect(legal).toBeGreaterThan(10_000);
});

test('commands read some at a time are those read at once', () => {
  const random = createRandom(5);
  const whole = new PathCommands();
  const part = new PathCommands();
  const tokens = new PathTokens(cursor, part);
  for (let i = 0; i < 2000; i++) {
    const data = randomPath(random, i % 2 === 1);
    const error = readPathTokens(data, cursor, whole);
    const codes: number[] = [];
    const numbers: number[] = [];
    tokens.begin(data);
    while (tokens.next(1 + (i % 3))) {
      codes.push(...part.codes.subarray(0, part.count));
      numbers.push(...part.numbers.subarray(0, part.used));
    }
    expect(tokens.error, data).toBe(error);
    expect(`${codes} ${numbers}`, data).toBe(text(whole));
  }
});

/** Writes down what it is told. */
function recorder(): { sink: PathSink; told: string[] } {
  const told: string[] = [];
  const sink: PathSink = {
    moveTo: (...n) => told.push(`M${n}`),
    lineTo: (...n) => told.push(`L${n}`),
    cubicTo: (...n) => told.push(`C${n}`),
    arcTo: (arc, ...n) => told.push(`A${Object.values(arc)} ${n}`),
    closePath: (rounding) => told.push(`Z${rounding}`),
  };
  return { sink, told };
}

test('a path too long to be read first is drawn the same', () => {
  const random = createRandom(6);
  let data = 'M0 0';
  while (data.length < 1_000_000) data += randomPath(random, false).replace(/^\s*M/, 'm');
  for (const long of [data, `${data}L1 1 x`]) {
    const inParts = recorder();
    const error = new PathReader().draw(long, inParts.sink);
    const whole = new PathCommands();
    expect(error).toBe(readPathTokens(long, cursor, whole));
    const atOnce = recorder();
    tracePath(whole, atOnce.sink);
    expect(inParts.told.length).toBeGreaterThan(40_000);
    expect(inParts.told.join() === atOnce.told.join()).toBe(true);
  }
});
