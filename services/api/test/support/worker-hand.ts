import type { EntityManager } from '@mikro-orm/postgresql';
import { runYear, type WeatherYear } from '@noonwell/engine';
import {
  claimRun,
  encodeColumns,
  recordFailure,
  reportProgress,
  storeResult,
  withWorkspace,
  type RunOutcome,
} from '@noonwell/persistence';
import { newScenario, serializeSummary, summariseRun, toMachine } from '@noonwell/schema';
import { syntheticYear } from '@noonwell/testkit';

const RECORDS = 48;
let made: RunOutcome | undefined;

/** A real outcome, of two days. */
export function twoDays(): RunOutcome {
  if (made !== undefined) return made;
  const year = syntheticYear();
  const cut = (values: Float64Array) => values.slice(0, RECORDS);
  const weather: WeatherYear = {
    ...year,
    startLocalMs: cut(year.startLocalMs),
    dniWm2: cut(year.dniWm2),
    ghiWm2: cut(year.ghiWm2),
    dhiWm2: cut(year.dhiWm2),
    dryBulbC: cut(year.dryBulbC),
    windMs: cut(year.windMs),
    relativeHumidityPct: cut(year.relativeHumidityPct),
    pressurePa: cut(year.pressurePa),
    flags: year.flags.slice(0, RECORDS),
  };
  const result = runYear(toMachine(newScenario()), weather);
  const { startLocalMs, states } = result.hourly;
  made = {
    modelVersion: result.modelVersion,
    summary: serializeSummary(summariseRun(result)),
    columns: encodeColumns([
      { key: 'startLocalMs', unit: 'ms', values: startLocalMs },
      { key: 'dniWm2', unit: 'W/m²', values: states.dniWm2 },
      { key: 'faceC', unit: '°C', values: states.faceC },
    ]),
    engineMs: 12.5,
  };
  return made;
}

/** What a worker does with a run, step by step. */
export class WorkerHand {
  constructor(
    private readonly em: EntityManager,
    private readonly workspaceId: string,
    private readonly runId: string,
  ) {}

  private get claim() {
    return { runId: this.runId, token: 'hand' };
  }

  async take(): Promise<void> {
    await withWorkspace(this.em, this.workspaceId, (em) => claimRun(em, this.claim));
  }

  async reach(progress: number): Promise<void> {
    await withWorkspace(this.em, this.workspaceId, (em) => reportProgress(em, this.claim, progress));
  }

  async finish(): Promise<void> {
    await withWorkspace(this.em, this.workspaceId, (em) =>
      storeResult(em, this.claim, this.workspaceId, twoDays()),
    );
  }

  async fail(sentence: string): Promise<void> {
    await withWorkspace(this.em, this.workspaceId, (em) => recordFailure(em, this.claim, sentence));
  }
}
