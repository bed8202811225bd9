import { evaluate } from './calc.js';
import { readColour } from './colour.js';
import { dashWords } from './cssText.js';
import { type LengthContext, readLength, toUserUnits } from './length.js';
import { BLACK, NONE, type Paint, readPaint } from './paint.js';
import { isSeen } from './seen.js';

/** The inherited properties that reading needs, computed for one element. */
export interface Style {
  readonly stroke: Paint;
  readonly fill: Paint;
  /** The value of `color`, which `currentColor` stands for. */
  readonly colour: string;
  readonly colourVisible: boolean;
  /** User units. */
  readonly strokeWidth: number;
  readonly strokeOpacity: number;
  readonly fillOpacity: number;
  readonly visible: boolean;
  /** Caps are round or square, so that a sub-path of zero length is a dot. */
  readonly dots: boolean;
  /** Lengths of dashes and gaps by turns, user units, an even number; null where the line is solid. */
  readonly dashes: readonly number[] | null;
  readonly dashOffset: number;
  /** What holds a share of the viewport, by property: inherited as such; null where nothing does. */
  readonly shares: ReadonlyMap<string, Share> | null;
  /** One bit each for markers at the start, middle and end. */
  readonly markers: number;
  readonly fontSize: number;
}

/** A value as written, and the font size that its em are of. */
interface Share {
  readonly value: string;
  readonly fontSize: number;
}

/** SVG 2 and CSS, the properties' initial values. */
export const INITIAL_STYLE: Style = {
  stroke: NONE,
  fill: BLACK,
  colour: '#000000',
  colourVisible: true,
  strokeWidth: 1,
  strokeOpacity: 1,
  fillOpacity: 1,
  visible: true,
  dots: false,
  dashes: null,
  dashOffset: 0,
  shares: null,
  markers: 0,
  fontSize: 16,
};

/** What a style is computed in: lengths, what references lead to, and where errors go. */
export interface StyleContext extends LengthContext {
  isPaintServer(id: string): boolean;
  isMarker(id: string): boolean;
  /** A value that could not be read, or a colour that black stands for. */
  reportColour(found: string): void;
  reportLength(attribute: string, found: string): void;
}

type Writable = { -readonly [K in keyof Style]: Style[K] };
type Setter = (style: Writable, value: string, parent: Style, context: StyleContext) => void;

/**
 * The style of an element from its parent's. A value that is not understood counts as not given, so
 * the parent's holds (CSS Cascading and Inheritance Level 4, "Value Processing").
 */
export function computeStyle(
  specified: ReadonlyMap<string, string>,
  parent: Style,
  context: StyleContext,
): Style {
  let style: Writable | null = null;
  for (const [name, setter] of SETTERS) {
    const value = specified.get(name);
    if (value === undefined) continue;
    style ??= { ...parent };
    const keyword = value.trim().toLowerCase();
    if (keyword === 'inherit' || keyword === 'unset' || keyword === 'revert') continue;
    const initial = INITIAL_VALUES[name];
    setter(style, keyword === 'initial' && initial !== undefined ? initial : value.trim(), parent, context);
  }
  return style ?? parent;
}

const INITIAL_VALUES: Readonly<Record<string, string>> = {
  'font-size': '16px',
  color: '#000000',
  stroke: 'none',
  fill: '#000000',
  'stroke-width': '1',
  'stroke-opacity': '1',
  'fill-opacity': '1',
  'stroke-linecap': 'butt',
  'stroke-dasharray': 'none',
  'stroke-dashoffset': '0',
  visibility: 'visible',
  'marker-start': 'none',
  'marker-mid': 'none',
  'marker-end': 'none',
};

function paintSetter(name: 'stroke' | 'fill'): Setter {
  return (style, value, _parent, context) => {
    const read = readPaint(value, context.isPaintServer);
    if (read) style[name] = read.paint;
    if (!read?.exact) context.reportColour(value);
  };
}

function opacitySetter(name: 'strokeOpacity' | 'fillOpacity'): Setter {
  return (style, value) => {
    style[name] = readOpacity(value) ?? style[name];
  };
}

function markerSetter(bits: number): Setter {
  return (style, value, _parent, context) => {
    const id = /^url\(\s*["']?#([^"')]*?)["']?\s*\)$/i.exec(value)?.[1];
    style.markers = id !== undefined && context.isMarker(id) ? style.markers | bits : style.markers & ~bits;
  };
}

function keepShare(style: Writable, property: string, value: string): void {
  const isShare = value.includes('%');
  if (!isShare && !style.shares?.has(property)) return;
  const shares = new Map(style.shares);
  if (isShare) shares.set(property, { value, fontSize: style.fontSize });
  else shares.delete(property);
  style.shares = shares.size > 0 ? shares : null;
}

/**
 * The style in a viewport inside: percentages of it are inherited as percentages (SVG 2, "Stroke
 * properties", computed values), so that they are of the nearest viewport wherever they are used.
 */
