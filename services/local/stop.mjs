/** `npm run stop`: ends an app that was started from another terminal, with its database. */
import process from 'node:process';
import { stopOwnPostgres } from './lib/cluster.mjs';
import { dataHold, holderOf } from './lib/hold.mjs';
import { readStartOptions } from './lib/options.mjs';
import { endAll, readRunning, removeRunFile } from './lib/run-file.mjs';
import { fail, step } from './lib/step.mjs';

try {
  const { data } = readStartOptions(process.argv.slice(2));
  await step('Stopping', async (note) => {
    const running = readRunning(data);
    // The starter stops its own parts in order; only when it is gone they are ended from here.
    const starter = holderOf(dataHold(data));
    const pids = starter === undefined ? (running?.parts ?? []) : [starter];
    await endAll(pids);
    const database = await stopOwnPostgres(data);
    removeRunFile(data);
    note(pids.length > 0 || database ? 'stopped' : 'nothing was running');
  });
} catch (error) {
  fail(error);
}
