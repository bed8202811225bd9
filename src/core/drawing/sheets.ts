import type { Place } from '../finding.js';
import type { Misread } from './declarations.js';
import type { FindingLog } from './findingLog.js';
import { StyleSheet } from './styleSheet.js';
import type { SvgElement, SvgTree } from './svgTree.js';

/** The style sheets of a drawing as one; null where it has none that say anything about lines. */
export function sheetsOf(tree: SvgTree, log: FindingLog): StyleSheet | null {
  if (tree.sheets.length === 0) return null;
  let text = '';
  let element: SvgElement = tree.sheets[0];
  const place = (at: number): (() => Place) => {
    const [here, within] = [element, text.slice(0, at)];
    return () => placeIn(tree.placeOf(here), within);
  };
  const sheet = new StyleSheet({
    unread: (rule, at) => log.add('style-rule-not-read', place(at), { rule: oneLine(rule) }),
    misread: (what, at) => reportMisread(log, what, place(at)),
    elsewhere: (url, at) => log.add('style-sheet-not-read', place(at), { type: oneLine(`@import ${url}`) }),
  });
  for (element of tree.sheets) {
    const type = tree.attributeOf(element, 'type') ?? '';
    if (type !== '' && type.trim().toLowerCase() !== 'text/css') {
      log.add('style-sheet-not-read', place(0), { type });
      continue;
    }
    const media = tree.attributeOf(element, 'media')?.trim() ?? '';
    const before = media === '' ? '' : `@media ${media}{`;
    text = before + rawText(element) + (media === '' ? '' : '}');
    sheet.add(text);
  }
  return sheet.isEmpty ? null : sheet;
}

/** Values of paints have a code of their own, since attributes have it too. */
export function reportMisread(
  log: FindingLog,
  { property, found }: Misread,
  place: () => Place | null,
): void {
  if (['stroke', 'fill', 'color'].includes(property))
    log.add('colour-not-read', place, { found: oneLine(found) });
  else log.add('style-value-not-read', place, { property, found: oneLine(found) });
}

/** The text as it stands: white space counts in strings. */
function rawText(element: SvgElement): string {
  return element.children.map((child) => (typeof child === 'string' ? child : '')).join('');
}

/** `within`: the text of the sheet before the place. */
function placeIn(start: Place, within: string): Place {
  const lines = within.split('\n');
  if (lines.length === 1 || start.line === null) return start;
  return { ...start, line: start.line + lines.length - 1, column: lines[lines.length - 1].length + 1 };
}

function oneLine(text: string): string {
  return text.slice(0, 400).replace(/\s+/g, ' ').trim().slice(0, 60);
}
