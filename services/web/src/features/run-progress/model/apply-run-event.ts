import { ACTIVE_RUN_STATES, type Run, type RunEvent, type StudyView } from '@noonwell/schema';

/**
 * A study with one event worked in. Null where the event tells of something that the study as it is held here
 * does not know (a new run, a new version): then the study has to be read again, because the row in the
 * database is the truth.
 */
export function applyRunEvent(study: StudyView, event: RunEvent): StudyView | null {
  const scenario = study.scenarios.find(({ id }) => id === event.scenarioId);
  const run = scenario?.latestRun;
  if (!scenario || run?.id !== event.runId) return null;
  const next = advance(run, event);
  if (next === run) return study;
  return {
    ...study,
    scenarios: study.scenarios.map((one) => (one === scenario ? { ...one, latestRun: next } : one)),
  };
}

function advance(run: Run, event: RunEvent): Run {
  // Within one attempt progress never falls: events of a pool of connections can overtake each other.
  const sameAttempt = run.state === 'running' && event.state === 'running';
  const progress = sameAttempt ? Math.max(run.progress, event.progress) : event.progress;
  if (run.state === event.state && run.progress === progress && run.failure === event.failure) return run;
  return { ...run, state: event.state, progress, failure: event.failure };
}

/** Whether an event ends a run, so that its result is to be fetched. */
export function endsRun(event: RunEvent): boolean {
  return !ACTIVE_RUN_STATES.includes(event.state);
}
