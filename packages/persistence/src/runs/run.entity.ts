import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import type { RunState } from '@noonwell/schema';
import { User } from '../identity/user.entity.js';
import { ScenarioRow } from '../studies/scenario.entity.js';
import { ScenarioVersion } from '../studies/scenario-version.entity.js';
import { Study } from '../studies/study.entity.js';
import { createdAtProperty, tenantProperties, workspaceFilter } from '../tenancy/tenant.js';
import { WeatherYear } from '../weather/weather-year.entity.js';

/**
 * One version on one weather year by one model version. The row is the truth about its state; the queue
 * only carries its id. At most one of the same three is queued, running or done (a unique index).
 */
export const RunRow = defineEntity({
  name: 'RunRow',
  tableName: 'runs',
  filters: workspaceFilter,
  properties: {
    ...tenantProperties(),
    study: p.manyToOne(Study).ref(),
    scenario: p.manyToOne(ScenarioRow).ref(),
    scenarioVersion: p.manyToOne(ScenarioVersion).ref(),
    weatherYear: p.manyToOne(WeatherYear).ref(),
    modelVersion: p.text(),
    state: p.text().$type<RunState>(),
    /** 0 … 1. */
    progress: p.double().$type<number>().default(0),
    /** 1 for the first; each retry by a person counts one up and makes the running attempt's writes stale. */
    attempt: p.integer().default(1),
    failure: p.text().nullable(),
    cancelRequested: p.boolean().default(false),
    /** The worker's hold on the run while it runs; a later claim takes it over. */
    claimToken: p.text().nullable(),
    requestedBy: p.manyToOne(User).ref(),
    createdAt: createdAtProperty(),
    startedAt: p.datetime(3).nullable(),
    finishedAt: p.datetime(3).nullable(),
    engineMs: p.double().$type<number>().nullable(),
  },
});
export type RunRow = InferEntity<typeof RunRow>;
