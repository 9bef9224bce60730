import { MODEL_VERSION } from '@noonwell/engine';
import { newScenario, type Run, type RunEvent, type StudyView } from '@noonwell/schema';
import { describe, expect, it } from 'vitest';
import { applyRunEvent, endsRun } from './apply-run-event.js';
import { shownState, whyNotRunnable } from './run-words.js';
import { observe, secondsLeft, timeLeftWords } from './time-left.js';

const ID = (digit: number) => `00000000-0000-4000-8000-00000000000${digit}`;
const AT = '2001-06-21T12:00:00Z';

function run(changes: Partial<Run> = {}): Run {
  return {
    id: ID(3),
    studyId: ID(1),
    scenarioId: ID(2),
    scenarioVersionId: ID(4),
    scenarioVersion: 1,
    weatherYearId: ID(5),
    state: 'queued',
    progress: 0,
    failure: null,
    cancelRequested: false,
    modelVersion: MODEL_VERSION,
    createdAt: AT,
    startedAt: null,
    finishedAt: null,
    engineMs: null,
    summary: null,
    ...changes,
  };
}

function study(latestRun: Run | null): StudyView {
  return {
    id: ID(1),
    name: 'Study',
    question: '',
    sandbox: false,
    ownerName: 'Somebody',
    scenarioCount: 1,
    weatherYears: [],
    activeRuns: 0,
    lastRunFinishedAt: null,
    updatedAt: AT,
    mayWrite: true,
    scenarios: [
      {
        id: ID(2),
        studyId: ID(1),
        name: 'Coil',
        position: 0,
        version: 1,
        versionId: ID(4),
        document: newScenario('coil'),
        weatherYearId: ID(5),
        weatherYearName: 'Invented desert',
        updatedAt: AT,
        latestRun,
      },
    ],
  };
}

const event = (changes: Partial<RunEvent> = {}): RunEvent => ({
  runId: ID(3),
  scenarioId: ID(2),
  state: 'running',
  progress: 0.5,
  failure: null,
  ...changes,
});

describe('events of a study', () => {
  it('move the run they name', () => {
    expect(applyRunEvent(study(run()), event())?.scenarios[0]?.latestRun).toMatchObject({
      state: 'running',
      progress: 0.5,
    });
  });

  it('never move progress back within an attempt', () => {
    const before = study(run({ state: 'running', progress: 0.7 }));
    expect(applyRunEvent(before, event({ progress: 0.5 }))).toBe(before);
  });

  it('let a retry begin at nothing again', () => {
    const after = applyRunEvent(
      study(run({ state: 'failed', progress: 0.7, failure: 'x' })),
      event({ state: 'queued', progress: 0 }),
    );
    expect(after?.scenarios[0]?.latestRun).toMatchObject({ state: 'queued', progress: 0, failure: null });
  });

  it('ask for the study to be read again when they name a run it does not know', () => {
    expect(applyRunEvent(study(null), event())).toBeNull();
    expect(applyRunEvent(study(run()), event({ runId: ID(9) }))).toBeNull();
    expect(applyRunEvent(study(run()), event({ scenarioId: ID(9) }))).toBeNull();
  });

  it('tell an end from a step', () => {
    expect(endsRun(event())).toBe(false);
    expect(endsRun(event({ state: 'failed' }))).toBe(true);
  });
});

describe('time left', () => {
  it('follows the pace since the run was first seen', () => {
    const pace = observe(observe(undefined, 0.2, 1000), 0.4, 3000);
    expect(secondsLeft(pace)).toBeCloseTo(6);
  });

  it('is unknown until something has moved', () => {
    expect(secondsLeft(undefined)).toBeNull();
    expect(secondsLeft(observe(undefined, 0.2, 1000))).toBeNull();
  });

  it('starts over when progress falls', () => {
    expect(secondsLeft(observe(observe(undefined, 0.8, 1000), 0.1, 2000))).toBeNull();
  });

  it('is said in whole seconds, then in minutes', () => {
    expect([null, 0.2, 5.1, 61].map(timeLeftWords)).toEqual([
      null,
      'about a second left',
      'about 6 s left',
      'about 2 min left',
    ]);
  });
});

describe('what stands in the way', () => {
  it('names the scenarios without a weather year', () => {
    const { scenarios } = study(null);
    expect(whyNotRunnable(scenarios)).toBeNull();
    expect(whyNotRunnable([])).toMatch(/add a scenario/);
    expect(whyNotRunnable(scenarios.map((one) => ({ ...one, weatherYearId: null })))).toBe(
      '“Coil” has no weather year: choose one for the study first.',
    );
  });

  it('shows a run that was asked to stop as stopping until it has stopped', () => {
    expect(shownState(run({ state: 'running', cancelRequested: true }))).toBe('stopping');
    expect(shownState(run({ state: 'cancelled', cancelRequested: true }))).toBe('cancelled');
    expect(shownState(null)).toBe('never');
  });
});
