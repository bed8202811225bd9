/** One declaration of a style attribute or rule. */
export interface Declaration {
  readonly name: string;
  readonly value: string;
  readonly important: boolean;
}

/** Properties that reading looks at; others are passed over. */
export const PROPERTIES: ReadonlySet<string> = new Set([
  ...['stroke', 'stroke-width', 'stroke-linecap', 'stroke-opacity', 'stroke-dasharray', 'stroke-dashoffset'],
  ...['fill', 'fill-opacity', 'color', 'display', 'visibility', 'opacity', 'font-size', 'vector-effect'],
  ...['marker', 'marker-start', 'marker-mid', 'marker-end', 'clip-path', 'clip-rule', 'overflow', 'mask', 'filter'],
  ...['transform', 'transform-origin', 'x', 'y', 'width', 'height', 'cx', 'cy', 'r', 'rx', 'ry'],
]);

/**
 * The declarations of known properties in a style attribute or in the braces of a rule (CSS Syntax
 * Module Level 3, "Parse a list of declarations"): `;` inside quotes and brackets does not part them.
 */
export function readDeclarations(text: string): Declaration[] {
  const clean = text.includes('/*') ? text.replace(/\/\*[\s\S]*?(?:\*\/|$)/g, ' ') : text;
  const declarations: Declaration[] = [];
  for (const part of splitOutside(clean, ';')) {
    const colon = part.indexOf(':');
    if (colon < 0) continue;
    const name = part.slice(0, colon).trim().toLowerCase();
    if (!PROPERTIES.has(name)) continue;
    const raw = part.slice(colon + 1).trim();
    const bang = raw.lastIndexOf('!');
    const important = bang >= 0 && /^!\s*important$/i.test(raw.slice(bang));
    const value = important ? raw.slice(0, bang).trimEnd() : raw;
    if (value !== '') declarations.push({ name, value, important });
  }
  return declarations;
}

/** Parts the text at `mark`, but not inside quotes or brackets. */
export function splitOutside(text: string, mark: string): string[] {
  if (!/["'([{]/.test(text)) return text.split(mark);
  const parts: string[] = [];
  let from = 0;
  let depth = 0;
  let quote = '';
  for (let at = 0; at < text.length; at++) {
    const c = text[at];
    if (quote !== '') {
      if (c === '\\') at++;
      else if (c === quote) quote = '';
    } else if (c === '"' || c === "'") quote = c;
    else if (c === '(' || c === '[' || c === '{') depth++;
    else if (c === ')' || c === ']' || c === '}') depth--;
    else if (c === mark && depth <= 0) {
      parts.push(text.slice(from, at));
      from = at + 1;
    }
  }
  parts.push(text.slice(from));
  return parts;
}
