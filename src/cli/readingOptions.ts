import type { Command } from 'commander';
import { DEFAULT_READING, type ReadingLimits, type ReadingRules, type ReadOptions } from '../core/index.js';
import { positiveNumber, readingLimit } from './optionValues.js';
import { choice } from './sharedOptions.js';

/** Options that say how a drawing is to be taken; every command that reads one has them. */
export interface ReadingFlags {
  pxPerInch?: number;
  dashes: ReadingRules['dashes'];
  clips: ReadingRules['clips'];
  pageEdge: ReadingRules['pageEdge'];
  fills: ReadingRules['fills'];
  limit?: Partial<ReadingLimits>;
}

const d = DEFAULT_READING;

export function addReadingOptions(command: Command): Command {
  return command
    .optionsGroup('How the drawing is read:')
    .option(
      '--px-per-inch <n>',
      'user units to the inch, 90 or 72 for some older editors (default: 96)',
      positiveNumber,
    )
    .addOption(choice('--dashes <how>', 'dashed lines as their dashes or whole', ['cut', 'solid'], d.dashes))
    .addOption(choice('--clips <how>', 'lines end at clip paths or go on', ['cut', 'ignore'], d.clips))
    .addOption(choice('--page-edge <how>', 'lines end at the page or go on', ['cut', 'ignore'], d.pageEdge))
    .addOption(choice('--fills <how>', 'shapes filled but not stroked', ['skip', 'outline'], d.fills))
    .option('--limit <name=n>', 'raise or lower a limit that a message names; may be repeated', readingLimit);
}

/** What `readDrawing` is asked for. */
export type Reading = Omit<ReadOptions, 'name'>;

export function readingOf(flags: ReadingFlags): Reading {
  const { dashes, clips, pageEdge, fills } = flags;
  return { pxPerInch: flags.pxPerInch ?? null, dashes, clips, pageEdge, fills, limits: flags.limit ?? {} };
}
