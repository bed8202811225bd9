import { Command, CommanderError } from 'commander';
import { version } from '../node/version.js';
import { compareCommand } from './compareCommand.js';
import { Ending, EXIT, unexpected } from './exitCodes.js';
import { surveyCommand } from './surveyCommand.js';
import { tourCommand } from './tourCommand.js';

/**
 * A reader that has seen enough (`| head`) is no error of ours: the job goes on and its code stands. Any
 * other failure of standard output is a failure to write.
 */
function noteStreamError(error: NodeJS.ErrnoException): void {
  if (error.code !== 'EPIPE') process.exitCode = EXIT.notWritten;
}

/** Runs the command line; the process ends with the code returned. Never throws on a user's mistake. */
export async function main(args: readonly string[]): Promise<number> {
  for (const stream of [process.stdout, process.stderr]) {
    if (!stream.listeners('error').includes(noteStreamError)) stream.on('error', noteStreamError);
  }
  let code: number = EXIT.done;
  const program = new Command('fewlift')
    .description(
      'Orders the strokes of an SVG line drawing for a pen plotter, cutter, engraver or small mill: every line once, few lifts, little travel, with a lower bound and an audit.',
    )
    .version(version(), '-V, --version', 'print the version')
    .helpCommand('help [command]', 'show help and examples for a command')
    .addHelpText('after', '\nStart here:\n  fewlift tour drawing.svg -o ordered.svg\n  fewlift help tour');
  const finish = (result: number) => {
    code = result;
  };
  program
    .addCommand(tourCommand(finish))
    .addCommand(surveyCommand(finish))
    .addCommand(compareCommand(finish));
  for (const command of [program, ...program.commands]) {
    command.exitOverride().configureOutput({ outputError: (text, write) => write(`fewlift: ${text}`) });
  }
  try {
    await program.parseAsync(args, { from: 'user' });
    return code;
  } catch (error) {
    if (error instanceof Ending) {
      process.stderr.write(`fewlift: ${error.message}\n`);
      return error.code;
    }
    if (error instanceof CommanderError) {
      return error.exitCode === 0 || args.length === 0 ? EXIT.done : EXIT.wrongUsage;
    }
    process.stderr.write(`fewlift: ${unexpected(error)}\n`);
    return EXIT.refused;
  }
}
