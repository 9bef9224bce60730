import type { EntityManager } from '@mikro-orm/postgresql';
import { RunRow } from '@noonwell/persistence';
import { ACTIVE_RUN_STATES, STUDENT_QUOTA } from '@noonwell/schema';
import type { Principal } from '../access/principal';
import { conflict, notFound, ProblemException } from '../http/problem';
import { makesSandbox, requireStudy } from '../studies/study-access';

/**
 * The run, if the person may do that with its study.
 * @throws ProblemException 404 where they may not see it, 403 where they may only read it
 */
export async function requireRun(
  em: EntityManager,
  principal: Principal,
  id: string,
  wanted: 'read' | 'write',
): Promise<RunRow> {
  const run = await em.findOne(RunRow, { id });
  if (run === null) throw notFound('run');
  try {
    await requireStudy(em, principal, run.study.id, wanted);
  } catch (error) {
    // A hidden study's run must not be told apart from one that does not exist.
    if (error instanceof ProblemException && error.getStatus() === 404) throw notFound('run');
    throw error;
  }
  return run;
}

/**
 * Lets a student have only so many runs waiting or running. Holds until the transaction ends, so that two
 * requests at once do not both find the last free place.
 */
export async function requireRoomForRuns(
  em: EntityManager,
  principal: Principal,
  wanted: number,
): Promise<void> {
  if (!makesSandbox(principal)) return;
  await em.execute('select pg_advisory_xact_lock(hashtextextended(?, 2))', [principal.userId]);
  const active = await em.count(RunRow, {
    requestedBy: principal.userId,
    state: { $in: [...ACTIVE_RUN_STATES] },
  });
  if (active + wanted <= STUDENT_QUOTA.activeRuns) return;
  throw conflict(
    'quota-reached',
    `A student may have ${String(STUDENT_QUOTA.activeRuns)} runs waiting or running at once; you have ${String(active)} and asked for ${String(wanted)} more. Wait for one to finish or cancel it.`,
  );
}
