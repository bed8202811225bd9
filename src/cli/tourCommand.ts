import { mkdirSync } from 'node:fs';
import { Command } from 'commander';
import { realPath } from '../node/files.js';
import { Ending, EXIT, unexpected } from './exitCodes.js';
import { numberAtLeastZero } from './optionValues.js';
import { addReadingOptions, type ReadingFlags, readingOf } from './readingOptions.js';
import {
  addNetworkOptions,
  addSearchOptions,
  type NetworkFlags,
  type SearchFlags,
  settingsOf,
} from './sharedOptions.js';
import { inDirectory, outputKind, runTourJob } from './tourJob.js';

interface TourFlags extends NetworkFlags, ReadingFlags, SearchFlags {
  output?: string[];
  outDir?: string;
  inPlace?: boolean;
  showTravel?: boolean;
  seconds?: number;
  json?: boolean;
  quiet?: boolean;
}

const EXAMPLES = `
Examples:
  fewlift tour drawing.svg -o ordered.svg                 order a drawing
  fewlift tour drawing.svg -o ordered.gcode -o run.json   G-code and a report
  fewlift tour a.svg b.svg --out-dir ordered              several drawings
  cat drawing.svg | fewlift tour - > ordered.svg          in a pipe
  fewlift tour drawing.svg -o out.svg --minimise lifts --end anywhere

The kind of an output follows its extension: .svg; .gcode .ngc .nc .tap; .json (the report).
Lengths take a unit (0.1mm, 2in, 4pt); bare numbers are mm.
Exit codes: 0 done, 2 wrong usage, 3 not read or nothing to draw, 4 refused (nothing written), 5 not written.`;

/** Finer than this the rounding of three decimals would use up the accuracy. */
const FINEST_GCODE_MM = 0.001;

/** `fewlift tour`: the main job. `finish` receives the exit code. */
export function tourCommand(finish: (code: number) => void): Command {
  const command = new Command('tour')
    .summary('order a drawing: every line once, few lifts, little travel')
    .description(
      'Reads an SVG line drawing, orders its strokes so that every line is drawn once with few lifts and little travel, audits the result and writes it. Without -o, SVG goes to standard output.',
    )
    .argument('<drawing...>', 'SVG files; - is standard input')
    .optionsGroup('Output:')
    .option('-o, --output <file>', 'where to write; may be given several times', collect)
    .option('--out-dir <dir>', 'write each drawing there as SVG, under its own name')
    .option('--in-place', 'write back to the input, or let an output overwrite it')
    .option('--show-travel', 'show the lifted travel in SVG, as a group of its own');
  return addSearchOptions(addReadingOptions(addNetworkOptions(command)))
    .optionsGroup('Search:')
    .option('--seconds <s>', 'stop improving after this time', numberAtLeastZero)
    .optionsGroup('Output:')
    .option('--json', 'print the report as JSON instead of the table')
    .option('--quiet', 'print no table and no progress')
    .addHelpText('after', EXAMPLES)
    .action((drawings: string[], flags: TourFlags) => finish(orderAll(drawings, flags)));
}

function orderAll(drawings: string[], flags: TourFlags): number {
  const outputsOf = planOutputs(drawings, flags);
  const settings = { ...settingsOf(flags), seconds: flags.seconds ?? null };
  let worst: number = EXIT.done;
  for (const input of drawings) {
    try {
      runTourJob({
        input,
        outputs: outputsOf(input),
        settings,
        reading: readingOf(flags),
        showTravel: flags.showTravel ?? false,
        json: flags.json ?? false,
        quiet: flags.quiet ?? false,
      });
    } catch (error) {
      const known = error instanceof Ending;
      process.stderr.write(`fewlift: ${known ? error.message : `${input}: ${unexpected(error)}`}\n`);
      worst = Math.max(worst, known ? error.code : EXIT.refused);
    }
  }
  return worst;
}

/** Checks the outputs as a whole before any work; throws an Ending of wrong usage. */
function planOutputs(drawings: string[], flags: TourFlags): (input: string) => string[] {
  const usage = (message: string) => new Ending(EXIT.wrongUsage, message);
  const { output = [], outDir } = flags;
  if (outDir !== undefined && output.length > 0) throw usage('-o and --out-dir do not go together');
  if (drawings.length > 1 && outDir === undefined && !flags.inPlace) {
    throw usage('several drawings need --out-dir or --in-place');
  }
  if (drawings.length > 1 && output.length > 0)
    throw usage('-o takes one drawing; use --out-dir for several');
  if (outDir === '') throw usage('--out-dir needs the name of a directory');
  if (flags.inPlace && drawings.includes('-')) throw usage('standard input cannot be written back in place');
  if (output.some((path) => outputKind(path) === 'gcode') && flags.accuracy < FINEST_GCODE_MM) {
    throw usage(`G-code has three decimals: --accuracy must be at least ${FINEST_GCODE_MM} mm`);
  }
  if (drawings.length > 1 && flags.json) throw usage('--json takes one drawing at a time');
  for (const path of output) {
    if (outputKind(path) === null) {
      throw usage(
        `${path}: the extension names no kind of output; use .svg, .gcode, .ngc, .nc, .tap or .json`,
      );
    }
  }
  if (flags.json && output.includes('-')) throw usage('--json and a drawing cannot share standard output');
  if (new Set(output.map(realPath)).size < output.length) {
    throw usage('the same output is named twice');
  }
  const outputsOf = (input: string): string[] => {
    if (outDir !== undefined) return [inDirectory(outDir, input)];
    if (output.length > 0) return output;
    if (flags.inPlace) return [input];
    return flags.json ? [] : ['-'];
  };
  const targets = drawings
    .flatMap(outputsOf)
    .filter((path) => path !== '-')
    .map(realPath);
  if (new Set(targets).size < targets.length) throw usage('two drawings would be written to the same file');
  if (!flags.inPlace && drawings.some((input) => input !== '-' && targets.includes(realPath(input)))) {
    throw usage('an output would overwrite its input; say --in-place if that is meant');
  }
  if (outDir !== undefined) {
    try {
      mkdirSync(outDir, { recursive: true });
    } catch {
      throw new Ending(EXIT.notWritten, `could not make the directory ${outDir}`);
    }
  }
  return outputsOf;
}

function collect(value: string, all: string[] = []): string[] {
  return [...all, value];
}
