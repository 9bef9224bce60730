import { EntityManager } from '@mikro-orm/postgresql';
import { Injectable, Logger } from '@nestjs/common';
import { ScenarioRow, Study, withWorkspace } from '@noonwell/persistence';
import { STUDENT_QUOTA, type PageQuery, type StudySummary, type StudyView } from '@noonwell/schema';
import { requirePermission, type Principal } from '../access/principal';
import { window, type Page } from '../http/paging';
import { conflict } from '../http/problem';
import { scenarioViews } from './scenario-views';
import { makesSandbox, requireStudy, visibleStudies } from './study-access';
import { studySummaries } from './study-summaries';

@Injectable()
export class StudiesService {
  private readonly log = new Logger('studies');

  constructor(private readonly em: EntityManager) {}

  async list(principal: Principal, query: PageQuery): Promise<Page<StudySummary>> {
    requirePermission(principal, 'study.read');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      const [studies, total] = await em.findAndCount(Study, visibleStudies(principal), {
        populate: ['owner'],
        orderBy: { updatedAt: 'desc', id: 'asc' },
        ...window(query),
      });
      const items = await studySummaries(em, principal, studies);
      return { items, page: query.page, pageSize: query.pageSize, total };
    });
  }

  async get(principal: Principal, id: string): Promise<StudyView> {
    requirePermission(principal, 'study.read');
    return withWorkspace(this.em, principal.workspaceId, async (em) =>
      studyView(em, principal, await requireStudy(em, principal, id, 'read')),
    );
  }

  async create(principal: Principal, input: { name: string; question: string }): Promise<StudyView> {
    requirePermission(principal, 'sandbox.write');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      const sandbox = makesSandbox(principal);
      if (sandbox) await requireRoomForStudy(em, principal);
      const study = em.create(Study, {
        workspaceId: principal.workspaceId,
        ...input,
        sandbox,
        owner: principal.userId,
      });
      await em.flush();
      this.log.log({ userId: principal.userId, studyId: study.id }, 'study made');
      return studyView(em, principal, await requireStudy(em, principal, study.id, 'read'));
    });
  }

  async change(
    principal: Principal,
    id: string,
    change: { name?: string; question?: string },
  ): Promise<StudyView> {
    requirePermission(principal, 'sandbox.write');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      const study = await requireStudy(em, principal, id, 'write');
      study.name = change.name ?? study.name;
      study.question = change.question ?? study.question;
      await em.flush();
      return studyView(em, principal, study);
    });
  }

  /** With its scenarios, versions, runs and results; a run that is under way finds its row gone and stops. */
  async remove(principal: Principal, id: string): Promise<void> {
    requirePermission(principal, 'sandbox.write');
    await withWorkspace(this.em, principal.workspaceId, async (em) => {
      const study = await requireStudy(em, principal, id, 'write');
      await em.nativeDelete(Study, { id: study.id });
    });
    this.log.log({ userId: principal.userId, studyId: id }, 'study removed');
  }
}

export async function studyView(em: EntityManager, principal: Principal, study: Study): Promise<StudyView> {
  const [summary] = await studySummaries(em, principal, [study]);
  if (summary === undefined) throw new Error('A study has one summary.');
  const scenarios = await em.find(ScenarioRow, { study: study.id }, { orderBy: { position: 'asc' } });
  return { ...summary, scenarios: await scenarioViews(em, scenarios) };
}

async function requireRoomForStudy(em: EntityManager, { userId }: Principal): Promise<void> {
  // Two requests at once must not both find the last free place.
  await em.execute('select pg_advisory_xact_lock(hashtextextended(?, 1))', [userId]);
  const own = await em.count(Study, { owner: userId, sandbox: true });
  if (own >= STUDENT_QUOTA.studies) {
    throw conflict(
      'quota-reached',
      `You have ${String(own)} studies of your own, as many as a student may have. Delete one first.`,
    );
  }
}
