import { describe, expect, test } from 'vitest';
import { DEFAULT_SETTINGS, findingLines, readDrawing, surveyDrawing } from '../../../src/core/index.ts';
import { UNREADABLE } from '../../support/cases/unreadable.ts';

/** Everything that reading leaves out or takes otherwise, twice over, a construct on each line. */
const HEAD =
  '<svg xmlns="http://www.w3.org/2000/svg" width="300" height="200" viewBox="0 0 300 200" fill="none" stroke="#000" stroke-width=".2">\n<path d="M5 5h90"/>\n';
const FIRST_LINE = HEAD.split('\n').length;
const LINES = [...UNREADABLE, ...UNREADABLE.map(([code, id, line]) => again(code, id, line))];
const TEXT = `${HEAD}${LINES.map(([, , line]) => line).join('\n')}\n</svg>`;

function again(code: string, id: string | null, line: string): readonly [string, string | null, string] {
  return [code, id === null ? null : `${id}b`, line.replace(/e(\d+)"/g, 'e$1b"')];
}

describe('survey names what was not read', () => {
  const survey = surveyDrawing(readDrawing(TEXT), { ...DEFAULT_SETTINGS, effort: 0 }, '');
  const findings = new Map(survey.findings.map((finding) => [finding.code, finding]));

  test.each(LINES.map(([code, id, text], i) => ({ code, id, text, line: FIRST_LINE + i })))(
    '$code in line $line',
    ({ code, id, text, line }) => {
      const finding = findings.get(code);
      const places = finding?.places ?? (finding?.place ? [finding.place] : []);
      const here = places.find((place) => place.line === line);
      expect(here, JSON.stringify([...findings.keys()])).toBeDefined();
      expect(here?.column).toBeGreaterThan(0);
      if (id === null) return;
      const tag = new RegExp(`<(\\w+) id="${id}"`).exec(text);
      expect(here).toMatchObject({ element: tag?.[1], id, column: (tag?.index ?? NaN) + 1 });
    },
  );

  test('the list for people says each with its element, id, line and column', () => {
    const lines = findingLines(survey.findings, 5);
    for (const { code, place } of survey.findings) {
      if (!place?.id) continue;
      const words = [`<${place.element}`, place.id, `${place.line}`, `${place.column}`];
      const said = lines.some((line) => words.every((word) => line.includes(word)));
      expect(said, `${code}: ${words} in ${lines.join('\n')}`).toBe(true);
    }
  });
});
