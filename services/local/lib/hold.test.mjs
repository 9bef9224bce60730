import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import process from 'node:process';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { giveHold, holderOf, takeHold } from './hold.mjs';

let folder = '';
let file = '';
/** @type {import('node:child_process').ChildProcess[]} */
const children = [];
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'noonwell-hold-'));
  file = join(folder, 'start.hold');
});
afterEach(() => {
  for (const child of children.splice(0)) child.kill('SIGKILL');
  rmSync(folder, { recursive: true });
});

/** A process that looks like a command of ours, or like anybody's. */
function idle(/** @type {string} */ words) {
  const child = spawn(process.execPath, ['-e', 'setInterval(() => 0, 1000)', words], { stdio: 'ignore' });
  children.push(child);
  return child;
}

const ended = (/** @type {import('node:child_process').ChildProcess} */ child) =>
  new Promise((resolve) => child.once('exit', resolve));

it('belongs to the first who takes it, as long as that process lives', async () => {
  const child = idle('services/local/start.mjs');
  writeFileSync(file, String(child.pid));
  expect(takeHold(file)).toBe(child.pid);
  expect(readFileSync(file, 'utf8')).toBe(String(child.pid));
  child.kill('SIGKILL');
  await ended(child);
  expect(takeHold(file)).toBeUndefined();
  expect(readFileSync(file, 'utf8')).toBe(String(process.pid));
});

it('is not kept by somebody else’s process that was given the same number', () => {
  writeFileSync(file, String(idle('another-program').pid));
  expect(holderOf(file)).toBeUndefined();
  expect(takeHold(file)).toBeUndefined();
});

it('is taken over where what stands in it is no process', () => {
  for (const text of ['', 'half-writ', '-1']) {
    writeFileSync(file, text);
    expect(takeHold(file)).toBeUndefined();
  }
});

it('is given back only by who has it', () => {
  const child = idle('services/local/start.mjs');
  writeFileSync(file, String(child.pid));
  giveHold(file);
  expect(existsSync(file)).toBe(true);
});
