import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { createdAtProperty, workspaceFilter } from '../tenancy/tenant.js';

/**
 * A job that must reach the queue, written in the transaction that queued its run. The relay adds the job and
 * then deletes the row; a crash between the two adds it twice, which the job id makes one.
 */
export const OutboxMessage = defineEntity({
  name: 'OutboxMessage',
  tableName: 'outbox',
  filters: workspaceFilter,
  properties: {
    id: p.bigint('number').primary(),
    workspaceId: p.uuid(),
    runId: p.uuid(),
    queue: p.text(),
    payload: p.json<unknown>(),
    createdAt: createdAtProperty(),
  },
});
export type OutboxMessage = InferEntity<typeof OutboxMessage>;
