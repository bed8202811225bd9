/**
 * Text as XML 1.0 takes it, in an element or in a double-quoted attribute. Characters that XML cannot
 * hold at all (§2.2: most controls, lone surrogates) become U+FFFD; tabs and line ends are written as
 * references, since an attribute would lose them (§3.3.3).
 */
export function xmlText(text: string): string {
  return text.replace(
    // biome-ignore lint/suspicious/noControlCharactersInRegex: they are what is looked for
    /[&<>"\t\n\r]|[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]|[\ud800-\udbff][\udc00-\udfff]|[\ud800-\udfff]/g,
    (found) => ESCAPED[found] ?? (found.length === 2 ? found : '\ufffd'),
  );
}

const ESCAPED: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  '\t': '&#9;',
  '\n': '&#10;',
  '\r': '&#13;',
};
