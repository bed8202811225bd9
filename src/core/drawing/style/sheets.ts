import type { Place } from '../../finding.js';
import type { FindingLog } from '../findingLog.js';
import type { SvgElement, SvgTree } from '../markup/svgTree.js';
import type { Misread } from './declarations.js';
import { StyleSheet } from './styleSheet.js';

/**
 * The style sheets of a drawing as one; null where it has none that say anything about lines. Those that go
 * past `mostCharacters` are left aside: reading a sheet takes about half a second and 70 MB a million (measured).
 */
export function sheetsOf(tree: SvgTree, log: FindingLog, mostCharacters: number): StyleSheet | null {
  if (tree.sheets.length === 0) return null;
  let element: SvgElement = tree.sheets[0];
  let lineStarts: readonly number[] = [0];
  const place = (at: number): (() => Place) => {
    const [here, starts] = [element, lineStarts];
    return () => placeIn(tree.placeOf(here), starts, at);
  };
  const sheet = new StyleSheet({
    unread: (rule, at) => log.add('style-rule-not-read', place(at), { rule: oneLine(rule) }),
    misread: (what, at) => reportMisread(log, what, place(at)),
    elsewhere: (url, at) => log.add('style-sheet-not-read', place(at), { type: oneLine(`@import ${url}`) }),
  });
  let characters = 0;
  for (element of tree.sheets) {
    const type = tree.attributeOf(element, 'type') ?? '';
    if (type !== '' && type.trim().toLowerCase() !== 'text/css') {
      log.add('style-sheet-not-read', place(0), { type });
      continue;
    }
    const media = tree.attributeOf(element, 'media')?.trim() ?? '';
    const before = media === '' ? '' : `@media ${media}{`;
    const text = before + rawText(element) + (media === '' ? '' : '}');
    characters += text.length;
    if (characters > mostCharacters) {
      log.add('style-limit', place(0), { limit: 'styleCharacters', value: mostCharacters });
      continue;
    }
    lineStarts = lineStartsOf(text);
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

function lineStartsOf(text: string): number[] {
  const starts = [0];
  for (let at = text.indexOf('\n'); at >= 0; at = text.indexOf('\n', at + 1)) starts.push(at + 1);
  return starts;
}

/** Where a character of the sheet stands in the drawing; on the first line of the sheet, its element stands for it. */
function placeIn(start: Place, lineStarts: readonly number[], at: number): Place {
  let [low, high] = [0, lineStarts.length];
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (lineStarts[middle] <= at) low = middle;
    else high = middle;
  }
  if (low === 0 || start.line === null) return start;
  return { ...start, line: start.line + low, column: at - lineStarts[low] + 1 };
}

function oneLine(text: string): string {
  return text.slice(0, 400).replace(/\s+/g, ' ').trim().slice(0, 60);
}
