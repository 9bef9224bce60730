/** Exit codes of the command line. */
export const EXIT = { done: 0, failedRun: 1, badInput: 2 } as const;
export type ExitCode = (typeof EXIT)[keyof typeof EXIT];

/** Ends a command with plain sentences on standard error and an exit code. */
export class CommandError extends Error {
  override readonly name = 'CommandError';

  constructor(
    readonly exitCode: Exclude<ExitCode, 0>,
    readonly sentences: readonly string[],
  ) {
    super(sentences.join('\n'));
  }
}

export function badInput(...sentences: string[]): CommandError {
  return new CommandError(EXIT.badInput, sentences);
}

/** Where a command writes and from where it takes relative paths. */
export interface Surroundings {
  readonly folder: string;
  readonly out: (text: string) => void;
  readonly err: (text: string) => void;
  /** Standard error is a terminal that a person watches. */
  readonly isWatched: boolean;
}
