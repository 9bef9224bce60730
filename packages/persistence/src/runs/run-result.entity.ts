import { defineEntity, p, type InferEntity } from '@mikro-orm/core';
import { createdAtProperty, workspaceFilter } from '../tenancy/tenant.js';

/** What a finished run gave, written once in the transaction that makes the run done. */
export const RunResultRow = defineEntity({
  name: 'RunResultRow',
  tableName: 'run_results',
  filters: workspaceFilter,
  properties: {
    runId: p.uuid().primary(),
    workspaceId: p.uuid(),
    modelVersion: p.text(),
    /** `serializeSummary`, ledger and residuals included: text, because jsonb would change its bytes. */
    summary: p.text(),
    /** Hourly columns as an Arrow IPC stream. */
    columns: p.uint8array(),
    createdAt: createdAtProperty(),
  },
});
export type RunResultRow = InferEntity<typeof RunResultRow>;
