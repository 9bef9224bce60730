/** Two sessions act on one run, in every order of their steps that PostgreSQL allows. */
import { MODEL_VERSION } from '@noonwell/engine';
import {
  cancelRun,
  claimRun,
  recordFailure,
  reportProgress,
  requestRun,
  retryRun,
  storeResult,
  withWorkspace,
} from '@noonwell/persistence';
import { OUTCOME, Stage } from './stage';

type Work<Result> = Parameters<typeof withWorkspace<Result>>[2];

describe('one run', () => {
  let stage: Stage;

  beforeAll(async () => {
    stage = await Stage.create();
  });

  afterAll(async () => {
    await stage.close();
  });

  const inWorkspace = <Result>(work: Work<Result>) => withWorkspace(stage.orm.em, stage.ids.workspace, work);

  /** Does the first step, starts the second in another session while the first is uncommitted, then commits. */
  async function overlapping<First, Second>(
    first: Work<First>,
    second: Work<Second>,
  ): Promise<[First, Second]> {
    let startSecond: Promise<Second> | undefined;
    const firstResult = await inWorkspace(async (em) => {
      const result = await first(em);
      startSecond = inWorkspace(second);
      await stage.untilBlocked();
      return result;
    });
    if (startSecond === undefined) throw new Error('The second session was not started.');
    return [firstResult, await startSecond];
  }

  async function running(token = 'a'): Promise<{ runId: string; token: string }> {
    const { runId } = await stage.queueRun();
    const claim = { runId, token };
    await inWorkspace((em) => claimRun(em, claim));
    return claim;
  }

  const cancel =
    (runId: string): Work<boolean> =>
    (em) =>
      cancelRun(em, runId);
  const finish =
    (claim: { runId: string; token: string }): Work<string> =>
    (em) =>
      storeResult(em, claim, stage.ids.workspace, OUTCOME);

  it('claimed by two workers is finished by the later one, once', async () => {
    const { runId } = await stage.queueRun();
    const [a, b] = [
      { runId, token: 'a' },
      { runId, token: 'b' },
    ];
    await overlapping(
      (em) => claimRun(em, a),
      (em) => claimRun(em, b),
    );
    expect((await stage.run(runId)).claimToken).toBe('b');
    expect(await inWorkspace((em) => reportProgress(em, a, 0.9))).toBe('claim lost');
    expect(await inWorkspace(finish(a))).toBe('claim lost');
    expect(await inWorkspace((em) => recordFailure(em, a, 'too late'))).toBe(false);
    expect((await stage.run(runId)).progress).toBe(0);
    expect(await inWorkspace(finish(b))).toBe('stored');
    expect(await stage.results(runId)).toHaveLength(1);
  });

  it('finished twice by the same worker stores once', async () => {
    const claim = await running();
    expect(await overlapping(finish(claim), finish(claim))).toEqual(['stored', 'claim lost']);
    expect(await stage.results(claim.runId)).toHaveLength(1);
  });

  it('finished just before it is cancelled stays done', async () => {
    const claim = await running();
    expect(await overlapping(finish(claim), cancel(claim.runId))).toEqual(['stored', false]);
    expect(await stage.run(claim.runId)).toMatchObject({ state: 'done', cancelRequested: false });
    expect(await stage.results(claim.runId)).toHaveLength(1);
  });

  it('cancelled just before it is finished stays cancelled, without a result', async () => {
    const claim = await running();
    expect(await overlapping(cancel(claim.runId), finish(claim))).toEqual([true, 'cancelled']);
    expect((await stage.run(claim.runId)).state).toBe('cancelled');
    expect(await stage.results(claim.runId)).toEqual([]);
  });

  it('cancelled just before a worker takes it is never run', async () => {
    const { runId } = await stage.queueRun();
    const [, claimed] = await overlapping(cancel(runId), (em) => claimRun(em, { runId, token: 'a' }));
    expect(claimed).toBe('nothing to do');
    expect((await stage.run(runId)).state).toBe('cancelled');
  });

  it('taken just before it is cancelled is told so at its next report', async () => {
    const { runId } = await stage.queueRun();
    const claim = { runId, token: 'a' };
    const [, cancelled] = await overlapping((em) => claimRun(em, claim), cancel(runId));
    expect(cancelled).toBe(true);
    expect(await stage.run(runId)).toMatchObject({ state: 'running', cancelRequested: true });
    expect(await inWorkspace((em) => reportProgress(em, claim, 0.1))).toBe('cancel');
  });

  it('that failed and is tried again by two people at once is queued once', async () => {
    const claim = await running();
    await inWorkspace((em) => recordFailure(em, claim, 'no sun'));
    const job = { runId: claim.runId, workspaceId: stage.ids.workspace };
    const retry: Work<boolean> = (em) => retryRun(em, job);
    expect(await overlapping(retry, retry)).toEqual([true, false]);
    expect(await stage.run(claim.runId)).toMatchObject({ state: 'queued', attempt: 2, failure: null });
  });

  it('asked for by two people at once is one run with one message', async () => {
    const { runId } = await stage.queueRun();
    const { scenarioVersion } = await stage.run(runId);
    await inWorkspace((em) => cancelRun(em, runId));
    const ask: Work<string> = (em) =>
      requestRun(em, {
        workspaceId: stage.ids.workspace,
        studyId: stage.ids.study,
        scenarioId: stage.ids.scenario,
        scenarioVersionId: scenarioVersion.id,
        weatherYearId: stage.ids.weather,
        modelVersion: MODEL_VERSION,
        requestedById: stage.ids.user,
      });
    const [first, second] = await overlapping(ask, ask);
    expect(second).toBe(first);
    expect(first).not.toBe(runId);
    expect(await stage.messagesOf(first)).toHaveLength(1);
  });

  it('shows progress that never falls, although a second worker starts over', async () => {
    const claim = await running();
    await inWorkspace((em) => reportProgress(em, claim, 0.7));
    const later = { ...claim, token: 'b' };
    await inWorkspace((em) => claimRun(em, later));
    await inWorkspace((em) => reportProgress(em, later, 0.2));
    expect((await stage.run(claim.runId)).progress).toBe(0.7);
    await inWorkspace((em) => reportProgress(em, later, 0.8));
    expect((await stage.run(claim.runId)).progress).toBe(0.8);
  });
});
