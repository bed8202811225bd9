import { splitOutside, withBracketsClosed, withoutComments } from './cssText.js';
import { PROPERTIES, pathDataIn } from './properties.js';

/** One declaration of a style attribute or rule. */
export interface Declaration {
  readonly name: string;
  readonly value: string;
  readonly important: boolean;
  /** `wide`: one of the keywords that every property takes; `var`: to be worked out on the element. */
  readonly kind: 'plain' | 'wide' | 'var';
}

/** What was declared and is not read: wrong, or beyond this reader. */
export interface Misread {
  readonly property: string;
  readonly found: string;
}

/** Keywords that every property takes (CSS Cascading and Inheritance Level 5, §7.3). */
export const WIDE: ReadonlySet<string> = new Set(['inherit', 'initial', 'unset', 'revert', 'revert-layer']);
/** Shorthands that hold a property of `PROPERTIES`. */
const SHORTHANDS: ReadonlySet<string> = new Set(['marker', 'font', 'all', 'offset']);
const LONGEST_NAME = 200;

/**
 * The declarations in a style attribute (CSS Syntax Module Level 3, "Parse a list of declarations"): `;`
 * inside quotes and brackets does not part them. Of known properties only, and of custom ones.
 */
export function readDeclarations(text: string, misread: (what: Misread) => void): Declaration[] {
  const declarations: Declaration[] = [];
  let goesBack = false;
  for (const part of splitOutside(withoutComments(text), ';')) {
    for (const declaration of readDeclaration(part, misread, true)) {
      declarations.push(declaration);
      goesBack ||= isBack(declaration);
    }
  }
  return goesBack ? withoutLayer(declarations) : declarations;
}

function isBack({ kind, value }: Declaration): boolean {
  return kind === 'wide' && value === 'revert-layer';
}

/** A style attribute is a layer of its own, which `revert-layer` goes back before (CSS Cascade Level 5). */
function withoutLayer(declarations: readonly Declaration[]): Declaration[] {
  return declarations.filter((d, i) => {
    const later = declarations.slice(i).filter(({ name }) => name === d.name);
    const earlier = declarations.slice(0, i).filter(({ name }) => name === d.name);
    const isGone = later.some((other) => isBack(other) && (other.important || !d.important));
    return !isGone && !(!d.important && earlier.some((other) => isBack(other) && other.important));
  });
}

/** One declaration as written, comments included; none where it is not read or of another property. */
export function readDeclaration(
  text: string,
  misread: (what: Misread) => void,
  inAttribute: boolean,
): readonly Declaration[] {
  const colon = text.indexOf(':');
  if (colon < 0) return [];
  const written = withoutComments(text.slice(0, Math.min(colon, LONGEST_NAME))).trim();
  const isCustom = written.startsWith('--');
  const name = isCustom ? written : written.toLowerCase();
  if (!isCustom && !PROPERTIES.has(name) && !SHORTHANDS.has(name)) return [];
  const raw = withoutComments(text.slice(colon + 1)).trim();
  const bang = raw.lastIndexOf('!');
  const important = bang >= 0 && /^!\s*important$/i.test(raw.slice(bang));
  const value = withBracketsClosed(important ? raw.slice(0, bang).trimEnd() : raw);
  if (isCustom) return [{ name, value, important, kind: 'plain' }];
  if (value === '') return [];
  const declarations = SHORTHANDS.has(name)
    ? expanded(name, value, important, inAttribute)
    : declared(name, value, important, inAttribute);
  if (declarations === null) misread({ property: name, found: value.slice(0, 400) });
  return declarations ?? [];
}

function declared(
  name: string,
  value: string,
  important: boolean,
  inAttribute: boolean,
): readonly Declaration[] | null {
  if (WIDE.has(value.toLowerCase())) {
    return [{ name, value: value.toLowerCase(), important, kind: 'wide' }];
  }
  if (/\bvar\(/i.test(value)) return [{ name, value, important, kind: 'var' }];
  const checked = checkedValue(name, value, inAttribute);
  return checked === null ? null : [{ name, value: checked, important, kind: 'plain' }];
}

/** A valid value as reading takes it; null where it is not one. */
export function checkedValue(name: string, value: string, inAttribute: boolean): string | null {
  if (!PROPERTIES.get(name)?.reads(value, inAttribute)) return null;
  if (name === 'display') return value.toLowerCase();
  return name === 'd' ? pathDataIn(value) : value;
}

function expanded(
  name: string,
  value: string,
  important: boolean,
  inAttribute: boolean,
): readonly Declaration[] | null {
  const all = (names: readonly string[], given: string): readonly Declaration[] | null => {
    const list = names.map((longhand) => declared(longhand, given, important, inAttribute));
    return list.includes(null) ? null : list.flatMap((declarations) => declarations ?? []);
  };
  const isWide = WIDE.has(value.toLowerCase());
  switch (name) {
    case 'marker':
      return all(['marker-start', 'marker-mid', 'marker-end'], value);
    case 'all':
      // Direction and custom properties apart, which are none of these.
      return isWide ? all([...PROPERTIES.keys()], value) : null;
    case 'offset':
      return all(['offset-path'], isWide ? value : value.split('/')[0]);
    default:
      return isWide ? all(['font-size'], value) : fontSizeIn(value, important);
  }
}

const FONT_KEYWORDS = /^(?:caption|icon|menu|message-box|small-caption|status-bar)$/i;

/** The size in `font`: the first word that is one, before the line height and the family. */
function fontSizeIn(value: string, important: boolean): readonly Declaration[] | null {
  if (FONT_KEYWORDS.test(value)) return null;
  const words = value.replace(/\s*\/\s*/g, '/').split(/\s+/);
  // A weight is a number, and so is no size here.
  const at = words.findIndex((word) => checkedValue('font-size', word.split('/')[0], false) !== null);
  if (at < 0 || at + 1 >= words.length) return null;
  return declared('font-size', words[at].split('/')[0], important, false);
}
