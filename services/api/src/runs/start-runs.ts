import type { EntityManager } from '@mikro-orm/postgresql';
import { MODEL_VERSION } from '@noonwell/engine';
import { RunRow, ScenarioRow, requestRun, type ScenarioVersion } from '@noonwell/persistence';
import { ACTIVE_RUN_STATES } from '@noonwell/schema';
import type { Principal } from '../access/principal';
import { conflict, notFound } from '../http/problem';
import { newestVersions } from '../studies/scenario-views';
import { requireStudy } from '../studies/study-access';
import { requireRoomForRuns } from './run-access';

/** A scenario's newest version on its weather year: what one run answers. */
interface Question {
  readonly scenarioId: string;
  readonly scenarioVersionId: string;
  readonly weatherYearId: string;
}

/**
 * Queues what has no answer yet and gives the ids of all runs that answer, in the order of the scenarios. Run
 * rows and their messages to the queue are of the caller's one transaction.
 */
export async function startRuns(
  em: EntityManager,
  principal: Principal,
  studyId: string,
  scenarioIds: readonly string[] | undefined,
): Promise<string[]> {
  const study = await requireStudy(em, principal, studyId, 'write');
  const scenarios = await wantedScenarios(em, study.id, scenarioIds);
  const questions = questionsOf(scenarios, await newestVersions(em, scenarios));
  await requireRoomForRuns(em, principal, await countUnanswered(em, questions));
  const runIds: string[] = [];
  for (const question of questions) {
    runIds.push(
      await requestRun(em, {
        ...question,
        workspaceId: principal.workspaceId,
        studyId: study.id,
        modelVersion: MODEL_VERSION,
        requestedById: principal.userId,
      }),
    );
  }
  return runIds;
}

async function wantedScenarios(
  em: EntityManager,
  study: string,
  ids: readonly string[] | undefined,
): Promise<ScenarioRow[]> {
  const unique = ids === undefined ? undefined : [...new Set(ids)];
  const scenarios = await em.find(
    ScenarioRow,
    { study, ...(unique === undefined ? {} : { id: { $in: unique } }) },
    { orderBy: { position: 'asc' } },
  );
  if (unique !== undefined && scenarios.length < unique.length) throw notFound('scenario in this study');
  if (scenarios.length === 0) {
    throw conflict('nothing-to-run', 'This study has no scenario yet. Add one, then start the run.');
  }
  return scenarios;
}

function questionsOf(
  scenarios: readonly ScenarioRow[],
  versions: ReadonlyMap<string, ScenarioVersion>,
): Question[] {
  return scenarios.map((scenario) => {
    const version = versions.get(scenario.id);
    if (version === undefined) throw new Error(`Scenario ${scenario.id} has no newest version.`);
    const weatherYearId = version.weatherYear?.id;
    if (weatherYearId === undefined) {
      throw conflict(
        'weather-missing',
        `"${scenario.name}" has no weather year. Choose one for the study or the scenario, then start the run.`,
      );
    }
    return { scenarioId: scenario.id, scenarioVersionId: version.id, weatherYearId };
  });
}

async function countUnanswered(em: EntityManager, questions: readonly Question[]): Promise<number> {
  const answered = await em.count(RunRow, {
    modelVersion: MODEL_VERSION,
    state: { $in: [...ACTIVE_RUN_STATES, 'done'] },
    $or: questions.map(({ scenarioVersionId, weatherYearId }) => ({
      scenarioVersion: scenarioVersionId,
      weatherYear: weatherYearId,
    })),
  });
  return questions.length - answered;
}
