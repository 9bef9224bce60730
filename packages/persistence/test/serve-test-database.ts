/**
 * Started once by jest's global set-up: brings up a throw-away PostgreSQL with the migrated template, writes its
 * address as one line of JSON and stays until its standard input closes, which also happens when jest is killed.
 * A process of its own, because jest's global set-up cannot read our packages' TypeScript sources.
 */
import { startTestPostgres } from '@noonwell/testkit/postgres';
import { migrateDatabase } from '../src/migrate.js';

const { stop, ...address } = await startTestPostgres({ migrate: migrateDatabase });
process.stdout.write(`${JSON.stringify(address)}\n`);

let stopping = false;
async function finish(): Promise<void> {
  if (stopping) return;
  stopping = true;
  await stop();
  process.exit(0);
}
process.stdin.resume();
process.stdin.once('end', () => void finish());
process.once('SIGTERM', () => void finish());
process.once('SIGINT', () => void finish());
