export * from './columns/index.js';
export { isForeignKeyViolation, loggable, plainMessage } from './database-errors.js';
export { ENTITIES } from './entities.js';
export { Membership } from './identity/membership.entity.js';
export { RefreshToken } from './identity/refresh-token.entity.js';
export { User, normalizeEmail } from './identity/user.entity.js';
export { Workspace } from './identity/workspace.entity.js';
export { migrateDatabase } from './migrate.js';
export { createOrm, ormOptions, type OrmSettings } from './orm.js';
export * from './queue/index.js';
export { OutboxMessage } from './runs/outbox.entity.js';
export { RunResultRow } from './runs/run-result.entity.js';
export { RunRow } from './runs/run.entity.js';
export { ScenarioVersion } from './studies/scenario-version.entity.js';
export { ScenarioRow } from './studies/scenario.entity.js';
export { Study } from './studies/study.entity.js';
export { AppRoleError, requireAppRole } from './tenancy/app-role.js';
export {
  setScope,
  withScope,
  withSystemTask,
  withWorkspace,
  type AccessScope,
  type SystemTask,
} from './tenancy/scope.js';
export { WeatherColumns, WeatherOriginal } from './weather/weather-bytes.entity.js';
export { WeatherYear } from './weather/weather-year.entity.js';
