import { mkdirSync } from 'node:fs';
import { resolve } from 'node:path';
import { Command, Option } from 'commander';
import { DEFAULT_SETTINGS, type Settings } from '../core/index.js';
import { Ending, EXIT } from './exitCodes.js';
import { lengthMm, numberAtLeastZero, placeMm, positiveLengthMm, wholeNumber } from './optionValues.js';
import { inDirectory, outputKind, runTourJob } from './tourJob.js';

interface TourFlags {
  output?: string[];
  outDir?: string;
  inPlace?: boolean;
  showTravel?: boolean;
  snap: number;
  accuracy: number;
  junctions: Settings['junctions'];
  repeats: Settings['repeats'];
  matching: Settings['matching'];
  minimise: Settings['minimise'];
  home?: [number, number];
  end: Settings['end'];
  pens: Settings['pens'];
  effort: number;
  seconds?: number;
  bound: Settings['bound'];
  seed: number;
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

/** `fewlift tour`: the main job. `finish` receives the exit code. */
export function tourCommand(finish: (code: number) => void): Command {
  const d = DEFAULT_SETTINGS;
  return new Command('tour')
    .summary('order a drawing: every line once, few lifts, little travel')
    .description(
      'Reads an SVG line drawing, orders its strokes so that every line is drawn once with few lifts and little travel, audits the result and writes it. Without -o, SVG goes to standard output.',
    )
    .argument('<drawing...>', 'SVG files; - is standard input')
    .option('-o, --output <file>', 'where to write; may be given several times', collect)
    .option('--out-dir <dir>', 'write each drawing there as SVG, under its own name')
    .option('--in-place', 'let an output overwrite its input')
    .option('--show-travel', 'show the lifted travel in SVG, as a group of its own')
    .addOption(length('--snap <length>', 'ends this close meet', lengthMm, d.snapMm))
    .addOption(
      length(
        '--accuracy <length>',
        'largest chord error of curves written as lines',
        positiveLengthMm,
        d.accuracyMm,
      ),
    )
    .addOption(choice('--junctions <where>', 'where lines join', ['ends', 'touching'], d.junctions))
    .addOption(choice('--repeats <how>', 'lines that stand more than once', ['once', 'keep'], d.repeats))
    .addOption(choice('--matching <how>', 'how odd vertices are paired', ['exact', 'greedy'], d.matching))
    .addOption(choice('--minimise <what>', 'what counts most', ['travel', 'lifts'], d.minimise))
    .option(
      '--home <x,y>',
      "where the tool starts, page mm from the top left (default: the page's bottom left corner)",
      placeMm,
    )
    .addOption(choice('--end <where>', 'where the tool ends', ['home', 'anywhere'], d.end))
    .addOption(choice('--pens <rule>', 'what makes a pen', ['colour', 'layer', 'one'], d.pens))
    .option('--effort <n>', 'improvement: kicks for each stroke end, 0 for none', numberAtLeastZero, d.effort)
    .option('--seconds <s>', 'stop improving after this time', numberAtLeastZero)
    .addOption(choice('--bound <kind>', 'lower bound', ['none', 'quick'], d.bound))
    .option('--seed <n>', 'seed of the improvement', wholeNumber, d.seed)
    .option('--json', 'print the report as JSON instead of the table')
    .option('--quiet', 'print no table and no progress')
    .addHelpText('after', EXAMPLES)
    .action((drawings: string[], flags: TourFlags) => finish(orderAll(drawings, flags)));
}

function orderAll(drawings: string[], flags: TourFlags): number {
  const outputsOf = planOutputs(drawings, flags);
  const settings: Settings = {
    snapMm: flags.snap,
    accuracyMm: flags.accuracy,
    junctions: flags.junctions,
    repeats: flags.repeats,
    matching: flags.matching,
    minimise: flags.minimise,
    homeMm: flags.home ?? null,
    end: flags.end,
    pens: flags.pens,
    effort: flags.effort,
    bound: flags.bound,
    seed: flags.seed,
  };
  let worst: number = EXIT.done;
  for (const input of drawings) {
    try {
      runTourJob({
        input,
        outputs: outputsOf(input),
        settings,
        seconds: flags.seconds ?? null,
        showTravel: flags.showTravel ?? false,
        json: flags.json ?? false,
        quiet: flags.quiet ?? false,
      });
    } catch (error) {
      if (!(error instanceof Ending)) throw error;
      process.stderr.write(`fewlift: ${error.message}\n`);
      worst = Math.max(worst, error.code);
    }
  }
  return worst;
}

/** Checks the outputs as a whole before any work; throws an Ending of wrong usage. */
function planOutputs(drawings: string[], flags: TourFlags): (input: string) => string[] {
  const usage = (message: string) => new Ending(EXIT.wrongUsage, message);
  const { output = [], outDir } = flags;
  if (outDir !== undefined && output.length > 0) throw usage('-o and --out-dir do not go together');
  if (drawings.length > 1 && outDir === undefined) throw usage('several drawings need --out-dir');
  if (drawings.length > 1 && flags.json) throw usage('--json takes one drawing at a time');
  for (const path of output) {
    if (outputKind(path) === null) {
      throw usage(
        `${path}: the extension names no kind of output; use .svg, .gcode, .ngc, .nc, .tap or .json`,
      );
    }
  }
  if (flags.json && output.includes('-')) throw usage('--json and a drawing cannot share standard output');
  if (new Set(output.map((path) => resolve(path))).size < output.length) {
    throw usage('the same output is named twice');
  }
  const outputsOf = (input: string): string[] => {
    if (outDir !== undefined) return [inDirectory(outDir, input)];
    if (output.length > 0) return output;
    return flags.json ? [] : ['-'];
  };
  const targets = drawings
    .flatMap(outputsOf)
    .filter((path) => path !== '-')
    .map((path) => resolve(path));
  if (new Set(targets).size < targets.length) throw usage('two drawings would be written to the same file');
  if (!flags.inPlace && drawings.some((input) => input !== '-' && targets.includes(resolve(input)))) {
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

function choice(flags: string, description: string, choices: string[], preset: string): Option {
  return new Option(flags, description).choices(choices).default(preset);
}

function length(
  flags: string,
  description: string,
  parse: (text: string) => number,
  presetMm: number,
): Option {
  return new Option(flags, description).argParser(parse).default(presetMm, `${presetMm} mm`);
}

function collect(value: string, all: string[] = []): string[] {
  return [...all, value];
}
