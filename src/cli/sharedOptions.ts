import { type Command, Option } from 'commander';
import { DEFAULT_SETTINGS, type Settings } from '../core/index.js';
import {
  lengthMm,
  names,
  numberAtLeastZero,
  pairOfNames,
  placeMm,
  positiveLengthMm,
  wholeNumber,
} from './optionValues.js';

/** Options that say how the lines of a drawing hang together; every command that builds a network has them. */
export interface NetworkFlags {
  snap: number;
  accuracy: number;
  junctions?: Settings['junctions'];
  repeats: Settings['repeats'];
  home?: [number, number];
  end: Settings['end'];
  pens: Settings['pens'];
  onlyPens?: string[];
  skipPens?: string[];
  penOrder?: string[];
  renamePen?: [string, string][];
  penWidth?: number;
}

/** Options that say how the tour is sought. */
export interface SearchFlags {
  matching: Settings['matching'];
  minimise: Settings['minimise'];
  effort: number;
  bound: Settings['bound'];
  seed: number;
}

const d = DEFAULT_SETTINGS;

export function addNetworkOptions(command: Command): Command {
  return addLineOptions(
    command
      .optionsGroup('How lines hang together:')
      .addOption(
        choice('--junctions <where>', 'where lines join', ['ends', 'touching', 'crossing'], d.junctions),
      ),
  );
}

/** What two files must agree on to be held against each other. */
export function addLineOptions(command: Command): Command {
  return command
    .optionsGroup('How lines hang together:')
    .addOption(length('--snap <length>', 'ends this close meet', lengthMm, d.snapMm))
    .addOption(
      length(
        '--accuracy <length>',
        'largest chord error of curves taken as lines',
        positiveLengthMm,
        d.accuracyMm,
      ),
    )
    .addOption(choice('--repeats <how>', 'lines that stand more than once', ['once', 'keep'], d.repeats))
    .option(
      '--home <x,y>',
      "where the tool starts, page mm from the top left (default: the page's bottom left corner)",
      placeMm,
    )
    .addOption(choice('--end <where>', 'where the tool ends', ['home', 'anywhere'], d.end))
    .optionsGroup('Pens:')
    .addOption(choice('--pens <rule>', 'what makes a pen', ['colour', 'layer', 'one'], d.pens))
    .option('--only-pens <names>', 'draw these pens only: names or colours, parted by commas', names)
    .option('--skip-pens <names>', 'leave these pens out', names)
    .option('--pen-order <names>', 'these pens first, in this order', names)
    .option('--rename-pen <old=new>', 'give a pen another name; may be given several times', pairOfNames)
    .option(
      '--pen-width <length>',
      "width of the tool's line: says which strokes are wider",
      positiveLengthMm,
    );
}

export function addSearchOptions(command: Command): Command {
  return command
    .optionsGroup('Search:')
    .addOption(choice('--matching <how>', 'how odd vertices are paired', ['exact', 'greedy'], d.matching))
    .addOption(choice('--minimise <what>', 'what counts most', ['travel', 'lifts'], d.minimise))
    .option(
      '--effort <n>',
      'improvement: kicks for each end of a connector, 0 for none',
      numberAtLeastZero,
      d.effort,
    )
    .addOption(choice('--bound <kind>', 'lower bound', ['none', 'quick'], d.bound))
    .option('--seed <n>', 'seed of the improvement', wholeNumber, d.seed);
}

export function settingsOf(flags: NetworkFlags & Partial<SearchFlags>): Settings {
  return {
    snapMm: flags.snap,
    accuracyMm: flags.accuracy,
    junctions: flags.junctions ?? d.junctions,
    repeats: flags.repeats,
    matching: flags.matching ?? d.matching,
    minimise: flags.minimise ?? d.minimise,
    homeMm: flags.home ?? null,
    end: flags.end,
    pens: flags.pens,
    onlyPens: flags.onlyPens ?? [],
    skipPens: flags.skipPens ?? [],
    penOrder: flags.penOrder ?? [],
    penNames: flags.renamePen ?? [],
    penWidthMm: flags.penWidth ?? null,
    effort: flags.effort ?? d.effort,
    seconds: null,
    bound: flags.bound ?? d.bound,
    seed: flags.seed ?? d.seed,
  };
}

export function choice(flags: string, description: string, choices: string[], preset: string): Option {
  return new Option(flags, description).choices(choices).default(preset);
}

export function length(
  flags: string,
  description: string,
  parse: (text: string) => number,
  presetMm: number,
): Option {
  return new Option(flags, description).argParser(parse).default(presetMm, `${presetMm} mm`);
}
