import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { createdAtProperty, idProperty } from '../tenancy/tenant.js';

/**
 * One link of a session's chain. Each refresh uses one up and adds the next of the same family; a used one
 * that comes back means a copy was made, and the whole family ends.
 */
export const RefreshToken = defineEntity({
  name: 'RefreshToken',
  tableName: 'refresh_tokens',
  properties: {
    id: idProperty(),
    familyId: p.uuid(),
    userId: p.uuid(),
    workspaceId: p.uuid(),
    /** SHA-256 of the token, hexadecimal: the token itself is stored nowhere. */
    tokenHash: p.text(),
    createdAt: createdAtProperty(),
    usedAt: p.datetime(3).nullable(),
    revokedAt: p.datetime(3).nullable(),
    /** Idle limit. */
    expiresAt: p.datetime(3),
    /** Absolute limit, carried along the family. */
    familyExpiresAt: p.datetime(3),
  },
});
export type RefreshToken = InferEntity<typeof RefreshToken>;
