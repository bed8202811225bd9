const ESCAPED: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  '\t': '&#9;',
  '\n': '&#10;',
  '\r': '&#13;',
};

/**
 * Text as XML 1.0 takes it, in an element or in a double-quoted attribute. Characters that XML cannot
 * hold at all (§2.2: most controls, lone surrogates) become U+FFFD; tabs and line ends are written as
 * references, since an attribute would lose them (§3.3.3).
 */
export function xmlText(text: string): string {
  return text.replace(/[&<>"\ufffe\uffff]|\p{Cc}|\p{Cs}/gu, (found) => {
    const allowed = found >= '\u007f' && found <= '\u009f';
    return ESCAPED[found] ?? (allowed ? found : '\ufffd');
  });
}
