/** A worker process that takes a job, says so and never finishes it: for being killed. */
import process from 'node:process';
import { Worker } from 'bullmq';
import { chooseQueueBackend } from '../src/queue/index.js';

const { connection } = chooseQueueBackend({
  databaseUrl: process.env['DATABASE_URL'] ?? '',
  redisUrl: process.env['REDIS_URL'],
});
const worker = new Worker(
  process.env['TEST_QUEUE'] ?? '',
  async (job) => {
    process.stdout.write(`taken ${job.id ?? ''}\n`);
    await new Promise(() => undefined);
  },
  // The check for stalled jobs rests for its interval in all processes together, the killed one included.
  { connection, lockDuration: 1000, stalledInterval: 200 },
);
worker.on('error', (error) => {
  process.stderr.write(`${error.message}\n`);
});
