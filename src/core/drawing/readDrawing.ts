import { boxOfSegments } from '../geometry/box.js';
import { pageRegion } from './clip/clipping.js';
import type { Drawing, Strokes } from './drawing.js';
import { FindingLog, Unreadable } from './findingLog.js';
import { LineIndex } from './markup/lineIndex.js';
import { readTree } from './markup/svgTree.js';
import type { PageSize } from './page/pageSize.js';
import { rootContext } from './page/rootContext.js';
import { limitsFrom, type ReadingLimits } from './readingLimits.js';
import { type ReadingRules, rulesFrom } from './readingRules.js';
import { Session } from './session.js';
import { StrokeSink } from './stroke/strokeSink.js';
import { childText } from './structure/references.js';
import { walk } from './structure/walk.js';
import { orTooLarge } from './tooLarge.js';

/** How a drawing is to be read; whatever is left out stays as `DEFAULT_READING` and `DEFAULT_LIMITS` have it. */
export interface ReadOptions extends Partial<ReadingRules> {
  /** What the drawing is called in reports; a file name, most often. */
  readonly name?: string;
  /** Limits to lift or lower; the others stay as `DEFAULT_LIMITS` has them. */
  readonly limits?: Partial<ReadingLimits>;
}

/**
 * Reads an SVG document into strokes in mm (see `Drawing` for what may be relied on). Follows SVG 2
 * where a pen can; whatever is left out or drawn otherwise is a finding.
 *
 * Never throws on any text: one that cannot be read gives a drawing without strokes and a finding of
 * severity `error`. Throws RangeError where `pxPerInch` is not a positive finite number, or a limit not a
 * number of at least 0.
 * Cost: O(text + segments); `use` copies are capped.
 */
export function readDrawing(text: string, options: ReadOptions = {}): Drawing {
  const name = options.name ?? '';
  const rules = rulesFrom(options);
  const limits = limitsFrom(options.limits ?? {});
  const log = new FindingLog();
  try {
    return read(text, name, rules, limits, log);
  } catch (error) {
    if (error instanceof Unreadable) return emptyDrawing(name, rules, log, error);
    throw error;
  }
}

function read(
  text: string,
  name: string,
  rules: ReadingRules,
  limits: ReadingLimits,
  log: FindingLog,
): Drawing {
  const tree = orTooLarge(() => readTree(text, new LineIndex(text), log, limits));
  const session = new Session(tree, log, rules, limits);
  const { page, inside } = rootContext(session);
  if (rules.pageEdge === 'cut' && page.guess !== 'extent') session.sink.clipper.page = pageRegion(page);
  if (inside) walk(session, tree.root, inside);
  const strokes = session.sink.finish();
  const { widthMm, heightMm } = page.guess === 'extent' ? extentOf(strokes, page) : page;
  if (page.guess) session.report('size-guessed', tree.root, { widthMm, heightMm, basis: page.guess });
  return {
    name,
    title: wordsOf(session, 'title'),
    description: wordsOf(session, 'desc'),
    widthMm,
    heightMm,
    elementCount: session.elementCount,
    strokes,
    colours: session.colours,
    layers: session.layers,
    places: session.places,
    findings: log.list(),
    reading: rules,
  };
}

/** The root's title or description. */
function wordsOf(session: Session, element: 'title' | 'desc'): string | null {
  const { root } = session.tree;
  const { textCharacters: value } = session.limits;
  const text = childText(root, element, value + 1);
  if (text === null || text.length <= value) return text;
  session.report('text-cut', root, { element, limit: 'textCharacters', value });
  return text.slice(0, value);
}

/** A page that reaches from the origin to the far ends of what is drawn, where the drawing names none. */
function extentOf({ segments }: Strokes, page: PageSize): { widthMm: number; heightMm: number } {
  const box = new Float64Array(4);
  boxOfSegments(segments, 0, segments.count, box);
  const [, , maxX, maxY] = box;
  return {
    widthMm: page.widthGiven || maxX <= 0 ? page.widthMm : maxX,
    heightMm: page.heightGiven || maxY <= 0 ? page.heightMm : maxY,
  };
}

function emptyDrawing(name: string, rules: ReadingRules, log: FindingLog, error: Unreadable): Drawing {
  return {
    name,
    title: null,
    description: null,
    widthMm: 0,
    heightMm: 0,
    elementCount: 0,
    strokes: new StrokeSink().finish(),
    colours: [],
    layers: [],
    places: [],
    findings: [error.finding(), ...log.list()],
    reading: rules,
  };
}
