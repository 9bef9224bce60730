import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { createdAtProperty, idProperty } from '../tenancy/tenant.js';

/** Everything else belongs to one. */
export const Workspace = defineEntity({
  name: 'Workspace',
  tableName: 'workspaces',
  properties: {
    id: idProperty(),
    name: p.text(),
    isDemo: p.boolean().default(false),
    createdAt: createdAtProperty(),
  },
});
export type Workspace = InferEntity<typeof Workspace>;
