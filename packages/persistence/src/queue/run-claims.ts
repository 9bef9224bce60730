import { raw } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import { ACTIVE_RUN_STATES, type RunYearJob } from '@noonwell/schema';
import { RunResultRow } from '../runs/run-result.entity.js';
import { RunRow } from '../runs/run.entity.js';
import { ScenarioVersion } from '../studies/scenario-version.entity.js';
import { WeatherColumns } from '../weather/weather-bytes.entity.js';
import { putInOutbox } from './run-requests.js';

/*
 * What a worker does with a run, inside `withWorkspace`. A worker holds a run by its claim token. A later claim
 * takes the run over (the earlier worker was thought dead), and from then on nothing the earlier one writes counts.
 */

export interface RunClaim {
  readonly runId: string;
  /** Unique to one worker's one try. */
  readonly token: string;
}

export interface ClaimedRun {
  readonly modelVersion: string;
  /** As stored: to be parsed. */
  readonly document: unknown;
  /** As `encodeWeatherYear` wrote it. */
  readonly weatherBytes: Uint8Array;
}

/** Takes the run, or says that there is nothing to do: it has ended, was cancelled, or is gone. */
export async function claimRun(em: EntityManager, claim: RunClaim): Promise<ClaimedRun | 'nothing to do'> {
  const changed = await em.nativeUpdate(
    RunRow,
    { id: claim.runId, state: { $in: [...ACTIVE_RUN_STATES] }, cancelRequested: false },
    {
      state: 'running',
      claimToken: claim.token,
      startedAt: raw('coalesce(started_at, now())'),
    },
  );
  if (changed === 0) {
    await endAsCancelled(em, { id: claim.runId });
    return 'nothing to do';
  }
  const run = await em.findOneOrFail(RunRow, { id: claim.runId });
  const version = await em.findOneOrFail(ScenarioVersion, { id: run.scenarioVersion.id });
  const weather = await em.findOneOrFail(WeatherColumns, { weatherYearId: run.weatherYear.id });
  return { modelVersion: run.modelVersion, document: version.document, weatherBytes: weather.bytes };
}

/** Progress so far, 0 to 1; a smaller one than the row holds (a second worker starts over) leaves it as it is. */
export async function reportProgress(
  em: EntityManager,
  claim: RunClaim,
  progress: number,
): Promise<'go on' | 'cancel' | 'claim lost'> {
  const changed = await em.nativeUpdate(RunRow, held(claim), {
    progress: raw('greatest(progress, ?)', [progress]),
  });
  if (changed === 0) return 'claim lost';
  const run = await em.findOneOrFail(RunRow, { id: claim.runId }, { fields: ['cancelRequested'] });
  return run.cancelRequested ? 'cancel' : 'go on';
}

export interface RunOutcome {
  readonly modelVersion: string;
  /** `serializeSummary`. */
  readonly summary: string;
  /** Arrow IPC stream. */
  readonly columns: Uint8Array;
  readonly engineMs: number;
}

/**
 * Stores the result and makes the run done: both or neither. Of cancelling and finishing the first to commit
 * wins; of two workers the one that holds the claim.
 */
export async function storeResult(
  em: EntityManager,
  claim: RunClaim,
  workspaceId: string,
  outcome: RunOutcome,
): Promise<'stored' | 'cancelled' | 'claim lost'> {
  const finishedAt = new Date();
  const changed = await em.nativeUpdate(
    RunRow,
    { ...held(claim), cancelRequested: false },
    { state: 'done', progress: 1, claimToken: null, finishedAt, engineMs: outcome.engineMs },
  );
  if (changed === 0) return (await endAsCancelled(em, held(claim))) ? 'cancelled' : 'claim lost';
  await em.insert(RunResultRow, {
    runId: claim.runId,
    workspaceId,
    modelVersion: outcome.modelVersion,
    summary: outcome.summary,
    columns: outcome.columns,
    createdAt: finishedAt,
  });
  return 'stored';
}

/** Ends the run as failed, for good until a person asks for another try. */
export async function recordFailure(em: EntityManager, claim: RunClaim, failure: string): Promise<boolean> {
  if (await endAsCancelled(em, held(claim))) return false;
  const changed = await em.nativeUpdate(RunRow, held(claim), {
    state: 'failed',
    failure,
    claimToken: null,
    finishedAt: new Date(),
  });
  return changed === 1;
}

export function recordCancelled(em: EntityManager, claim: RunClaim): Promise<boolean> {
  return endAsCancelled(em, held(claim));
}

/** Gives the run back unfinished: it waits again, and its job must reach the queue anew. */
export async function requeueRun(em: EntityManager, claim: RunClaim, job: RunYearJob): Promise<boolean> {
  const changed = await em.nativeUpdate(
    RunRow,
    { ...held(claim), cancelRequested: false },
    { state: 'queued', claimToken: null },
  );
  if (changed === 1) await putInOutbox(em, job);
  return changed === 1;
}

const held = (claim: RunClaim) => ({ id: claim.runId, claimToken: claim.token, state: 'running' as const });

/** Ends the run as cancelled where that was asked for while it ran. */
async function endAsCancelled(
  em: EntityManager,
  which: { id: string; claimToken?: string },
): Promise<boolean> {
  const changed = await em.nativeUpdate(
    RunRow,
    { ...which, state: 'running', cancelRequested: true },
    { state: 'cancelled', claimToken: null, finishedAt: new Date() },
  );
  return changed === 1;
}
