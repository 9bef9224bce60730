/** `npm run reset`: deletes the database, secrets and logs of a data folder, after asking. */
import { existsSync, rmSync } from 'node:fs';
import process from 'node:process';
import { createInterface } from 'node:readline/promises';
import { clusterFolder, stopOwnPostgres } from './lib/cluster.mjs';
import { dataHold, holderOf } from './lib/hold.mjs';
import { readStartOptions } from './lib/options.mjs';
import { ownedPaths, requireOurData } from './lib/reset-paths.mjs';
import { StartError, fail, step } from './lib/step.mjs';

try {
  const { data } = readStartOptions(process.argv.slice(2));
  if (!existsSync(data)) throw new StartError(`There is nothing to reset: ${data} does not exist.`);
  requireOurData(data);
  const holder = holderOf(dataHold(data));
  if (holder !== undefined) {
    throw new StartError(`Noonwell runs on ${data} (process ${String(holder)}). Stop it first: npm run stop`);
  }
  const question = `This deletes all studies, weather years, results and accounts in ${data} for good.\nType "delete" to go on: `;
  const ask = createInterface({ input: process.stdin, output: process.stdout });
  const answer = await Promise.race([
    ask.question(question),
    // The end of the input is no consent.
    new Promise((resolve) => ask.once('close', () => resolve(''))),
  ]);
  ask.close();
  if (answer !== 'delete') {
    process.stdout.write('\nNothing was deleted.\n');
    process.exit(1);
  }
  await step('Deleting', async () => {
    await stopOwnPostgres(data);
    for (const path of ownedPaths(data, clusterFolder(data))) rmSync(path, { recursive: true, force: true });
  });
} catch (error) {
  fail(error);
}
