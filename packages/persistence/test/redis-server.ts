import { spawn, spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { freePort } from '@noonwell/postgres-server';

export interface TestRedis {
  readonly url: string;
  stop(): Promise<void>;
}

/** Whether tests can have a Redis: one is named in TEST_REDIS_URL, or Debian's redis-server is installed. */
export function redisAvailable(): boolean {
  return (
    (process.env['TEST_REDIS_URL'] ?? '') !== '' ||
    spawnSync('redis-server', ['--version']).error === undefined
  );
}

/** A throw-away Redis on loopback that keeps nothing on disk, or the one TEST_REDIS_URL names. */
export async function startTestRedis(): Promise<TestRedis> {
  const given = process.env['TEST_REDIS_URL'];
  if (given !== undefined && given !== '') return { url: given, stop: () => Promise.resolve() };

  const port = await freePort();
  const dir = mkdtempSync(join(tmpdir(), 'noonwell-redis-'));
  const settings = [
    '--port',
    String(port),
    '--bind',
    '127.0.0.1',
    '--save',
    '',
    '--appendonly',
    'no',
    '--dir',
    dir,
  ];
  const child = spawn('redis-server', settings, { stdio: ['ignore', 'pipe', 'inherit'] });
  const ended = new Promise((resolve) => child.once('exit', resolve));
  await new Promise<void>((resolve, reject) => {
    child.stdout.on('data', (text: Buffer) => {
      if (text.toString().includes('Ready to accept connections')) resolve();
    });
    child.once('error', reject);
    child.once('exit', (code) => {
      reject(new Error(`redis-server ended with code ${String(code)} before it was ready.`));
    });
  });
  return {
    url: `redis://127.0.0.1:${String(port)}`,
    stop: async () => {
      child.kill();
      await ended;
      rmSync(dir, { recursive: true, force: true });
    },
  };
}
