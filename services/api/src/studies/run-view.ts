import type { EntityManager } from '@mikro-orm/postgresql';
import { RunResultRow, RunRow } from '@noonwell/persistence';
import { runSummarySchema, type Run, type RunSummary } from '@noonwell/schema';

/** A stored summary is text; parsing gives the schema's order of keys again. */
export function readSummary(text: string): RunSummary {
  return runSummarySchema.parse(JSON.parse(text));
}

/** Needs `scenarioVersion` populated. */
export function runView(run: RunRow, summary: RunSummary | null): Run {
  return {
    id: run.id,
    studyId: run.study.id,
    scenarioId: run.scenario.id,
    scenarioVersionId: run.scenarioVersion.id,
    scenarioVersion: run.scenarioVersion.getEntity().version,
    weatherYearId: run.weatherYear.id,
    state: run.state,
    progress: run.progress,
    failure: run.failure ?? null,
    cancelRequested: run.cancelRequested,
    modelVersion: run.modelVersion,
    createdAt: run.createdAt.toISOString(),
    startedAt: run.startedAt?.toISOString() ?? null,
    finishedAt: run.finishedAt?.toISOString() ?? null,
    engineMs: run.engineMs ?? null,
    summary,
  };
}

/** Runs as the API shows them, in the order of the ids; ids that are not there are left out. */
export async function runViews(em: EntityManager, ids: readonly string[]): Promise<Run[]> {
  if (ids.length === 0) return [];
  const runs = await em.find(RunRow, { id: { $in: [...ids] } }, { populate: ['scenarioVersion'] });
  const results = await em.find(RunResultRow, { runId: { $in: [...ids] } }, { fields: ['summary'] });
  const byId = new Map(runs.map((run) => [run.id, run]));
  const summaries = new Map(results.map(({ runId, summary }) => [runId, readSummary(summary)]));
  return ids.flatMap((id) => {
    const run = byId.get(id);
    return run === undefined ? [] : [runView(run, summaries.get(id) ?? null)];
  });
}
