import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import type { Role } from '@noonwell/schema';
import {
  createdAtProperty,
  tenantProperties,
  updatedAtProperty,
  workspaceFilter,
} from '../tenancy/tenant.js';
import { User } from './user.entity.js';

/** A person's role in a workspace: read at each request, so a change counts at once. */
export const Membership = defineEntity({
  name: 'Membership',
  tableName: 'memberships',
  filters: workspaceFilter,
  properties: {
    ...tenantProperties(),
    user: p.manyToOne(User).ref(),
    role: p.text().$type<Role>(),
    createdAt: createdAtProperty(),
    updatedAt: updatedAtProperty(),
  },
});
export type Membership = InferEntity<typeof Membership>;
