import type { EntityManager } from '@mikro-orm/postgresql';
import { MODEL_VERSION } from '@noonwell/engine';
import {
  RunResultRow,
  RunRow,
  ScenarioRow,
  ScenarioVersion,
  Study,
  withWorkspace,
} from '@noonwell/persistence';
import { newScenario } from '@noonwell/schema';
import { addPerson, type Person } from './people';
import { addWeatherYear } from './weather-rows';
import { twoDays } from './worker-hand';

/** One of everything that a route can name, all of one study. */
export interface Belongings {
  readonly studyId: string;
  readonly scenarioId: string;
  readonly versionId: string;
  readonly weatherYearId: string;
  /** One that nothing stands on, so that it can be removed. */
  readonly spareWeatherYearId: string;
  readonly doneRunId: string;
  readonly failedRunId: string;
  readonly memberId: string;
}

let count = 0;

/** Straight into the database, as the owner would have made it: with a done run of version 1 and a failed one of version 2. */
export async function addBelongings(
  em: EntityManager,
  workspaceId: string,
  owner: Person,
  sandbox: boolean,
): Promise<Belongings> {
  count += 1;
  const member = await addPerson(em, workspaceId, 'analyst', `extra member ${String(count)}`);
  const weatherYearId = await addWeatherYear(em, workspaceId, owner.userId, 'Desert');
  const spareWeatherYearId = await addWeatherYear(em, workspaceId, owner.userId, 'Spare');
  return withWorkspace(em, workspaceId, async (inner) => {
    const by = owner.userId;
    const study = inner.create(Study, { workspaceId, name: 'Creamery', question: '', sandbox, owner: by });
    await inner.flush();
    const scenario = inner.create(ScenarioRow, {
      workspaceId,
      study,
      name: 'Coil',
      position: 0,
      newestVersion: 2,
    });
    await inner.flush();
    const version = (number: number) =>
      inner.create(ScenarioVersion, {
        workspaceId,
        scenario,
        version: number,
        document: newScenario(),
        weatherYear: weatherYearId,
        createdBy: by,
      });
    const [first, second] = [version(1), version(2)];
    await inner.flush();
    const run = (scenarioVersion: ScenarioVersion, state: 'done' | 'failed') =>
      inner.create(RunRow, {
        workspaceId,
        study,
        scenario,
        scenarioVersion,
        weatherYear: weatherYearId,
        modelVersion: MODEL_VERSION,
        state,
        failure: state === 'failed' ? 'The tank ran dry.' : null,
        claimToken: null,
        requestedBy: by,
        startedAt: new Date(),
        finishedAt: new Date(),
        engineMs: null,
      });
    const [done, failed] = [run(first, 'done'), run(second, 'failed')];
    await inner.flush();
    const { modelVersion, summary, columns } = twoDays();
    inner.create(RunResultRow, { runId: done.id, workspaceId, modelVersion, summary, columns });
    await inner.flush();
    return {
      studyId: study.id,
      scenarioId: scenario.id,
      versionId: first.id,
      weatherYearId,
      spareWeatherYearId,
      doneRunId: done.id,
      failedRunId: failed.id,
      memberId: member.userId,
    };
  });
}
