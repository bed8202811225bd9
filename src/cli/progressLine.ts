import { writeSync } from 'node:fs';
import type { Step } from '../core/index.js';

const DOING: Readonly<Record<Step['doing'], string>> = {
  network: 'building the network',
  pairing: 'pairing odd vertices',
  improve: 'improving the order',
  audit: 'writing and auditing',
};

const QUIET_MS = 700;
const EVERY_MS = 150;

/**
 * One line on the terminal, rewritten in place, that says what is being done, how far it is and the
 * figure so far. Nothing is shown for short work, nor where standard error is no terminal.
 */
export class ProgressLine {
  private readonly began = performance.now();
  private shownAt = 0;
  private width = 0;

  constructor(private readonly on: boolean) {}

  show(step: Step): void {
    const now = performance.now();
    if (!this.on || now - this.began < QUIET_MS || now - this.shownAt < EVERY_MS) return;
    this.shownAt = now;
    const figure = step.costMm === null ? '' : `, travel ${step.costMm.toFixed(0)} mm`;
    const text = `${DOING[step.doing]}: ${Math.floor(100 * step.share)} %${figure}`;
    writeSync(2, `\r${text.padEnd(this.width)}`);
    this.width = text.length;
  }

  clear(): void {
    if (this.width === 0) return;
    writeSync(2, `\r${' '.repeat(this.width)}\r`);
    this.width = 0;
  }
}
