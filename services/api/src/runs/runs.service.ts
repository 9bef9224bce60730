import { UniqueConstraintViolationException } from '@mikro-orm/core';
import { EntityManager } from '@mikro-orm/postgresql';
import { HttpStatus, Injectable, Logger } from '@nestjs/common';
import {
  ColumnsError,
  RunResultRow,
  RunRow,
  cancelRun,
  retryRun,
  selectColumns,
  withWorkspace,
} from '@noonwell/persistence';
import type { PageQuery, Run } from '@noonwell/schema';
import { requirePermission, type Principal } from '../access/principal';
import { window, type Page } from '../http/paging';
import { conflict, notFound, ProblemException } from '../http/problem';
import { runViews } from '../studies/run-view';
import { requireStudy } from '../studies/study-access';
import { requireRoomForRuns, requireRun } from './run-access';
import { startRuns } from './start-runs';

/** Comes with every choice of channels: nothing can be drawn without it. */
const TIME_COLUMN = 'startLocalMs';

@Injectable()
export class RunsService {
  private readonly log = new Logger('runs');

  constructor(private readonly em: EntityManager) {}

  async start(
    principal: Principal,
    studyId: string,
    scenarioIds: readonly string[] | undefined,
  ): Promise<{ runs: Run[] }> {
    requirePermission(principal, 'run.write');
    const runs = await withWorkspace(this.em, principal.workspaceId, async (em) =>
      runViews(em, await startRuns(em, principal, studyId, scenarioIds)),
    );
    this.log.log({ userId: principal.userId, studyId, runIds: runs.map(({ id }) => id) }, 'runs asked for');
    return { runs };
  }

  async list(principal: Principal, studyId: string, query: PageQuery): Promise<Page<Run>> {
    requirePermission(principal, 'run.read');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      const study = await requireStudy(em, principal, studyId, 'read');
      const [rows, total] = await em.findAndCount(
        RunRow,
        { study: study.id },
        { fields: ['id'], orderBy: { createdAt: 'desc', id: 'asc' }, ...window(query) },
      );
      const items = await runViews(
        em,
        rows.map(({ id }) => id),
      );
      return { items, page: query.page, pageSize: query.pageSize, total };
    });
  }

  async get(principal: Principal, id: string): Promise<Run> {
    requirePermission(principal, 'run.read');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      await requireRun(em, principal, id, 'read');
      return oneView(em, id);
    });
  }

  /** Asks for the run's end; the answer shows how it stands. One that has ended meanwhile stays as it ended. */
  async cancel(principal: Principal, id: string): Promise<Run> {
    requirePermission(principal, 'run.write');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      await requireRun(em, principal, id, 'write');
      if (await cancelRun(em, id)) {
        this.log.log({ userId: principal.userId, runId: id }, 'cancelling asked for');
      }
      return oneView(em, id);
    });
  }

  /** Queues a run that failed or was cancelled once more. */
  async retry(principal: Principal, id: string): Promise<Run> {
    requirePermission(principal, 'run.write');
    const { workspaceId } = principal;
    try {
      const run = await withWorkspace(this.em, workspaceId, async (em) => {
        await requireRun(em, principal, id, 'write');
        await requireRoomForRuns(em, principal, 1);
        if (!(await retryRun(em, { runId: id, workspaceId }))) {
          throw conflict(
            'run-not-ended',
            'Only a run that failed or was cancelled can be tried again. This one waits, runs or is done.',
          );
        }
        return oneView(em, id);
      });
      this.log.log({ userId: principal.userId, runId: id }, 'run asked for again');
      return run;
    } catch (error) {
      if (!(error instanceof UniqueConstraintViolationException)) throw error;
      throw conflict(
        'result-exists',
        'Another run of the same version on the same weather year waits, runs or is done: see that one.',
      );
    }
  }

  /** The summary as text, the same bytes as the command line prints. */
  async summary(principal: Principal, id: string): Promise<string> {
    requirePermission(principal, 'run.read');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      await requireResult(em, principal, id);
      const result = await em.findOneOrFail(RunResultRow, { runId: id }, { fields: ['summary'] });
      return result.summary;
    });
  }

  /** Hourly columns as an Arrow IPC stream: all, or the start times and the named ones. */
  async columns(
    principal: Principal,
    id: string,
    channels: readonly string[] | undefined,
  ): Promise<Uint8Array> {
    requirePermission(principal, 'run.read');
    const { columns } = await withWorkspace(this.em, principal.workspaceId, async (em) => {
      await requireResult(em, principal, id);
      return em.findOneOrFail(RunResultRow, { runId: id }, { fields: ['columns'] });
    });
    if (channels === undefined) return columns;
    try {
      return selectColumns(columns, [...new Set([TIME_COLUMN, ...channels])]);
    } catch (error) {
      if (!(error instanceof ColumnsError)) throw error;
      throw new ProblemException(HttpStatus.BAD_REQUEST, 'There is no such channel', error.message, {
        kind: 'invalid-input',
        errors: [{ path: 'channels', reason: error.message }],
      });
    }
  }
}

async function requireResult(em: EntityManager, principal: Principal, id: string): Promise<void> {
  const run = await requireRun(em, principal, id, 'read');
  if (run.state === 'done') return;
  throw conflict('run-not-finished', `This run has no result: its state is "${run.state}".`);
}

async function oneView(em: EntityManager, id: string): Promise<Run> {
  // What was read before the change must not be shown after it.
  em.clear();
  const [run] = await runViews(em, [id]);
  if (run === undefined) throw notFound('run');
  return run;
}
