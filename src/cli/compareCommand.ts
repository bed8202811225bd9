import { basename } from 'node:path';
import { Command } from 'commander';
import {
  type ComparedSide,
  type CompareSettings,
  compareSides,
  comparisonTable,
  PEN_ON_Z,
  readGcode,
  sentence,
  sideOfDrawing,
  sideOfProgram,
} from '../core/index.js';
import { version } from '../node/version.js';
import { Ending, EXIT } from './exitCodes.js';
import { drawingFrom, readText } from './input.js';
import { positiveLengthMm } from './optionValues.js';
import { addReadingOptions, type ReadingFlags, readingOf } from './readingOptions.js';
import { addLineOptions, type NetworkFlags, settingsOf } from './sharedOptions.js';
import { outputKind } from './tourJob.js';

const EXAMPLES = `
Examples:
  fewlift compare drawing.svg ordered.svg          is every line still there, and what was saved?
  fewlift compare drawing.svg ordered.gcode        the same for G-code that says where its page lies
  fewlift compare one.svg two.svg --accuracy 0.1mm --json

Lines may be drawn in another order, direction or number of pieces; gaps up to --snap may be bridged.
With --repeats once (the default) a line that stands there twice may be drawn once.
Exit codes: 0 the same lines, 1 lines differ, 2 wrong usage, 3 not read.`;

/** `fewlift compare`: holds two files against each other, line by line. */
export function compareCommand(finish: (code: number) => void): Command {
  const command = new Command('compare')
    .summary('hold two files against each other: the same lines? what was saved?')
    .description(
      'Compares two files, SVG or G-code: travel, runs, drawn length and time side by side, and whether they draw the same lines, with the place of every difference.',
    )
    .argument('<before>', 'SVG or G-code; - is standard input')
    .argument('<after>', 'SVG or G-code');
  return addReadingOptions(addLineOptions(command))
    .optionsGroup('Output:')
    .option('--json', 'print JSON instead of the table')
    .optionsGroup('How the drawing is read:')
    .option(
      '--page-height <length>',
      'height of the page of G-code whose head does not tell it',
      positiveLengthMm,
    )
    .addHelpText('after', EXAMPLES)
    .action(
      (
        before: string,
        after: string,
        flags: NetworkFlags & ReadingFlags & { json?: boolean; pageHeight?: number },
      ) => {
        const settings = settingsOf(flags);
        const comparison = compareSides(
          sideOf(before, settings, flags),
          sideOf(after, settings, flags),
          settings,
          PEN_ON_Z,
          version(),
        );
        const text = flags.json ? JSON.stringify(comparison, null, 2) : comparisonTable(comparison);
        process.stdout.write(`${text}\n`);
        finish(comparison.same ? EXIT.done : EXIT.checkFailed);
      },
    );
}

function sideOf(
  path: string,
  settings: CompareSettings,
  flags: ReadingFlags & { pageHeight?: number },
): ComparedSide {
  const reading = readingOf(flags);
  const text = readText(path, reading);
  if (outputKind(path) !== 'gcode') return sideOfDrawing(drawingFrom(text, path, reading), settings);
  const pageHeightMm = flags.pageHeight;
  const { program, findings } = readGcode(text, pageHeightMm === undefined ? {} : { pageHeightMm });
  for (const finding of program ? findings : []) {
    const line = finding.place?.line ? ` (line ${finding.place.line})` : '';
    process.stderr.write(`${finding.severity}: ${basename(path)}: ${sentence(finding)}${line}\n`);
  }
  if (program) return sideOfProgram(basename(path), program, settings);
  const stop = findings.find(({ severity }) => severity === 'error');
  const line = stop?.place?.line ? ` (line ${stop.place.line})` : '';
  throw new Ending(EXIT.notRead, `${path} could not be read: ${stop ? sentence(stop) : 'no program'}${line}`);
}
