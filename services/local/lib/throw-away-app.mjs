import { spawn } from 'node:child_process';
import { chmodSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import process from 'node:process';
import { freePort } from '../../../packages/postgres-server/src/index.mjs';
import { root } from './paths.mjs';
import { StartError } from './step.mjs';

/**
 * Starts the whole app as a newcomer would, on a free port and with an empty data folder of its own.
 * @returns {Promise<{ address: string, data: string, stop: () => Promise<void> }>} `stop` fails when the app does not
 * end cleanly
 */
export async function startThrowAwayApp() {
  const data = mkdtempSync(join(tmpdir(), 'noonwell-app-'));
  chmodSync(data, 0o711);
  const port = await freePort();
  const address = `http://127.0.0.1:${String(port)}`;
  // Never a server of somebody else's, and always with the demo.
  const env = {
    ...process.env,
    DATABASE_URL: undefined,
    DATABASE_OWNER_URL: undefined,
    REDIS_URL: undefined,
    NOONWELL_DEMO: undefined,
  };
  const child = spawn(
    process.execPath,
    [join(root, 'services/local/start.mjs'), '--port', String(port), '--data', data],
    {
      cwd: root,
      env,
      stdio: ['ignore', 'pipe', 'inherit'],
    },
  );
  /** @type {Promise<number>} */
  const ended = new Promise((resolve) => {
    child.once('exit', (code) => {
      resolve(code ?? 1);
    });
  });
  const running = new Promise((resolve) => {
    let text = '';
    child.stdout.on('data', (/** @type {Buffer} */ chunk) => {
      process.stdout.write(chunk);
      text += chunk.toString();
      if (text.includes(address)) resolve(undefined);
    });
  });
  const stop = async () => {
    child.kill('SIGTERM');
    const code = await ended;
    rmSync(data, { recursive: true, force: true });
    if (code !== 0) throw new StartError(`The app ended with code ${String(code)} after SIGTERM.`);
  };
  const early = await Promise.race([running, ended]);
  if (early !== undefined) {
    rmSync(data, { recursive: true, force: true });
    throw new StartError(`The app did not start (code ${String(early)}).`);
  }
  return { address, data, stop };
}
