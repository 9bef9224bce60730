import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { User } from '../identity/user.entity.js';
import { createdAtProperty, tenantProperties, workspaceFilter } from '../tenancy/tenant.js';
import { WeatherYear } from '../weather/weather-year.entity.js';
import { ScenarioRow } from './scenario.entity.js';

/** One save of a scenario. The app role may not update it. */
export const ScenarioVersion = defineEntity({
  name: 'ScenarioVersion',
  tableName: 'scenario_versions',
  filters: workspaceFilter,
  properties: {
    ...tenantProperties(),
    scenario: p.manyToOne(ScenarioRow).ref(),
    version: p.integer(),
    /** jsonb keeps neither the order of keys nor a promise about the shape: parse it with `scenarioSchema` on the way out. */
    document: p.json<unknown>(),
    weatherYear: p.manyToOne(WeatherYear).ref().nullable(),
    createdAt: createdAtProperty(),
    createdBy: p.manyToOne(User).ref(),
  },
});
export type ScenarioVersion = InferEntity<typeof ScenarioVersion>;
