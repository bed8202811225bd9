import type { Finding, Severity } from '../finding.js';

/** Every code that reading G-code can report. All carry `count`; place and `word` are the first time's. */
export const GCODE_FINDINGS = {
  // The moves are not known: no program comes out.
  'gcode-bad-character': 'error', // word
  'gcode-bad-number': 'error', // word: the letter before it
  'gcode-comment-open': 'error',
  'gcode-expression': 'error', // word: a parameter or an expression, which is not evaluated
  'gcode-word-twice': 'error', // word
  'gcode-same-group': 'error', // word: two motions on a line
  'gcode-not-supported': 'error', // word
  'gcode-arc-error': 'error', // no centre, no radius, or a radius too short
  'gcode-no-heights': 'error', // never up and down

  // Read, with a doubt.
  'gcode-arc-radii': 'warning', // the ends are not at one distance from the centre
  'gcode-optional-line': 'warning', // a slash in front: taken as executed
  'gcode-word-ignored': 'warning', // word
  'gcode-height-unknown': 'warning', // a feed along the sheet before any height: taken as lifted
  'gcode-slanted-move': 'warning', // up or down while moving along the sheet: taken as drawn
  'gcode-rapid-down': 'warning', // a rapid along the sheet while down: taken as drawn
  'gcode-stop-down': 'warning', // a stop while down
  'gcode-no-end': 'warning', // neither M2 nor M30 nor a closing percent sign
  'gcode-no-placement': 'warning', // the page's height is not known: y = 0 is its top, the drawing above it
  'gcode-nothing-drawn': 'warning',
} as const satisfies Record<string, Severity>;

export type GcodeCode = keyof typeof GCODE_FINDINGS;

/** Gathers findings: one for each code and word, in the order first met. */
export class GcodeFindings {
  private readonly entries = new Map<string, { finding: Finding; count: number }>();

  /** `line` and `column` count from 1, 0 where there is none. */
  add(code: GcodeCode, line: number, word = '', column = 0): void {
    const key = `${code} ${word}`;
    const known = this.entries.get(key);
    if (known) {
      known.count++;
      return;
    }
    const place = line === 0 ? null : { element: null, id: null, line, column: column || null };
    const values: Finding['values'] = word === '' ? {} : { word };
    this.entries.set(key, { finding: { code, severity: GCODE_FINDINGS[code], place, values }, count: 1 });
  }

  get failed(): boolean {
    return [...this.entries.values()].some(({ finding }) => finding.severity === 'error');
  }

  list(): Finding[] {
    return [...this.entries.values()].map(({ finding, count }) => ({
      ...finding,
      values: { ...finding.values, count },
    }));
  }
}
