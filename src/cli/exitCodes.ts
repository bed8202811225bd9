/** What the process ends with. Several files: the highest. */
export const EXIT = {
  done: 0,
  checkFailed: 1,
  wrongUsage: 2,
  notRead: 3,
  refused: 4,
  notWritten: 5,
  interrupted: 130,
} as const;

/** An end of one job with a code and a message of a line or two for the terminal. */
export class Ending extends Error {
  constructor(
    readonly code: number,
    message: string,
  ) {
    super(message);
  }
}

/** One line for what nobody foresaw, instead of a stack trace; DEBUG shows where it came from. */
export function unexpected(error: unknown): string {
  const what = error instanceof Error ? error.message : String(error);
  const where = process.env.DEBUG && error instanceof Error ? `\n${error.stack}` : '';
  return `something unforeseen went wrong (${what}); nothing was written${where}`;
}
