/**
 * `npm start`: brings everything the app needs and runs it on one port until Ctrl-C. Uses only Node itself, because
 * nothing is installed yet when it first runs.
 */
import process from 'node:process';
import { ensureBuilt } from './lib/build.mjs';
import { migrateAndSeed, openDatabase } from './lib/database.mjs';
import { appEnvironment } from './lib/environment.mjs';
import { dataHold, giveHold, takeHold } from './lib/hold.mjs';
import { readStartOptions, requireNode } from './lib/options.mjs';
import { ensurePackages } from './lib/packages.mjs';
import { endAll, readRunning, removeRunFile, writeRunFile } from './lib/run-file.mjs';
import { endedError, requireFreePort, serve, stopPart } from './lib/serve.mjs';
import { DATABASE_MIB, requireSpace } from './lib/space.mjs';
import { StartError, fail, step } from './lib/step.mjs';

/** @type {import('./lib/serve.mjs').Part[]} */
const parts = [];
/** @type {(() => Promise<void>)[]} what to undo at the end, last first */
const undo = [];
let stopping = false;

async function stopEverything() {
  stopping = true;
  if (parts.length === 0 && undo.length === 0) return;
  await step('Stopping', async () => {
    // Side by side: neither needs the other to end cleanly, and the database outlives both.
    await Promise.all(parts.map(stopPart));
    for (const action of undo.reverse()) await action();
  });
}

/** @param {NodeJS.Signals} signal */
async function onSignal(signal) {
  if (stopping) return;
  process.stdout.write(`\n${signal === 'SIGINT' ? 'Ctrl-C' : signal}\n`);
  await stopEverything();
  process.exit(0);
}

async function main() {
  requireNode();
  const { port, data } = readStartOptions(process.argv.slice(2));
  const address = `http://127.0.0.1:${String(port)}`;
  requireSpace(data, DATABASE_MIB, 'The database');
  const holder = takeHold(dataHold(data));
  const before = readRunning(data);
  if (holder !== undefined) {
    const where = before === undefined ? `is being started on ${data}` : `already runs at ${before.address}`;
    throw new StartError(`Noonwell ${where} (process ${String(holder)}). Stop it with: npm run stop`);
  }
  undo.push(() => {
    giveHold(dataHold(data));
    return Promise.resolve();
  });
  if (before !== undefined && before.parts.length > 0) {
    await step('Ending what an interrupted start left behind', () => endAll(before.parts));
  }
  await requireFreePort(port);
  for (const signal of /** @type {const} */ (['SIGINT', 'SIGTERM', 'SIGHUP']))
    process.on(signal, (name) => void onSignal(name));

  await ensurePackages();
  const opening = openDatabase(data);
  // Also what a signal finds half opened: else it would be left running.
  undo.push(() =>
    opening.then(
      ({ stop }) => stop(),
      () => undefined,
    ),
  );
  const { database, secrets } = await opening;
  await ensureBuilt();
  await migrateAndSeed(database, secrets, port);
  // A signal that came in between stops what there was; nothing must be started behind its back.
  if (stopping) return;
  const note = () => {
    writeRunFile(data, { pid: process.pid, address, parts: parts.flatMap(({ child }) => child.pid ?? []) });
  };
  undo.push(() => {
    removeRunFile(data);
    return Promise.resolve();
  });
  await serve(appEnvironment(database, secrets, port), address, data, (part) => {
    parts.push(part);
    note();
  });
  process.stdout.write(`\nNoonwell runs at ${address}\nStop it with Ctrl-C. Logs and data: ${data}\n`);

  const fallen = await Promise.race(parts.map(async (part) => ({ part, how: await part.ended })));
  if (!stopping) throw endedError(fallen.part, fallen.how);
}

try {
  await main();
} catch (error) {
  // A signal already stops everything, and what it interrupts fails in passing.
  if (!stopping) {
    await stopEverything();
    fail(error);
  }
}
