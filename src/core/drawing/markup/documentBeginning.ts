import { Unreadable } from '../findingLog.js';
import type { MarkupLexer } from './markupLexer.js';
import { findForbidden, isXmlSpace } from './xmlCharacters.js';

const XML_DECLARATION =
  /^<\?xml[ \t\r\n]+version[ \t\r\n]*=[ \t\r\n]*(?:"1\.[0-9]+"|'1\.[0-9]+')(?:[ \t\r\n]+encoding[ \t\r\n]*=[ \t\r\n]*(?:"[A-Za-z][\w.-]*"|'[A-Za-z][\w.-]*'))?(?:[ \t\r\n]+standalone[ \t\r\n]*=[ \t\r\n]*(?:"(?:yes|no)"|'(?:yes|no)'))?[ \t\r\n]*\?>$/;

/**
 * Looks at how a document begins: legal characters all through, `<` first, its XML declaration passed over.
 * Throws Unreadable where it is nothing of the kind.
 */
export function readBeginning(lexer: MarkupLexer): void {
  const { text } = lexer;
  if (text.charCodeAt(0) === 0xfeff) lexer.at = 1;
  let first = lexer.at;
  while (isXmlSpace(text.charCodeAt(first))) first++;
  if (first === text.length) throw new Unreadable('empty-input', null);
  if (text[first] !== '<') {
    const found = text.slice(first, first + 20).replace(/[\p{Cc}\ufffd]/gu, '?');
    throw lexer.fail('not-xml', first, { found });
  }
  const bad = findForbidden(text);
  if (bad >= 0) throw lexer.fail('xml-bad-character', bad, { codePoint: text.charCodeAt(bad) });
  if (!/^<\?xml[ \t\r\n]/.test(text.slice(lexer.at, lexer.at + 6))) return;
  const end = text.indexOf('?>', lexer.at);
  if (end < 0) throw lexer.cutOff('processing instruction');
  const declaration = text.slice(lexer.at, end + 2);
  if (declaration.length > 1000 || !XML_DECLARATION.test(declaration)) {
    lexer.notStrict('the XML declaration', lexer.at);
  }
  lexer.at = end + 2;
}
