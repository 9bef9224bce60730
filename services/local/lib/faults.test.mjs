import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { requireNothingThere, requireSameMajor } from './cluster.mjs';
import { ownedPaths, requireOurData } from './reset-paths.mjs';
import { requireSpace } from './space.mjs';
import { fileFault } from './step.mjs';

let data = '';
beforeEach(() => {
  data = mkdtempSync(join(tmpdir(), 'noonwell-faults-'));
});
afterEach(() => {
  rmSync(data, { recursive: true });
});

describe('each fault of a start is a sentence that says what to do', () => {
  it('too little room, measured where the folder will be', () => {
    const place = join(data, 'not', 'there', 'yet');
    const almostFull = (/** @type {string} */ folder) => {
      expect(folder).toBe(data);
      return { bavail: 10, bsize: 1024 * 1024 };
    };
    expect(() => {
      requireSpace(place, 300, 'The database', almostFull);
    }).toThrow(`The database needs about 300 MiB, and ${data} has 10 MiB left. Make room`);
    expect(() => {
      requireSpace(place, 10, 'The database', almostFull);
    }).not.toThrow();
  });

  it('files of somebody else where the database should be', () => {
    const cluster = join(data, 'postgres');
    requireNothingThere(cluster);
    mkdirSync(cluster);
    requireNothingThere(cluster);
    writeFileSync(join(cluster, 'letter.txt'), 'x');
    expect(() => {
      requireNothingThere(cluster);
    }).toThrow(/no PostgreSQL database .* npm run reset/);
  });

  it('a database of another major version', () => {
    writeFileSync(join(data, 'PG_VERSION'), '9\n');
    expect(() => {
      requireSameMajor(data);
    }).toThrow(/made by PostgreSQL 9, and version \d+ is installed/);
  });

  it('a full disk or a folder that may not be written', () => {
    const fault = (/** @type {string} */ code) => Object.assign(new Error(code), { code, path: '/srv/x' });
    expect(fileFault(fault('ENOSPC'))).toMatch(/disk is full: \/srv\/x/);
    expect(fileFault(fault('EACCES'))).toMatch(/\/srv\/x cannot be written by this account/);
    expect(fileFault(fault('ECONNREFUSED'))).toBeUndefined();
    expect(fileFault(new Error('else'))).toBeUndefined();
  });
});

describe('what a reset deletes', () => {
  it('is only what a start made, and nothing in a folder that no start has used', () => {
    writeFileSync(join(data, 'thesis.odt'), 'x');
    expect(() => {
      requireOurData(data);
    }).toThrow(/holds no data of Noonwell: nothing was deleted/);
    writeFileSync(join(data, 'secrets.json'), '{}');
    requireOurData(data);
    for (const path of ownedPaths(data, join(data, 'postgres'))) expect(path).not.toContain('thesis');
  });
});
