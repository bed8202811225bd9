import { Command } from 'commander';
import { findingLines, surveyDrawing, surveyTable } from '../core/index.js';
import { version } from '../node/version.js';
import { EXIT } from './exitCodes.js';
import { readText, strokedDrawingFrom } from './input.js';
import { addReadingOptions, type ReadingFlags, readingOf } from './readingOptions.js';
import { addNetworkOptions, type NetworkFlags, settingsOf } from './sharedOptions.js';

const EXAMPLES = `
Examples:
  fewlift survey drawing.svg               what is in it, and what it allows
  fewlift survey drawing.svg --snap 0.2mm  the same with wider gaps joined
  fewlift survey drawing.svg --json        for a script

Nothing is written. Exit codes: 0 done, 2 wrong usage, 3 not read or nothing to draw.`;

/** Places listed under each finding. */
const PLACES_SHOWN = 20;

/** `fewlift survey`: looks into a drawing and writes nothing. */
export function surveyCommand(finish: (code: number) => void): Command {
  const command = new Command('survey')
    .summary('look into a drawing: sizes, pens, loose ends, repeats, what can be reached')
    .description(
      'Shows what is in an SVG line drawing: page, strokes, pens, layers, components, odd vertices, ends that nearly meet, lines that stand there twice, whatever is not drawn, the fewest runs and the least travel possible.',
    )
    .argument('<drawing>', 'an SVG file; - is standard input');
  return addReadingOptions(addNetworkOptions(command))
    .optionsGroup('Output:')
    .option('--json', 'print JSON instead of the table')
    .addHelpText('after', EXAMPLES)
    .action((path: string, flags: NetworkFlags & ReadingFlags & { json?: boolean }) => {
      const settings = settingsOf(flags);
      const reading = readingOf(flags);
      const drawing = strokedDrawingFrom(readText(path, reading), path, reading, settings);
      const survey = surveyDrawing(drawing, settings, version());
      const text = flags.json
        ? JSON.stringify(survey, null, 2)
        : [surveyTable(survey), ...findingLines(survey.findings, PLACES_SHOWN)].join('\n');
      process.stdout.write(`${text}\n`);
      finish(EXIT.done);
    });
}
