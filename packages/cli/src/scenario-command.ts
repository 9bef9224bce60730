import { newScenario, RECEIVER_KINDS, serializeScenario } from '@noonwell/schema';
import { scenarioHelp } from './help.js';
import { readOptions } from './options.js';
import { badInput, type Surroundings } from './outcome.js';

/** `noonwell scenario new`: a complete default scenario on standard output. */
export function scenarioCommand(args: readonly string[], around: Surroundings): void {
  const { values, positionals } = readOptions(args, 'scenario', {
    receiver: { type: 'string' },
    help: { type: 'boolean', short: 'h' },
  });
  if (values.help === true) {
    around.out(scenarioHelp());
    return;
  }
  if (positionals.length !== 1 || positionals[0] !== 'new') {
    throw badInput(
      positionals.length === 0
        ? 'What to do with a scenario is missing.'
        : `"scenario ${positionals.join(' ')}" is not known.`,
      `Write: noonwell scenario new [--receiver ${RECEIVER_KINDS.join('|')}]`,
    );
  }
  const wanted = values.receiver ?? RECEIVER_KINDS[0];
  const receiver = RECEIVER_KINDS.find((kind) => kind === wanted);
  if (receiver === undefined) {
    throw badInput(`There is no receiver "${wanted}"; there are: ${RECEIVER_KINDS.join(', ')}.`);
  }
  around.out(serializeScenario(newScenario(receiver)));
}
