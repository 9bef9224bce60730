import type { EntityManager } from '@mikro-orm/postgresql';
import { MODEL_VERSION } from '@noonwell/engine';
import {
  Membership,
  ScenarioRow,
  ScenarioVersion,
  Study,
  User,
  WeatherColumns,
  WeatherOriginal,
  WeatherYear,
  Workspace,
  claimRun,
  requestRun,
  setScope,
  storeResult,
  withScope,
} from '@noonwell/persistence';
import { newScenario } from '@noonwell/schema';
import { createHash, randomUUID } from 'node:crypto';
import { calculateRun, type StartYear } from '../jobs/run-year/calculate-run';
import {
  DEMO_OWNER,
  DEMO_PEOPLE,
  DEMO_PLACES,
  DEMO_SCENARIOS,
  DEMO_STUDY,
  DEMO_WORKSPACE,
} from './demo-content';
import { demoWeather, type DemoWeather } from './demo-weather';

const SEED_LOCK = 'noonwell demo seed';

/**
 * Makes the demo workspace with both scenarios already run, all in one transaction: it is there whole or not at
 * all. Where there is one already nothing is touched, whatever people did with it.
 * @returns whether it was made now
 */
export function seedDemoWorkspace(
  em: EntityManager,
  startYear: StartYear,
  tell: (line: string) => void,
): Promise<boolean> {
  const workspaceId = randomUUID();
  return withScope(em, { workspaceId }, async (inner) => {
    await inner.execute('select pg_advisory_xact_lock(hashtextextended(?, 0))', [SEED_LOCK]);
    if ((await inner.count(Workspace, { isDemo: true })) > 0) return false;

    tell('Demo: accounts');
    await inner.insert(Workspace, {
      id: workspaceId,
      name: DEMO_WORKSPACE,
      isDemo: true,
      createdAt: new Date(),
    });
    const ownerId = await addPeople(inner, workspaceId);
    const seed = new DemoSeed(inner, workspaceId, ownerId);

    const weatherIds: string[] = [];
    for (const place of DEMO_PLACES) {
      tell(`Demo: synthetic weather year of ${place}`);
      weatherIds.push(await seed.addWeather(demoWeather(place)));
    }
    const [weatherYearId] = weatherIds;
    if (weatherYearId === undefined) throw new Error('The demo study needs a weather year.');
    const studyId = await seed.addStudy();
    for (const [position, { name, receiver }] of DEMO_SCENARIOS.entries()) {
      tell(`Demo: running "${name}"`);
      await seed.addRunScenario({ studyId, position, name, weatherYearId }, newScenario(receiver), startYear);
    }
    return true;
  });
}

/** @returns the id of the person whom the demo's things belong to */
async function addPeople(em: EntityManager, workspaceId: string): Promise<string> {
  let ownerId = '';
  for (const { role, name, email } of DEMO_PEOPLE) {
    const userId = randomUUID();
    if (role === DEMO_OWNER) ownerId = userId;
    // An account can be made only by itself.
    await setScope(em, { workspaceId, userId });
    const now = new Date();
    await em.insert(User, { id: userId, email, name, createdAt: now });
    await em.insert(Membership, {
      id: randomUUID(),
      workspaceId,
      user: userId,
      role,
      createdAt: now,
      updatedAt: now,
    });
  }
  return ownerId;
}

class DemoSeed {
  constructor(
    private readonly em: EntityManager,
    private readonly workspaceId: string,
    private readonly ownerId: string,
  ) {}

  async addWeather({ name, fileName, file, read, encoded }: DemoWeather): Promise<string> {
    const { workspaceId } = this;
    const id = randomUUID();
    await this.em.insert(WeatherYear, {
      id,
      workspaceId,
      name,
      format: read.format,
      synthetic: true,
      latitudeDeg: read.year.latitudeDeg,
      longitudeDeg: read.year.longitudeDeg,
      altitudeM: read.year.altitudeM,
      utcOffsetHours: read.year.utcOffsetHours,
      originalFileName: fileName,
      originalBytes: file.length,
      originalSha256: createHash('sha256').update(file).digest('hex'),
      warnings: [...read.warnings],
      summary: read.summary,
      createdAt: new Date(),
      createdBy: this.ownerId,
    });
    await this.em.insert(WeatherColumns, { weatherYearId: id, workspaceId, bytes: encoded });
    await this.em.insert(WeatherOriginal, { weatherYearId: id, workspaceId, bytes: file });
    return id;
  }

  async addStudy(): Promise<string> {
    const id = randomUUID();
    const now = new Date();
    await this.em.insert(Study, {
      id,
      workspaceId: this.workspaceId,
      ...DEMO_STUDY,
      sandbox: false,
      owner: this.ownerId,
      createdAt: now,
      updatedAt: now,
    });
    return id;
  }

  /** Adds a scenario and runs it the way a worker does: asked for, claimed, calculated, stored. */
  async addRunScenario(
    place: { studyId: string; position: number; name: string; weatherYearId: string },
    document: unknown,
    startYear: StartYear,
  ): Promise<void> {
    const { em, workspaceId, ownerId } = this;
    const scenarioId = randomUUID();
    const scenarioVersionId = randomUUID();
    const now = new Date();
    await em.insert(ScenarioRow, {
      id: scenarioId,
      workspaceId,
      study: place.studyId,
      name: place.name,
      position: place.position,
      newestVersion: 1,
      createdAt: now,
      updatedAt: now,
    });
    await em.insert(ScenarioVersion, {
      id: scenarioVersionId,
      workspaceId,
      scenario: scenarioId,
      version: 1,
      document,
      weatherYear: place.weatherYearId,
      createdAt: now,
      createdBy: ownerId,
    });
    const runId = await requestRun(em, {
      workspaceId,
      studyId: place.studyId,
      scenarioId,
      scenarioVersionId,
      weatherYearId: place.weatherYearId,
      modelVersion: MODEL_VERSION,
      requestedById: ownerId,
    });
    const claim = { runId, token: 'demo seed' };
    const claimed = await claimRun(em, claim);
    if (claimed === 'nothing to do') throw new Error('A run that was just asked for waits to be claimed.');
    await storeResult(em, claim, workspaceId, calculateRun(claimed, startYear));
  }
}
