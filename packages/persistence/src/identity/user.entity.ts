import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { createdAtProperty, idProperty } from '../tenancy/tenant.js';

/** A person's account. What they may do stands in their membership of a workspace. */
export const User = defineEntity({
  name: 'User',
  tableName: 'users',
  properties: {
    id: idProperty(),
    /** Lower case; see `normalizeEmail`. */
    email: p.text(),
    name: p.text(),
    /** argon2id in its own text form; null for demo accounts, which no password opens. */
    passwordHash: p.text().nullable(),
    disabledAt: p.datetime(3).nullable(),
    createdAt: createdAtProperty(),
  },
});
export type User = InferEntity<typeof User>;

/** Addresses are compared without regard to case and outer blanks. */
export function normalizeEmail(email: string): string {
  return email.trim().toLowerCase();
}
