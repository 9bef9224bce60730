import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import {
  createdAtProperty,
  tenantProperties,
  updatedAtProperty,
  workspaceFilter,
} from '../tenancy/tenant.js';
import { Study } from './study.entity.js';

/** What stays when a scenario is saved: its name and its slot. What it says stands in its versions. */
export const ScenarioRow = defineEntity({
  name: 'ScenarioRow',
  tableName: 'scenarios',
  filters: workspaceFilter,
  properties: {
    ...tenantProperties(),
    study: p.manyToOne(Study).ref(),
    name: p.text(),
    /** Slot that keeps its colour in every chart; 0 is the baseline. */
    position: p.integer(),
    newestVersion: p.integer(),
    createdAt: createdAtProperty(),
    updatedAt: updatedAtProperty(),
  },
});
export type ScenarioRow = InferEntity<typeof ScenarioRow>;
