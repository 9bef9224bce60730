import type { EntityManager } from '@mikro-orm/postgresql';
import { ScenarioVersion, type ScenarioRow } from '@noonwell/persistence';
import { scenarioSchema, type Scenario, type ScenarioView } from '@noonwell/schema';
import { runViews } from './run-view';

/** jsonb reorders keys; parsing puts them into the schema's order and notices a damaged row. */
export function readDocument(version: ScenarioVersion): Scenario {
  return scenarioSchema.parse(version.document);
}

/** Each scenario's newest version; none of a scenario that was deleted since it was read. */
export async function newestVersions(
  em: EntityManager,
  scenarios: readonly ScenarioRow[],
): Promise<Map<string, ScenarioVersion>> {
  if (scenarios.length === 0) return new Map();
  const versions = await em.find(
    ScenarioVersion,
    { $or: scenarios.map(({ id, newestVersion }) => ({ scenario: id, version: newestVersion })) },
    { populate: ['weatherYear'] },
  );
  return new Map(versions.map((version) => [version.scenario.id, version]));
}

/** Scenarios with their newest version and that version's newest run, in the order given, but those deleted meanwhile. */
export async function scenarioViews(
  em: EntityManager,
  scenarios: readonly ScenarioRow[],
): Promise<ScenarioView[]> {
  const versions = await newestVersions(em, scenarios);
  if (versions.size === 0) return [];
  const versionIds = [...versions.values()].map(({ id }) => id);
  const newest = await em.execute<{ id: string }[]>(
    `select distinct on (scenario_version_id) id from runs
     where scenario_version_id in (${versionIds.map(() => '?').join(', ')})
     order by scenario_version_id, created_at desc, id`,
    versionIds,
  );
  const runs = await runViews(
    em,
    newest.map(({ id }) => id),
  );
  const runOf = new Map(runs.map((run) => [run.scenarioVersionId, run]));
  return scenarios.flatMap((scenario) => {
    const version = versions.get(scenario.id);
    if (version === undefined) return [];
    return {
      id: scenario.id,
      studyId: scenario.study.id,
      name: scenario.name,
      position: scenario.position,
      version: version.version,
      versionId: version.id,
      document: readDocument(version),
      weatherYearId: version.weatherYear?.id ?? null,
      weatherYearName: version.weatherYear?.getEntity().name ?? null,
      updatedAt: scenario.updatedAt.toISOString(),
      latestRun: runOf.get(version.id) ?? null,
    };
  });
}
