import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { User } from '../identity/user.entity.js';
import {
  createdAtProperty,
  tenantProperties,
  updatedAtProperty,
  workspaceFilter,
} from '../tenancy/tenant.js';

/** A question with its scenarios. */
export const Study = defineEntity({
  name: 'Study',
  tableName: 'studies',
  filters: workspaceFilter,
  properties: {
    ...tenantProperties(),
    name: p.text(),
    question: p.text(),
    /** A student's own: seen by its owner and by administrators. */
    sandbox: p.boolean(),
    owner: p.manyToOne(User).ref(),
    createdAt: createdAtProperty(),
    updatedAt: updatedAtProperty(),
  },
});
export type Study = InferEntity<typeof Study>;
