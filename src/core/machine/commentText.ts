/**
 * Any text inside an RS-274/NGC comment. A comment runs to the first closing bracket, holds no other
 * bracket, and its characters are printable (NISTIR 6556 §3.3.4, §E.2). Some controllers also act on
 * `! ? ~ % ;` wherever they stand in the stream (common practice, no source). All of those, and the
 * backslash, are written as \uXXXX, one per UTF-16 unit, so that `fromComment` gives the text back.
 */
const PLAIN = /^[ "#$&'*+,\-./0-9:<=>@A-Z[\]^_`a-z{|}]$/;

/** At most `most` characters; a longer text is cut at a character and ends with three dots. */
export function toComment(text: string, most = 80): string {
  let out = '';
  let cut = '';
  for (let i = 0; i < text.length; i++) {
    const c = text.charAt(i);
    out += PLAIN.test(c) ? c : `\\u${text.charCodeAt(i).toString(16).padStart(4, '0')}`;
    if (out.length > most) return `${cut}...`;
    if (out.length <= most - 3) cut = out;
  }
  return out;
}

/** The text that `toComment` was given, if it was not cut. */
export function fromComment(comment: string): string {
  return comment.replace(/\\u([0-9a-f]{4})/g, (_, code: string) => String.fromCharCode(parseInt(code, 16)));
}
