import type { EntityManager, FilterQuery } from '@mikro-orm/postgresql';
import { ScenarioRow, Study } from '@noonwell/persistence';
import { ROLE_LABELS, roleMay } from '@noonwell/schema';
import type { Principal } from '../access/principal';
import { forbidden, notFound, ProblemException } from '../http/problem';

/*
 * Who sees and who changes a study. Shared studies: everybody in the workspace reads them, those with study.write
 * change them. A student's own (sandbox): its owner and administrators, for everybody else it does not exist.
 */

/** Condition that a listed study must meet. */
export function visibleStudies({ role, userId }: Principal): FilterQuery<Study> {
  return role === 'admin' ? {} : { $or: [{ sandbox: false }, { owner: userId }] };
}

export function mayWriteStudy({ role, userId }: Principal, study: Study): boolean {
  if (roleMay(role, 'study.write')) return !study.sandbox || role === 'admin' || study.owner.id === userId;
  return roleMay(role, 'sandbox.write') && study.sandbox && study.owner.id === userId;
}

/** Whether what somebody makes is theirs alone: a student's studies are. */
export function makesSandbox({ role }: Principal): boolean {
  return !roleMay(role, 'study.write');
}

/**
 * The study, if the person may do that with it. Whoever changes a study or anything in it waits here for those who
 * do so already: what is read afterwards is neither changed nor deleted under one's hands.
 * @throws ProblemException 404 where they may not see it, 403 where they may only read it
 */
export async function requireStudy(
  em: EntityManager,
  principal: Principal,
  id: string,
  wanted: 'read' | 'write',
): Promise<Study> {
  if (wanted === 'write') await em.execute('select 1 from studies where id = ? for no key update', [id]);
  const study = await em.findOne(
    Study,
    { $and: [{ id }, visibleStudies(principal)] },
    { populate: ['owner'] },
  );
  if (study === null) throw notFound('study');
  if (wanted === 'write' && !mayWriteStudy(principal, study)) {
    throw forbidden(
      `"${study.name}" is shared: the role ${ROLE_LABELS[principal.role]} may read it and change only studies of its own.`,
    );
  }
  return study;
}

/** The scenario with its study, by the same rules. */
export async function requireScenario(
  em: EntityManager,
  principal: Principal,
  id: string,
  wanted: 'read' | 'write',
): Promise<{ scenario: ScenarioRow; study: Study }> {
  const scenario = await em.findOne(ScenarioRow, { id });
  if (scenario === null) throw notFound('scenario');
  try {
    const study = await requireStudy(em, principal, scenario.study.id, wanted);
    // Saved or deleted by whoever was waited for.
    if (wanted === 'write' && (await em.refresh(scenario)) === null) throw notFound('scenario');
    return { scenario, study };
  } catch (error) {
    // A hidden study's scenario must not be told apart from one that does not exist.
    if (error instanceof ProblemException && error.getStatus() === 404) throw notFound('scenario');
    throw error;
  }
}
