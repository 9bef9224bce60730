import { mkdtempSync, rmSync, statSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import process from 'node:process';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { readStartOptions } from './options.mjs';
import { root } from './paths.mjs';
import { readRunning, writeRunFile } from './run-file.mjs';
import { readOrCreateSecrets } from './secrets.mjs';
import { requireFreePort } from './serve.mjs';

describe('parts of npm start', () => {
  let data = '';

  beforeEach(() => {
    data = mkdtempSync(join(tmpdir(), 'noonwell-data-'));
  });
  afterEach(() => {
    rmSync(data, { recursive: true, force: true });
  });

  it('makes the secrets once, readable by this account only', () => {
    const first = readOrCreateSecrets(data);
    const again = readOrCreateSecrets(data);
    expect(first.fresh).toBe(true);
    expect(again).toEqual({ secrets: first.secrets, fresh: false });
    expect(new Set(Object.values(first.secrets)).size).toBe(4);
    expect(statSync(join(data, 'secrets.json')).mode & 0o777).toBe(0o600);
  });

  it('takes the data folder relative to the repository and refuses a port that is none', () => {
    expect(readStartOptions([])).toEqual({ port: 8080, data: join(root, 'data') });
    expect(readStartOptions(['--port', '9000', '--data', '/srv/noonwell'])).toEqual({
      port: 9000,
      data: '/srv/noonwell',
    });
    for (const bad of ['0', '65536', 'eighty', '80.5']) {
      expect(() => readStartOptions(['--port', bad])).toThrow(/whole number from 1 to 65535/);
    }
    expect(() => readStartOptions(['--prot', '80'])).toThrow(/--prot[\s\S]*npm start -- \[--port N\]/);
  });

  it('says that a port is taken and which to try', async () => {
    const server = createServer();
    const port = await new Promise((resolve) => {
      server.listen(0, '127.0.0.1', () => {
        const address = server.address();
        resolve(address !== null && typeof address === 'object' ? address.port : 0);
      });
    });
    try {
      await expect(requireFreePort(port)).rejects.toThrow(`--port ${String(port + 1)}`);
    } finally {
      server.close();
    }
  });

  it('never takes a process of somebody else for its own', () => {
    // This very process runs, but is neither the starter nor a part of the app.
    writeRunFile(data, { pid: process.pid, address: 'http://127.0.0.1:1', parts: [process.pid] });
    expect(readRunning(data)).toEqual({ starter: undefined, address: 'http://127.0.0.1:1', parts: [] });
  });

  it('finds nothing running when there is no trace of an earlier start', () => {
    expect(readRunning(data)).toBeUndefined();
  });
});
