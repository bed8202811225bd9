/** `S` of XML 1.0 §2.3. */
export function isXmlSpace(c: number): boolean {
  return c === 32 || c === 10 || c === 9 || c === 13;
}

/** Whether a stretch of text is nothing but white space. */
export function isBlank(text: string, from: number, to: number): boolean {
  for (let at = from; at < to; at++) if (!isXmlSpace(text.charCodeAt(at))) return false;
  return true;
}

/** `Char` of XML 1.0 §2.2. */
export function isXmlCharacter(code: number): boolean {
  if (code < 32) return code === 9 || code === 10 || code === 13;
  return code <= 0xd7ff || (code >= 0xe000 && code <= 0xfffd) || (code >= 0x10000 && code <= 0x10ffff);
}

/** Offset of the first character that XML does not allow, half of a surrogate pair included, or -1. */
export function findForbidden(text: string): number {
  for (let at = 0; at < text.length; at++) {
    const unit = text.charCodeAt(at);
    if (unit >= 32 && unit < 0xd800) continue;
    const code = text.codePointAt(at) ?? unit;
    if (!isXmlCharacter(code)) return at;
    if (code > 0xffff) at++;
  }
  return -1;
}

/** What ends a name wherever it stands: white space, or one of `" ' / < = > ? & ; % ( ) [ ] | , * !`. */
export function endsName(c: number): boolean {
  return c < 128 && ENDS_NAME[c] === 1;
}

const ENDS_NAME: Readonly<Uint8Array> = (() => {
  const ends = new Uint8Array(128);
  for (const c of '\t\n\v\f\r "\'/<=>?&;%()[]|,*!') ends[c.charCodeAt(0)] = 1;
  return ends;
})();

const START =
  '_A-Za-z\\u00C0-\\u00D6\\u00D8-\\u00F6\\u00F8-\\u02FF\\u0370-\\u037D\\u037F-\\u1FFF\\u200C\\u200D\\u2070-\\u218F\\u2C00-\\u2FEF\\u3001-\\uD7FF\\uF900-\\uFDCF\\uFDF0-\\uFFFD\\u{10000}-\\u{EFFFF}';
const PART = `[${START}][${START}0-9.\\-\\u00B7\\u0300-\\u036F\\u203F\\u2040]*`;
const NAME = new RegExp(`^${PART}$`, 'u');
const QUALIFIED_NAME = new RegExp(`^${PART}(?::${PART})?$`, 'u');

/** `NCName` of Namespaces in XML 1.0: a name without a colon. */
export function isPlainName(text: string): boolean {
  return NAME.test(text);
}

/** `QName` of Namespaces in XML 1.0: a name, with one prefix or none. */
export function isQualifiedName(text: string): boolean {
  return QUALIFIED_NAME.test(text);
}
