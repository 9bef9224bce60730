export { TEST_POSTGRES_ENV, createTestDatabase, type TestDatabase } from './database.js';
export {
  startTestPostgres,
  type StartTestPostgresOptions,
  type TestPostgres,
  type TestPostgresAddress,
} from './server.js';
