import { ACTIVE_RUN_STATES, type Run, type RunState, type ScenarioView } from '@noonwell/schema';

/** What a scenario's newest version has to show; "never" when it has not been run. */
export type ShownState = RunState | 'never' | 'stopping';

export const STATE_WORDS: Readonly<Record<ShownState, string>> = {
  never: 'Not run yet',
  queued: 'Waiting',
  running: 'Running',
  stopping: 'Stopping',
  done: 'Done',
  failed: 'Failed',
  cancelled: 'Cancelled',
};

export function shownState(run: Run | null): ShownState {
  if (!run) return 'never';
  return run.cancelRequested && isActive(run) ? 'stopping' : run.state;
}

export function isActive(run: Run | null): boolean {
  return run !== null && ACTIVE_RUN_STATES.includes(run.state);
}

/** Why runs cannot be started, and what to do about it; null when they can. */
export function whyNotRunnable(scenarios: readonly ScenarioView[]): string | null {
  if (scenarios.length === 0) return 'There is nothing to run: add a scenario first.';
  const without = scenarios.filter(({ weatherYearId }) => weatherYearId === null);
  if (without.length > 0) {
    return `${without.map(({ name }) => `“${name}”`).join(', ')} ${without.length === 1 ? 'has' : 'have'} no weather year: choose one for the study first.`;
  }
  return null;
}
