import { tableFromIPC } from 'apache-arrow';
import { HOURLY_CHANNELS, MODEL_VERSION } from '@noonwell/engine';
import { cancelRun, columnKeys, retryRun, withWorkspace } from '@noonwell/persistence';
import { runSummarySchema, serializeSummary } from '@noonwell/schema';
import { Gate } from './gate';
import { Stage } from './stage';

describe('a run', () => {
  let stage: Stage;
  let gate: Gate;

  beforeAll(async () => {
    stage = await Stage.create();
    gate = new Gate();
    await stage.startWorker(gate);
  }, 60_000);

  afterAll(async () => {
    gate.open();
    await stage.close();
  });

  afterEach(() => {
    gate.close();
  });

  it('goes from its row through the queue to a stored result', async () => {
    gate.open();
    const { runId } = await stage.queueRun();
    const run = await stage.until(runId, (row) => row.state === 'done');
    expect(run).toMatchObject({
      progress: 1,
      failure: null,
      cancelRequested: false,
      modelVersion: MODEL_VERSION,
    });
    expect(run.engineMs).toBeGreaterThan(0);
    expect(run.startedAt).not.toBeNull();

    const [result, ...more] = await stage.results(runId);
    expect(more).toEqual([]);
    const summary = runSummarySchema.parse(JSON.parse(result?.summary ?? ''));
    expect(serializeSummary(summary)).toBe(result?.summary);
    expect(summary.records).toBe(48);
    const columns = result?.columns ?? new Uint8Array();
    expect(columnKeys(columns)).toEqual(
      expect.arrayContaining(['startLocalMs', ...HOURLY_CHANNELS.map(({ key }) => key), 'tankLayer0']),
    );
    const table = tableFromIPC(columns);
    expect(table.numRows).toBe(48);
    const beamW = table.getChild('beamOnAperture')?.toArray() as Float64Array;
    // One record is an hour, so the sum of mean powers is the energy of the summary.
    expect(beamW.reduce((sum, value) => sum + value, 0) / 1000).toBeCloseTo(summary.beamOnApertureKwh, 9);
  }, 60_000);

  it('shows progress while it runs', async () => {
    const { runId } = await stage.queueRun();
    const run = await stage.until(runId, (row) => row.progress > 0);
    expect(run.state).toBe('running');
    expect(run.progress).toBeGreaterThanOrEqual(0.4);
    expect(run.progress).toBeLessThan(1);
    gate.open();
    await stage.until(runId, (row) => row.state === 'done');
  }, 60_000);

  it('is stopped while it runs, and can be run again', async () => {
    const { runId, workspaceId } = await stage.queueRun();
    await stage.until(runId, (row) => row.state === 'running');
    const inWorkspace = withWorkspace.bind(undefined, stage.orm.em, workspaceId);
    expect(await inWorkspace((em) => cancelRun(em, runId))).toBe(true);
    const cancelled = await stage.until(runId, (row) => row.state === 'cancelled');
    expect(cancelled.finishedAt).not.toBeNull();
    expect(await stage.results(runId)).toEqual([]);
    expect(await inWorkspace((em) => cancelRun(em, runId))).toBe(false);

    gate.open();
    expect(await inWorkspace((em) => retryRun(em, { runId, workspaceId }))).toBe(true);
    const done = await stage.until(runId, (row) => row.state === 'done');
    expect(done).toMatchObject({ attempt: 2, cancelRequested: false });
    expect(await stage.results(runId)).toHaveLength(1);
  }, 60_000);

  it('that the engine refuses fails with the sentence, at once, and can be tried again', async () => {
    gate.open('fail');
    const { runId, workspaceId } = await stage.queueRun();
    const failed = await stage.until(runId, (row) => row.state === 'failed');
    expect(failed.failure).toBe('The run stopped. Receiver, weather record 25: the cells reach 131 °C.');
    expect(failed.attempt).toBe(1);
    expect(await stage.results(runId)).toEqual([]);

    gate.open();
    await withWorkspace(stage.orm.em, workspaceId, (em) => retryRun(em, { runId, workspaceId }));
    const done = await stage.until(runId, (row) => row.state === 'done');
    expect(done).toMatchObject({ attempt: 2, failure: null });
  }, 60_000);

  it('of a scenario that no longer fits the schema names the field', async () => {
    const { runId } = await stage.queueRun({ format: 'something else' });
    const failed = await stage.until(runId, (row) => row.state === 'failed');
    expect(failed.failure).toMatch(/^The scenario cannot be run: .*format/);
  }, 60_000);

  it('is tried again after a fault of our own, and then fails with an honest sentence', async () => {
    gate.open('fault');
    const arrived = gate.arrived;
    const { runId } = await stage.queueRun();
    const failed = await stage.until(runId, (row) => row.state === 'failed');
    expect(gate.arrived - arrived).toBe(3);
    expect(failed.failure).toContain('broke off 3 times for a reason inside Noonwell');
    expect(failed.failure).toContain(runId);
  }, 60_000);
});
