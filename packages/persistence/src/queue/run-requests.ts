import { raw } from '@mikro-orm/core';
import type { EntityManager } from '@mikro-orm/postgresql';
import { ACTIVE_RUN_STATES, RUN_YEAR_QUEUE, type RunYearJob } from '@noonwell/schema';
import { randomUUID } from 'node:crypto';
import { OutboxMessage } from '../runs/outbox.entity.js';
import { RunRow } from '../runs/run.entity.js';

/*
 * What people ask of a run. Each function is called inside `withWorkspace`, after the caller's service has decided
 * that the person may ask it; the conditions of its one UPDATE decide what happens when worker and person act at
 * the same time.
 */

export interface RunRequest {
  readonly workspaceId: string;
  readonly studyId: string;
  readonly scenarioId: string;
  readonly scenarioVersionId: string;
  readonly weatherYearId: string;
  readonly modelVersion: string;
  readonly requestedById: string;
}

/**
 * The queued, running or done run that answers the request: the one there is, or a new one with its message for
 * the queue, both in the caller's transaction.
 */
export async function requestRun(em: EntityManager, request: RunRequest): Promise<string> {
  const id = randomUUID();
  // Two people may ask at once: the unique index lets one in, and the other gets that one's run.
  await em
    .createQueryBuilder(RunRow)
    .insert({
      id,
      workspaceId: request.workspaceId,
      study: request.studyId,
      scenario: request.scenarioId,
      scenarioVersion: request.scenarioVersionId,
      weatherYear: request.weatherYearId,
      modelVersion: request.modelVersion,
      requestedBy: request.requestedById,
      state: 'queued',
      progress: 0,
      failure: null,
      claimToken: null,
      createdAt: new Date(),
    })
    .onConflict()
    .ignore()
    .execute();
  const answer = await em.findOne(
    RunRow,
    {
      scenarioVersion: request.scenarioVersionId,
      weatherYear: request.weatherYearId,
      modelVersion: request.modelVersion,
      state: { $in: [...ACTIVE_RUN_STATES, 'done'] },
    },
    { fields: ['id'] },
  );
  // The one that stood in the way failed since.
  if (answer === null) return requestRun(em, request);
  if (answer.id === id) await putInOutbox(em, { runId: id, workspaceId: request.workspaceId });
  return answer.id;
}

/**
 * Asks for the end of a run. One that waits is cancelled at once; one that runs is told, and ends as cancelled
 * unless it finishes first.
 * @returns false when it had already ended
 */
export async function cancelRun(em: EntityManager, runId: string): Promise<boolean> {
  const changed = await em.nativeUpdate(
    RunRow,
    { id: runId, state: { $in: [...ACTIVE_RUN_STATES] } },
    {
      cancelRequested: true,
      state: raw("case when state = 'queued' then 'cancelled' else state end"),
      finishedAt: raw("case when state = 'queued' then now() end"),
    },
  );
  return changed === 1;
}

/**
 * Queues a failed or cancelled run again under its own id.
 * @returns false when it has not ended that way
 * @throws UniqueConstraintViolationException when another run already answers the same question
 */
export async function retryRun(em: EntityManager, job: RunYearJob): Promise<boolean> {
  const changed = await em.nativeUpdate(
    RunRow,
    { id: job.runId, state: { $in: ['failed', 'cancelled'] } },
    {
      state: 'queued',
      attempt: raw('attempt + 1'),
      progress: 0,
      failure: null,
      cancelRequested: false,
      claimToken: null,
      startedAt: null,
      finishedAt: null,
      engineMs: null,
    },
  );
  if (changed === 1) await putInOutbox(em, job);
  return changed === 1;
}

/** Leaves word that the run's job must reach the queue; the relay takes it there once this transaction commits. */
export async function putInOutbox(em: EntityManager, job: RunYearJob): Promise<void> {
  await em.insert(OutboxMessage, {
    workspaceId: job.workspaceId,
    runId: job.runId,
    queue: RUN_YEAR_QUEUE,
    payload: job,
    createdAt: new Date(),
  });
}

/**
 * Leaves word again for a run that waits although its job is gone.
 * @returns false when the run no longer waits or the word is still on its way
 */
export async function resendRun(em: EntityManager, job: RunYearJob): Promise<boolean> {
  const waiting = await em.count(RunRow, { id: job.runId, state: 'queued' });
  const onItsWay = await em.count(OutboxMessage, { runId: job.runId });
  if (waiting === 0 || onItsWay > 0) return false;
  await putInOutbox(em, job);
  return true;
}
