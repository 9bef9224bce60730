import { readFileSync } from 'node:fs';
import { DomainError, MODEL_VERSION, RunError } from '@noonwell/engine';
import { MAIN_HELP } from './help.js';
import { badInput, CommandError, EXIT, type ExitCode, type Surroundings } from './outcome.js';
import { runCommand } from './run-command.js';
import { scenarioCommand } from './scenario-command.js';

type Command = (args: readonly string[], around: Surroundings) => Promise<void> | void;

/** A new command is a new file and one line here (and one in the help). */
const COMMANDS: Readonly<Record<string, Command>> = { run: runCommand, scenario: scenarioCommand };

/** Runs one command; never throws: what goes wrong becomes sentences on standard error and an exit code. */
export async function runCommandLine(args: readonly string[], around: Surroundings): Promise<ExitCode> {
  try {
    await dispatch(args, around);
    return EXIT.done;
  } catch (error) {
    const { exitCode, sentences } = asCommandError(error);
    around.err(sentences.map((sentence) => `${sentence}\n`).join(''));
    return exitCode;
  }
}

async function dispatch(args: readonly string[], around: Surroundings): Promise<void> {
  const [name, ...rest] = args;
  if (name === '--help' || name === '-h' || name === 'help') {
    around.out(MAIN_HELP);
    return;
  }
  if (name === '--version' || name === '-v') {
    around.out(`noonwell ${packageVersion()}, calculation ${MODEL_VERSION}\n`);
    return;
  }
  if (name === undefined) throw badInput('A command is needed.', MAIN_HELP.trimEnd());
  const command = Object.hasOwn(COMMANDS, name) ? COMMANDS[name] : undefined;
  if (command === undefined) {
    throw badInput(
      `There is no command "${name}"; there are: ${Object.keys(COMMANDS).join(', ')}.`,
      'Try: noonwell --help',
    );
  }
  await command(rest, around);
}

function asCommandError(error: unknown): CommandError {
  if (error instanceof CommandError) return error;
  if (error instanceof RunError)
    return new CommandError(EXIT.failedRun, [`The run failed in ${error.message}.`]);
  if (error instanceof DomainError)
    return badInput(`The machine or its weather cannot be calculated: ${error.message}.`);
  const reason = error instanceof Error ? error.message : String(error);
  return new CommandError(EXIT.failedRun, [`The command failed: ${reason}`]);
}

function packageVersion(): string {
  const content: unknown = JSON.parse(readFileSync(new URL('../package.json', import.meta.url), 'utf8'));
  const hasVersion = typeof content === 'object' && content !== null && 'version' in content;
  return hasVersion ? String(content.version) : 'unknown';
}
