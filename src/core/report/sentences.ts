import type { Finding } from '../finding.js';

type Values = Finding['values'];
type Wording = (v: Values) => string;

/**
 * The sentence for every finding. Codes and values are made where something is found; words only here.
 * A finding that was met more than once carries `count`.
 */
const WORDING: Readonly<Record<string, Wording>> = {
  // Reading: the text could not be read at all.
  'empty-input': () => 'the input is empty',
  'not-xml': (v) => `this is not SVG: it begins with ${quoted(v.found)}`,
  'not-svg': (v) => `this is XML, but not SVG: its root is <${v.root}>`,
  'xml-bad-character': (v) => `a character that XML does not allow (code ${v.codePoint})`,
  'xml-bad-tag': () => 'a tag that is not well formed',
  'xml-bad-doctype': () => 'a document type declaration that is not well formed',
  'xml-bad-entity': (v) => `the entity ${quoted(v.entity)} opens an element that it does not close`,
  'xml-bad-attribute': (v) => `the attribute ${quoted(v.attribute)} ${badAttribute(v.why)}`,
  'xml-duplicate-attribute': (v) => `the attribute ${quoted(v.attribute)} stands twice in one tag`,
  'xml-tag-mismatch': (v) =>
    `</${v.found}> stands where </${v.expected}> was due, opened in line ${v.openedLine}, column ${v.openedColumn}`,
  'xml-unopened-tag': (v) => `</${v.found}> closes what was never opened`,
  'xml-cut-off': (v) =>
    `the file is cut off: it ends inside ${begun(v.inside)} that begins in line ${v.startLine}, column ${v.startColumn}, with ${some(v.open, 'element')} still open`,
  'xml-two-roots': (v) => `a second root element, <${v.found}>`,
  'xml-text-outside-root': (v) => `text outside the root element: ${quoted(v.found)}`,
  'xml-unreadable': () => 'the markup could not be read',
  'past-limit': (v) => `refused ${pastLimit(v)}`,
  'entity-limit': (v) => `the entity ${quoted(v.entity)} expands ${pastLimit(v)}: refused`,
  'entity-loop': (v) => `the entity ${quoted(v.entity)} contains itself: refused`,
  'too-large': () => 'the drawing is larger than can be held in memory',
  'nothing-stroked': () => 'nothing in the drawing has a stroke that can be drawn',

  'crossings-paid': (v) =>
    `joining lines at ${some(v.count, 'crossing')}: ${fewer(Number(v.runs), 'run')}, travel ${fewer(Number(v.travelMm), 'mm')}`,
  'crossings-not-worth': (v) =>
    Number(v.count) > 0
      ? `joining lines at ${some(v.count, 'crossing')} saved nothing: the order without is kept`
      : 'no lines cross',
  'too-many-crossings': (v) => `more than ${v.limit} crossings: lines were not joined there`,
  'wider-than-pen': (v) =>
    `${some(v.count, 'stroke')} wider than ${v.penMm} mm, up to ${number(v.widestMm)} mm: each is drawn as one line along its middle; a mill would mill such a track away`,
  'pens-left-out': (v) => `pens left out as asked: ${v.pens} (${some(v.count, 'stroke')})`,
  'pen-not-there': (v) => `no pen is called ${quoted(v.pen)}; the drawing has ${v.pens}`,

  // Reading: read, but not quite as it stands.
  'unknown-entity': (v) => `the entity ${quoted(v.entity)} is not declared${times(v)}`,
  'external-entity': (v) =>
    `the entity ${quoted(v.entity)} stands in another file, which is never fetched: left out${times(v)}`,
  'xml-not-strict': (v) =>
    `not quite XML: ${v.what}${times(v)}; read all the same, though a browser may refuse the file`,
  'svg-namespace-missing': (v) =>
    v.isRoot
      ? 'the root does not name the SVG name space (xmlns="http://www.w3.org/2000/svg"): read all the same; a browser shows nothing'
      : `<${v.element}> is in no name space: read as SVG all the same; a browser does not show it${times(v)}`,
  'undeclared-prefix': (v) => `the prefix ${quoted(v.prefix)} is not declared${times(v)}`,
  'style-rule-not-read': (v) => `a style rule was not understood${times(v)}, first: ${quoted(v.rule)}`,
  'style-sheet-not-read': (v) =>
    `a style sheet was not read: colours and strokes set there are missing (${v.type})${times(v)}`,
  'path-error': (v) =>
    `path data is wrong at character ${v.offset}, ${quoted(v.found)}: drawn up to there${times(v)}`,
  'points-error': (v) =>
    `a list of points is wrong at character ${v.offset}, ${quoted(v.found)}: drawn up to there${times(v)}`,
  'points-odd': (v) => `a list of points has a lone last number, left out${times(v)}`,
  'transform-error': (v) => `a transform was not understood${times(v)}, first: ${quoted(v.transform)}`,
  'transform-origin-ignored': (v) => `transform-origin is not read${times(v)}`,
  'length-error': (v) => `${v.attribute}=${quoted(v.found)} is not a length${times(v)}`,
  'viewbox-error': (v) => `viewBox=${quoted(v.viewBox)} is not four numbers and was left aside`,
  'viewbox-empty': (v) => `viewBox=${quoted(v.viewBox)} has no area: nothing in it is drawn`,
  'aspect-ratio-error': (v) => `preserveAspectRatio=${quoted(v.preserveAspectRatio)} was not understood`,
  'colour-not-read': (v) => `a colour was not understood${times(v)}, first: ${quoted(v.found)}`,
  'size-guessed': (v) =>
    `the drawing does not say how large it is: taken as ${number(v.widthMm)} x ${number(v.heightMm)} mm; check the size before drawing`,
  'user-unit-assumed': (v) =>
    `the page has a physical size and no viewBox, so lengths without a unit were read at ${v.pxPerInch} per inch; some older editors meant 90: check a known length, and say --px-per-inch 90 if it is off by 6.7 %`,
  'font-unit-assumed': (v) =>
    `${v.attribute}=${quoted(v.found)} is measured by a font's letters, here taken to be half as large as the font${times(v)}`,
  'coordinate-overflow': (v) => `${some(v.count, 'stroke')} left out: coordinates beyond any number`,
  'use-missing': (v) => `<use> refers to ${quoted(v.href)}, which is not there${times(v)}`,
  'use-external': (v) => `<use> refers to another file, ${quoted(v.href)}: not fetched${times(v)}`,
  'use-loop': (v) => `<use> refers to itself through ${quoted(v.href)}: refused${times(v)}`,
  'use-limit': (v) => `copies by <use> go ${pastLimit(v)}: the rest of them is not drawn`,
  'text-cut': (v) => `the text of <${v.element}> was cut where it went ${pastLimit(v)}`,
  'style-value-not-read': (v) =>
    `style not understood, and left aside: ${v.property}: ${quoted(v.found)}${times(v)}`,
  'motion-path-not-applied': (v) => `a path of motion is not applied: ${quoted(v.motion)}${times(v)}`,
  'style-limit': (v) => `style sheets went ${pastLimit(v)}: the rest of their rules was left aside`,
  'language-assumed': (v) =>
    `a <switch> chooses by language (${quoted(v.asked)} first): English was taken${times(v)}`,
  'switch-without-match': (v) => `a <switch> has no child that can be drawn${times(v)}`,
  'shape-error': (v) =>
    `${v.attribute}=${quoted(v.found)} may not be negative: taken as not given${times(v)}`,

  // Reading: not drawn, or drawn otherwise than on a screen.
  'filled-not-stroked': (v) =>
    `${some(v.count, 'shape')} filled but not stroked, not drawn: ${number(v.outlineMm)} mm of outline; --fills outline draws it`,
  'text-not-drawn': (v) =>
    `${some(v.count, 'text')} not drawn, first: ${quoted(v.text)}; turn text into paths, or use single-line lettering`,
  'image-not-drawn': (v) => `${some(v.count, 'image')} not drawn`,
  'foreign-object-not-drawn': (v) => `${some(v.count, 'foreignObject')} not drawn`,
  'markers-not-drawn': (v) => `markers (arrow heads and the like) on ${some(v.count, 'line')} not drawn`,
  'clip-not-applied': (v) => `${some(v.count, 'clip path')} not applied: lines run on past the clip`,
  clipped: (v) =>
    `${some(v.count, 'stroke')} cut at the edge of a clip path or viewport, ${number(v.clippedMm)} mm not drawn; --clips ignore draws them whole`,
  'page-edge-cut': (v) =>
    `${some(v.count, 'stroke')} cut at the edge of the page, ${number(v.clippedMm)} mm not drawn; --page-edge ignore draws them whole`,
  'cut-limit': (v) => `${some(v.count, 'stroke')} not cut at an edge, since it would take too long`,
  'mask-not-applied': (v) => `${some(v.count, 'mask')} not applied: what it hides is drawn whole`,
  'filter-not-applied': (v) => `${some(v.count, 'filter')} not applied`,
  'blend-mode-not-applied': (v) => `blending (${v.mode}) not applied: lines are drawn as they are${times(v)}`,
  'dashes-drawn-solid': (v) => `${some(v.count, 'dashed line')} drawn solid`,
  'too-many-dashes': (v) => `the dashes of ${some(v.count, 'line')} go ${pastLimit(v)}: drawn solid`,
  'fill-drawn-as-outline': (v) => `${some(v.count, 'filled shape')} drawn as their outline`,
  'paint-server-drawn-as-line': (v) =>
    `${some(v.count, 'line')} stroked with a gradient or pattern, first: ${quoted(v.paint)}: drawn as plain lines, a pen for each`,
  'fill-ignored': (v) =>
    `${some(v.count, 'shape')} both filled and stroked: on paper the fill hides nothing below it`,
  'white-strokes': (v) => `${some(v.count, 'white stroke')}: kept, as one more pen`,
  'butt-dots-not-drawn': (v) =>
    `${some(v.count, 'line')} of no length and without round or square caps: nothing to draw`,
  hidden: (v) => `${some(v.count, 'element')} hidden by display:none, not drawn`,
  'condition-not-met': (v) => `${some(v.count, 'element')} left out because a condition is not met`,
  invisible: (v) =>
    `${some(v.count, 'element')} invisible (no paint, no width, no opacity, or hidden), not drawn`,
  'flattened-to-nothing': (v) => `${some(v.count, 'element')} scaled to nothing, not drawn`,
  'nothing-to-draw': (v) => `${some(v.count, 'element')} without anything to draw`,
  'unknown-element': (v) => `<${v.name}> is not known and was left out${times(v)}`,

  // Reading G-code.
  'gcode-bad-character': (v) => `a character that the language does not know: ${quoted(v.word)}${times(v)}`,
  'gcode-bad-number': (v) => `no number after ${quoted(v.word)}${times(v)}`,
  'gcode-comment-open': (v) => `a comment that is not closed on its line${times(v)}`,
  'gcode-expression': (v) => `parameters and expressions are not evaluated: ${quoted(v.word)}${times(v)}`,
  'gcode-word-twice': (v) => `the letter ${v.word} twice on one line${times(v)}`,
  'gcode-same-group': (v) => `two motions on one line: ${v.word}${times(v)}`,
  'gcode-not-supported': (v) => `${v.word} is not supported${times(v)}`,
  'gcode-arc-error': (v) => `an arc without a centre or a fitting radius${times(v)}`,
  'gcode-no-heights': () => 'the tool never goes up and down: what is drawn cannot be told from travel',
  'gcode-arc-radii': (v) => `the ends of an arc are not equally far from its centre${times(v)}`,
  'gcode-optional-line': (v) => `a line that may be skipped was taken as run${times(v)}`,
  'gcode-word-ignored': (v) => `${v.word} was passed over${times(v)}`,
  'gcode-height-unknown': (v) => `a move along the sheet before any height was taken as lifted${times(v)}`,
  'gcode-slanted-move': (v) => `a move both along the sheet and up or down was taken as drawn${times(v)}`,
  'gcode-rapid-down': (v) => `a rapid move with the tool down was taken as drawn${times(v)}`,
  'gcode-stop-down': (v) => `a stop with the tool down${times(v)}`,
  'gcode-no-end': () => 'neither M2 nor M30 ends the program',
  'gcode-no-placement': () => "the page's height is not known: y = 0 was taken as its top",
  'gcode-nothing-drawn': () => 'the program draws nothing',

  // Network and program.
  'repeats-drawn-once': (v) => `${number(v.lengthMm)} mm were in the drawing more than once: drawn once`,
  'dots-on-lines': (v) => `${some(v.count, 'dot')} on a line of the same pen: drawn with the line`,
  'dots-drawn-once': (v) => `${some(v.count, 'dot')} stood on another: drawn once`,
  'much-bridged': (v) =>
    `${number(v.bridgedMm)} mm of ${number(v.drawnMm)} mm are drawn across gaps: is --snap wider than meant?`,
  'off-page': (v) =>
    `the drawing passes the edge of the page by ${number(v.overhangMm)} mm: check it against the machine's reach`,
  'order-kept': () => 'no better order was found: the drawing keeps its own',

  // Audit.
  'line-missing': (v) => `${number(v.lengthMm)} mm near ${place(v)} (pen ${penOf(v)}) are not drawn`,
  'line-added': (v) =>
    `${number(v.lengthMm)} mm near ${place(v)} (pen ${penOf(v)}) are drawn but not in the drawing`,
  'line-doubled': (v) => `${number(v.lengthMm)} mm near ${place(v)} (pen ${penOf(v)}) are drawn too often`,
  'line-moved': (v) =>
    `${number(v.lengthMm)} mm near ${place(v)} (pen ${penOf(v)}) have moved by ${number(v.movedMm)} mm`,
  'dot-moved': (v) => `the dot at ${place(v)} (pen ${penOf(v)}) has moved by ${number(v.movedMm)} mm`,
  'dot-missing': (v) => `the dot at ${place(v)} (pen ${penOf(v)}) is not drawn`,
  'dot-added': (v) => `the dot at ${place(v)} (pen ${penOf(v)}) is not in the drawing`,
};

