/**
 * `text` without its comments, each a space instead; quotes are respected (CSS Syntax Module Level 3,
 * §4.3.2, "Consume comments"). O(text).
 */
export function withoutComments(text: string): string {
  if (!text.includes('/*')) return text;
  let clean = '';
  let from = 0;
  for (let at = 0; at < text.length; ) {
    const next = afterUnit(text, at);
    if (text.startsWith('/*', at)) {
      clean += `${text.slice(from, at)} `;
      from = next;
    }
    at = next;
  }
  return clean + text.slice(from);
}

/** Where what stands at `at` ends: a comment, a string, an escape, or one character. */
export function afterUnit(text: string, at: number): number {
  const c = text[at];
  if (c === '\\') return Math.min(at + 2, text.length);
  if (c === '/' && text[at + 1] === '*') {
    const end = text.indexOf('*/', at + 2);
    return end < 0 ? text.length : end + 2;
  }
  if (c !== '"' && c !== "'") return at + 1;
  for (let i = at + 1; i < text.length; i++) {
    if (text[i] === '\\') i++;
    else if (text[i] === c) return i + 1;
    else if (text[i] === '\n') return i; // A bad string ends with its line.
  }
  return text.length;
}

/** Cuts at every `mark` outside quotes and brackets. O(text). */
export function splitOutside(text: string, mark: string): string[] {
  const parts: string[] = [];
  let from = 0;
  let depth = 0;
  for (let at = 0; at < text.length; ) {
    const c = text[at];
    if (c === '(' || c === '[' || c === '{') depth++;
    else if (c === ')' || c === ']' || c === '}') depth--;
    else if (c === mark && depth <= 0) {
      parts.push(text.slice(from, at));
      from = at + 1;
    }
    at = afterUnit(text, at);
  }
  parts.push(text.slice(from));
  return parts;
}

/** With the brackets closed that the end of the text leaves open, as the end of a sheet does. */
export function withBracketsClosed(text: string): string {
  if (!text.includes('(')) return text;
  let open = '';
  for (let at = 0; at < text.length; ) {
    const c = text[at];
    const next = afterUnit(text, at);
    if (c === '(') open += ')';
    else if (c === ')') open = open.slice(1);
    else if ((c === '"' || c === "'") && next === text.length && (next === at + 1 || text[next - 1] !== c)) {
      return text + c + open;
    }
    at = next;
  }
  return text + open;
}

/** Words parted by white space outside quotes and brackets. O(text). */
export function wordsOf(text: string): string[] {
  const words: string[] = [];
  let from = -1;
  let depth = 0;
  for (let at = 0; at < text.length; ) {
    const c = text[at];
    if (depth <= 0 && isSpace(c)) {
      if (from >= 0) words.push(text.slice(from, at));
      from = -1;
    } else {
      if (from < 0) from = at;
      if (c === '(' || c === '[' || c === '{') depth++;
      else if (c === ')' || c === ']' || c === '}') depth--;
    }
    at = afterUnit(text, at);
  }
  if (from >= 0) words.push(text.slice(from));
  return words;
}

/** White space of CSS (CSS Syntax Module Level 3, §4.2). */
export function isSpace(c: string | undefined): boolean {
  return c === ' ' || c === '\n' || c === '\t' || c === '\r' || c === '\f';
}

/** A name or string with its escapes read (CSS Syntax Module Level 3, §4.3.7). */
export function unescaped(text: string): string {
  if (!text.includes('\\')) return text;
  return text.replace(/\\(?:([0-9a-f]{1,6})\s?|\r\n|\n|([\s\S]))/gi, (_, hex?: string, plain?: string) => {
    if (hex === undefined) return plain ?? '';
    const code = Number.parseInt(hex, 16);
    const isCharacter = code > 0 && code <= 0x10ffff && !(code >= 0xd800 && code <= 0xdfff);
    return isCharacter ? String.fromCodePoint(code) : '\ufffd';
  });
}

/** The lengths of a list parted by commas or spaces, sums in brackets whole; '' where one is missing. */
export function dashWords(value: string): string[] {
  if (!value.includes('(')) return value.split(/\s*,\s*|\s+/);
  return splitOutside(value, ',').flatMap((part) => (part.trim() === '' ? [''] : wordsOf(part)));
}
