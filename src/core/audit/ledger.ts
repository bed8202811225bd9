import type { Finding } from '../finding.js';

/** Places named for each code; the rest are counted. */
const MOST_PLACES = 20;

interface Entry {
  readonly x: number;
  readonly y: number;
  readonly lengthMm: number;
  readonly pen: number;
}

/** Collects what an audit finds wrong. */
export class Ledger {
  private readonly entries = new Map<string, Entry[]>();

  get isClean(): boolean {
    return this.entries.size === 0;
  }

  add(code: string, x: number, y: number, lengthMm: number, pen: number): void {
    const list = this.entries.get(code);
    if (list === undefined) this.entries.set(code, [{ x, y, lengthMm, pen }]);
    else list.push({ x, y, lengthMm, pen });
  }

  /**
   * An error for each of the longest places of every code. `values`: x and y of its middle in mm,
   * lengthMm, pen, and of how many places of this code it is one (`count`).
   */
  findings(): Finding[] {
    const findings: Finding[] = [];
    for (const code of [...this.entries.keys()].sort()) {
      const list = this.entries.get(code) ?? [];
      const longest = [...list].sort((a, b) => b.lengthMm - a.lengthMm).slice(0, MOST_PLACES);
      for (const { x, y, lengthMm, pen } of longest) {
        const values = { x, y, lengthMm, pen, count: list.length };
        findings.push({ code, severity: 'error', place: null, values });
      }
    }
    return findings;
  }
}