export function styleInViewport(style: Style, inside: LengthContext): Style {
  if (style.shares === null) return style;
  const inner: Writable = { ...style };
  const no = (): false => false;
  const silent = { isPaintServer: no, isMarker: no, reportColour: no, reportLength: no };
  for (const [property, setter] of SETTERS) {
    const share = style.shares.get(property);
    if (!share) continue;
    inner.fontSize = share.fontSize;
    setter(inner, share.value, style, { ...inside, ...silent });
  }
  inner.fontSize = style.fontSize;
  return inner;
}

/** In this order: lengths in em need the font size of the same element. */
const SETTERS: readonly (readonly [string, Setter])[] = [
  [
    'font-size',
    (style, value, parent, context) => {
      const size = readFontSize(value, parent.fontSize, context);
      if (size === null) context.reportLength('font-size', value);
      else style.fontSize = size;
    },
  ],
  [
    'color',
    (style, value, _parent, context) => {
      if (value.toLowerCase() === 'currentcolor') return;
      const colour = readColour(value);
      if (!colour) {
        context.reportColour(value);
        return;
      }
      style.colour = colour.hex;
      style.colourVisible = isSeen(colour.alpha);
    },
  ],
  ['stroke', paintSetter('stroke')],
  ['fill', paintSetter('fill')],
  [
    'stroke-width',
    (style, value, _parent, context) => {
      const length = readLength(value);
      if (length && length.value >= 0) {
        style.strokeWidth = Math.max(0, toUserUnits(length, 'other', context, style.fontSize));
        keepShare(style, 'stroke-width', value);
      } else context.reportLength('stroke-width', value);
    },
  ],
  ['stroke-opacity', opacitySetter('strokeOpacity')],
  ['fill-opacity', opacitySetter('fillOpacity')],
  [
    'stroke-linecap',
    (style, value) => {
      const cap = value.toLowerCase();
      if (cap === 'round' || cap === 'square') style.dots = true;
      else if (cap === 'butt') style.dots = false;
    },
  ],
  [
    'stroke-dasharray',
    (style, value, _parent, context) => {
      const dashes = readDashes(value, context, style.fontSize);
      if (dashes === undefined) context.reportLength('stroke-dasharray', value);
      else {
        style.dashes = dashes;
        keepShare(style, 'stroke-dasharray', value);
      }
    },
  ],
  [
    'stroke-dashoffset',
    (style, value, _parent, context) => {
      const length = readLength(value);
      if (length) {
        style.dashOffset = toUserUnits(length, 'other', context, style.fontSize);
        keepShare(style, 'stroke-dashoffset', value);
      } else context.reportLength('stroke-dashoffset', value);
    },
  ],
  [
    'visibility',
    (style, value) => {
      const visibility = value.toLowerCase();
      if (visibility === 'visible') style.visible = true;
      else if (visibility === 'hidden' || visibility === 'collapse') style.visible = false;
    },
  ],
  ['marker-start', markerSetter(1)],
  ['marker-mid', markerSetter(2)],
  ['marker-end', markerSetter(4)],
];

/** An opacity as a number or percentage, clamped to 0 to 1, 0 where nothing is seen; null where it is neither. */
export function readOpacity(value: string): number | null {
  const opacity = evaluate(value.trim(), (number, unit) => {
    if (unit !== '' && unit !== '%') return null;
    return { kind: 'number', value: unit === '%' ? number / 100 : number };
  });
  return opacity && (isSeen(opacity.value) ? Math.min(1, opacity.value) : 0);
}

/** px, as browsers take the keywords where nobody has chosen otherwise (CSS Fonts Module Level 4, §2.5). */
const FONT_SIZES: ReadonlyMap<string, number> = new Map([
  ['xx-small', 9],
  ['x-small', 10],
  ['small', 13],
  ['medium', 16],
  ['large', 18],
  ['x-large', 24],
  ['xx-large', 32],
  ['xxx-large', 48],
]);

function readFontSize(value: string, parent: number, context: LengthContext): number | null {
  const keyword = value.toLowerCase();
  if (keyword === 'larger') return parent * 1.2;
  if (keyword === 'smaller') return parent / 1.2;
  if (keyword === 'math') return parent;
  const named = FONT_SIZES.get(keyword);
  if (named !== undefined) return named;
  const length = readLength(value);
  if (!length || length.value < 0) return null;
  // A percentage of the font size, unlike others, is one of the parent's.
  const within = { ...context, viewportWidth: parent, viewportHeight: parent };
  return Math.max(0, toUserUnits(length, 'x', within, parent));
}

/**
 * The lengths of a dash array, twice over where their number is odd; null where they make no dashes: a sum
 * of 0 is a solid line (SVG 2, "stroke-dasharray"). undefined where the value is wrong.
 */
function readDashes(value: string, context: LengthContext, fontSize: number): number[] | null | undefined {
  if (value.toLowerCase() === 'none') return null;
  const lengths: number[] = [];
  let sum = 0;
  for (const word of dashWords(value)) {
    const length = readLength(word);
    if (!length || length.value < 0) return undefined;
    sum += lengths[lengths.push(Math.max(0, toUserUnits(length, 'other', context, fontSize))) - 1];
  }
  if (!(sum > 0)) return null;
  return lengths.length % 2 === 0 ? lengths : [...lengths, ...lengths];
}
