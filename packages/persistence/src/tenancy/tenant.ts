import { p } from '@mikro-orm/core';
import { randomUUID } from 'node:crypto';

/** Name of the filter that every tenant entity carries. */
export const WORKSPACE_FILTER = 'workspace';

/**
 * On by default: a query without `withWorkspace` has no argument for it and throws instead of answering for
 * everybody. Row-level security holds where a filter does not reach (raw SQL, query builder).
 */
export const workspaceFilter = {
  [WORKSPACE_FILTER]: {
    name: WORKSPACE_FILTER,
    cond: ({ workspaceId }: Record<string, unknown>) => ({ workspaceId }),
    default: true,
  },
};

/** Key of a row of its own. */
export const idProperty = () => p.uuid().primary().onCreate(randomUUID);

/** Key and workspace that each tenant row of its own carries. */
export const tenantProperties = () => ({ id: idProperty(), workspaceId: p.uuid() });

export const createdAtProperty = () => p.datetime(3).onCreate(() => new Date());
export const updatedAtProperty = () =>
  p
    .datetime(3)
    .onCreate(() => new Date())
    .onUpdate(() => new Date());