/** The sentence for a finding, without its place; a code without wording is a mistake of ours, and is shown. */
export function sentence(finding: Finding): string {
  const wording = WORDING[finding.code];
  if (wording) return wording(finding.values);
  return `${finding.code} ${JSON.stringify(finding.values)}`;
}

/** Whether a code has its sentence. */
export function hasSentence(code: string): boolean {
  return Object.hasOwn(WORDING, code);
}

function quoted(value: string | number | undefined): string {
  const text = String(value ?? '');
  return `"${text.length > 60 ? `${text.slice(0, 57)}...` : text}"`;
}

function number(value: string | number | undefined): string {
  const n = Number(value ?? Number.NaN);
  if (!Number.isFinite(n)) return 'an unknown number of';
  const steps = Math.abs(n) >= 10 ? 10 : 1000;
  return String(Math.round(n * steps) / steps);
}

function some(count: string | number | undefined, one: string): string {
  const n = Number(count ?? 1);
  return `${n} ${one}${n === 1 ? '' : 's'}`;
}

function times(v: Values): string {
  return Number(v.count ?? 1) > 1 ? ` (${v.count} times)` : '';
}

function pastLimit(v: Values): string {
  return `past the limit ${v.limit} (${v.value}); --limit ${v.limit}=N lifts it`;
}

/** What a text that is cut off was in the middle of. */
function begun(inside: string | number | undefined): string {
  if (inside === 'attribute') return 'an attribute of the tag';
  return inside === 'element' ? 'an element' : `a ${inside}`;
}

function badAttribute(why: string | number | undefined): string {
  switch (why) {
    case 'no value':
      return 'has no value';
    case 'no quotes':
      return 'has a value without quotes';
    case 'less-than':
      return 'holds a "<": most often its closing quote is missing';
    default:
      return 'has a name that XML does not allow';
  }
}

function place(v: Values): string {
  return `x ${number(v.x)}, y ${number(v.y)}`;
}

function penOf(v: Values): string {
  return v.penName === undefined ? `${Number(v.pen ?? 0) + 1}` : String(v.penName);
}

/** How much less of something there is, or more. */
function fewer(amount: number, unit: 'run' | 'mm'): string {
  const size = Math.abs(amount);
  const what = unit === 'mm' ? `${number(size)} mm` : some(size, 'run');
  return `${what} ${amount < 0 ? 'more' : unit === 'mm' ? 'less' : 'fewer'}`;
}
