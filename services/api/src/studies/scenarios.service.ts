import { EntityManager } from '@mikro-orm/postgresql';
import { Injectable } from '@nestjs/common';
import { ScenarioRow, ScenarioVersion, withWorkspace, type Study } from '@noonwell/persistence';
import {
  MOST_SCENARIOS,
  serializeScenario,
  type PageQuery,
  type Scenario,
  type ScenarioVersionView,
  type ScenarioView,
  type StudyView,
} from '@noonwell/schema';
import { requirePermission, type Principal } from '../access/principal';
import { pageOfRows, window, type Page } from '../http/paging';
import { conflict, notFound } from '../http/problem';
import { requireWeatherYear } from '../weather/weather.service';
import { newestVersions, readDocument, scenarioViews } from './scenario-views';
import { studyView } from './studies.service';
import { requireScenario, requireStudy } from './study-access';

interface ScenarioContent {
  readonly document: Scenario;
  readonly weatherYearId: string | null;
}

@Injectable()
export class ScenariosService {
  constructor(private readonly em: EntityManager) {}

  async get(principal: Principal, id: string): Promise<ScenarioView> {
    requirePermission(principal, 'study.read');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      const { scenario } = await requireScenario(em, principal, id, 'read');
      return oneView(em, scenario);
    });
  }

  async create(
    principal: Principal,
    studyId: string,
    { name, ...content }: ScenarioContent & { name: string },
  ): Promise<ScenarioView> {
    requirePermission(principal, 'sandbox.write');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      const study = await requireStudy(em, principal, studyId, 'write');
      if (content.weatherYearId !== null) await requireWeatherYear(em, content.weatherYearId);
      const scenario = em.create(ScenarioRow, {
        workspaceId: principal.workspaceId,
        study,
        name,
        position: await freePosition(em, study),
        newestVersion: 1,
      });
      await em.flush();
      await this.addVersion(em, principal, scenario, content);
      touch(study);
      await em.flush();
      return oneView(em, scenario);
    });
  }

  /** A new version, unless nothing changed but the name, which is the scenario's own. */
  async save(
    principal: Principal,
    id: string,
    { basedOnVersion, name, ...content }: ScenarioContent & { basedOnVersion: number; name?: string },
  ): Promise<ScenarioView> {
    requirePermission(principal, 'sandbox.write');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      const { scenario, study } = await requireScenario(em, principal, id, 'write');
      if (scenario.newestVersion !== basedOnVersion) {
        throw conflict(
          'version-conflict',
          `Somebody saved version ${String(scenario.newestVersion)} after you opened version ${String(basedOnVersion)}. Load it, then make your change again.`,
        );
      }
      if (content.weatherYearId !== null) await requireWeatherYear(em, content.weatherYearId);
      scenario.name = name ?? scenario.name;
      if (await differs(em, scenario, content)) {
        scenario.newestVersion += 1;
        await this.addVersion(em, principal, scenario, content);
      }
      touch(study);
      await em.flush();
      return oneView(em, scenario);
    });
  }

  async remove(principal: Principal, id: string): Promise<void> {
    requirePermission(principal, 'sandbox.write');
    await withWorkspace(this.em, principal.workspaceId, async (em) => {
      const { scenario, study } = await requireScenario(em, principal, id, 'write');
      await em.nativeDelete(ScenarioRow, { id: scenario.id });
      touch(study);
    });
  }

  async versions(principal: Principal, id: string, query: PageQuery): Promise<Page<ScenarioVersionView>> {
    requirePermission(principal, 'study.read');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      const { scenario } = await requireScenario(em, principal, id, 'read');
      const rows = await em.findAndCount(
        ScenarioVersion,
        { scenario: scenario.id },
        { populate: ['createdBy'], orderBy: { version: 'desc' }, ...window(query) },
      );
      return pageOfRows(query, rows, versionView);
    });
  }

  /** The bytes that the command line reads and writes too. */
  async export(principal: Principal, versionId: string): Promise<{ fileName: string; text: string }> {
    requirePermission(principal, 'study.read');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      const version = await em.findOne(ScenarioVersion, { id: versionId });
      if (version === null) throw notFound('scenario version');
      const { scenario } = await requireScenario(em, principal, version.scenario.id, 'read');
      const stem = scenario.name
        .replace(/[^\p{L}\p{N}]+/gu, '-')
        .replace(/^-|-$/g, '')
        .toLowerCase();
      return {
        fileName: `${stem === '' ? 'scenario' : stem}-v${String(version.version)}.json`,
        text: serializeScenario(readDocument(version)),
      };
    });
  }

  /** Points each scenario of the study at the year; those that do already stay as they are. */
  async pointAtWeather(principal: Principal, studyId: string, weatherYearId: string): Promise<StudyView> {
    requirePermission(principal, 'sandbox.write');
    return withWorkspace(this.em, principal.workspaceId, async (em) => {
      const study = await requireStudy(em, principal, studyId, 'write');
      await requireWeatherYear(em, weatherYearId);
      const scenarios = await em.find(ScenarioRow, { study: study.id }, { orderBy: { id: 'asc' } });
      const versions = await newestVersions(em, scenarios);
      for (const scenario of scenarios) {
        const version = versions.get(scenario.id);
        if (version === undefined || version.weatherYear?.id === weatherYearId) continue;
        scenario.newestVersion += 1;
        await this.addVersion(em, principal, scenario, { document: readDocument(version), weatherYearId });
      }
      touch(study);
      await em.flush();
      return studyView(em, principal, study);
    });
  }

  private async addVersion(
    em: EntityManager,
    { workspaceId, userId }: Principal,
    scenario: ScenarioRow,
    { document, weatherYearId }: ScenarioContent,
  ): Promise<void> {
    em.create(ScenarioVersion, {
      workspaceId,
      scenario,
      version: scenario.newestVersion,
      document,
      weatherYear: weatherYearId,
      createdBy: userId,
    });
    await em.flush();
  }
}

async function oneView(em: EntityManager, scenario: ScenarioRow): Promise<ScenarioView> {
  const [view] = await scenarioViews(em, [scenario]);
  if (view === undefined) throw notFound('scenario');
  return view;
}

function versionView(version: ScenarioVersion): ScenarioVersionView {
  return {
    id: version.id,
    version: version.version,
    weatherYearId: version.weatherYear?.id ?? null,
    createdAt: version.createdAt.toISOString(),
    createdByName: version.createdBy.getEntity().name,
  };
}

async function differs(em: EntityManager, scenario: ScenarioRow, content: ScenarioContent): Promise<boolean> {
  const present = (await newestVersions(em, [scenario])).get(scenario.id);
  if (present === undefined) return true;
  return (
    (present.weatherYear?.id ?? null) !== content.weatherYearId ||
    serializeScenario(readDocument(present)) !== serializeScenario(content.document)
  );
}

/** The lowest slot that is free, so that the other scenarios keep their colours. */
async function freePosition(em: EntityManager, study: Study): Promise<number> {
  const taken = new Set((await em.find(ScenarioRow, { study: study.id })).map(({ position }) => position));
  for (let position = 0; position < MOST_SCENARIOS; position += 1) if (!taken.has(position)) return position;
  throw conflict(
    'too-many-scenarios',
    `This study has ${String(taken.size)} scenarios, as many as stand side by side. Delete one, or make another study.`,
  );
}

/** A study counts as changed when its scenarios do: it moves up in the list. */
function touch(study: Study): void {
  study.updatedAt = new Date();
}
