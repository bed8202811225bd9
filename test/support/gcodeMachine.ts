/**
 * A small machine of its own, apart from the reader in src: it runs the G-code that our writer makes
 * and throws wherever a rule for a pen on a Z axis is broken. Strict on purpose: it knows G0, G1, G17,
 * G20, G21, G90, G94, M0 and M2 alone, one move a line.
 */
export interface StrictMove {
  readonly line: number;
  readonly feed: boolean;
  readonly from: readonly [number, number, number];
  readonly to: readonly [number, number, number];
}

export interface StrictRun {
  readonly moves: readonly StrictMove[];
  /** Comments, without brackets. */
  readonly comments: readonly string[];
  /** How many moves had been made at each M0. */
  readonly stops: readonly number[];
  readonly drawnMm: number;
  readonly travelMm: number;
  readonly descents: number;
}

export function runStrictly(text: string): StrictRun {
  const moves: StrictMove[] = [];
  const comments: string[] = [];
  const stops: number[] = [];
  const modes = new Set<string>();
  let position: [number, number, number] = [0, 0, Number.NaN];
  let raised = Number.NaN;
  let feedRate = 0;
  let ended = false;
  let [drawnMm, travelMm, descents] = [0, 0, 0];

  const lines = text.split('\n');
  if (lines.pop() !== '') throw new Error('the last line has no end');
  lines.forEach((whole, index) => {
    const line = index + 1;
    const must = (holds: boolean, rule: string) => {
      if (!holds) throw new Error(`line ${line}, "${whole}": ${rule}`);
    };
    // NISTIR 6556 §3.3: 256 characters at most; the interpreter in use counts 253 as too many.
    must(whole.length <= 250, 'longer than 250 characters');
    must(/^[\x20-\x7e]*$/.test(whole), 'not printable ASCII');
    must(!ended, 'goes on after M2');
    // §3.3.4: a comment holds no bracket.
    const code = whole.replace(/\(([^()]*)\)/g, (_, comment: string) => {
      comments.push(comment);
      must(!/[!?~%;]/.test(comment), 'a character in a comment that controllers act on');
      return '';
    });
    must(!/[()]/.test(code), 'nested or open bracket');
    if (code === '') return;
    must(/^([A-Z]-?\d+(\.\d+)?)( [A-Z]-?\d+(\.\d+)?)*$/.test(code), 'not words of plain numbers');
    must(!/-0(\.0*)?(?![.\d])/.test(code), 'minus zero');
    const words = new Map<string, number>();
    for (const word of code.split(' ')) {
      must(!words.has(word[0]), 'a letter twice');
      words.set(word[0], Number(word.slice(1)));
    }
    const g = words.get('G');
    const m = words.get('M');
    if (m !== undefined) {
      must(words.size === 1 && (m === 0 || m === 2), 'not a lone M0 or M2');
      must(position[2] === raised, 'stops with the pen down');
      if (m === 0) stops.push(moves.length);
      else ended = true;
      return;
    }
    if (g !== 0 && g !== 1) {
      must([17, 20, 21, 90, 94].includes(g ?? -1) && words.size === 1, 'unknown word');
      must(moves.length === 0, 'a mode after a move');
      must(!modes.has(g === 20 ? 'G21' : `G${g}`), 'a mode twice');
      modes.add(`G${g}`);
      return;
    }
    // §3.5.7: units before any move; the other modes are stated too.
    must(
      ['G21', 'G90', 'G17', 'G94'].every((mode) => modes.has(mode)),
      'a move before the modes',
    );
    feedRate = words.get('F') ?? feedRate;
    const along = words.has('X') || words.has('Y');
    const to: [number, number, number] = [
      words.get('X') ?? position[0],
      words.get('Y') ?? position[1],
      words.get('Z') ?? position[2],
    ];
    must(along !== words.has('Z'), 'moves along and up or down at once, or not at all');
    if (along) must(words.has('X') && words.has('Y'), 'X or Y alone');
    if (Number.isNaN(position[2])) {
      must(!along && g === 0, 'the first move does not raise the pen');
      raised = to[2];
    }
    if (g === 1) must(feedRate > 0, 'feeds without a feed rate');
    if (along) {
      must(g === 0 ? position[2] === raised : position[2] < raised, 'rapid while down or feed while raised');
      const length = Math.hypot(to[0] - position[0], to[1] - position[1]);
      if (g === 0) travelMm += length;
      else drawnMm += length;
    } else if (g === 1) {
      must(to[2] < position[2], 'a feed up');
      descents++;
    } else {
      must(to[2] === raised, 'a rapid to another height');
    }
    moves.push({ line, feed: g === 1, from: position, to });
    position = to;
  });
  if (!ended) throw new Error('does not end with M2');
  if (moves.length > 0 && position[2] !== raised) throw new Error('ends with the pen down');
  return { moves, comments, stops, drawnMm, travelMm, descents };
}
