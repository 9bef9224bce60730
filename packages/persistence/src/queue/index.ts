export {
  chooseQueueBackend,
  queueSettingsFrom,
  type QueueBackend,
  type QueueBackendName,
  type QueueSettings,
} from './backend.js';
export { QUEUE_SCHEMA, migrateQueue } from './migrate.js';
