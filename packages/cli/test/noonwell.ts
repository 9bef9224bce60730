import { spawn } from 'node:child_process';
import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { newScenario, type Scenario } from '@noonwell/schema';

const MAIN = fileURLToPath(new URL('../src/main.ts', import.meta.url));
const TSX = import.meta.resolve('tsx');

export interface Outcome {
  readonly exitCode: number | null;
  readonly out: string;
  readonly err: string;
}

/** Runs the command line as its own process, from source, in a folder. */
export function noonwell(
  folder: string,
  args: readonly string[],
  env: NodeJS.ProcessEnv = {},
): Promise<Outcome> {
  return new Promise((resolve, reject) => {
    const { npm_lifecycle_event: _, ...ownEnv } = process.env;
    const child = spawn(process.execPath, ['--conditions=@noonwell/source', '--import', TSX, MAIN, ...args], {
      cwd: folder,
      env: { ...ownEnv, ...env },
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    let out = '';
    let err = '';
    child.stdout.setEncoding('utf8').on('data', (text: string) => (out += text));
    child.stderr.setEncoding('utf8').on('data', (text: string) => (err += text));
    child.on('error', reject);
    child.on('close', (exitCode) => {
      resolve({ exitCode, out, err });
    });
  });
}

/** A folder of its own for one test file. */
export async function scratchFolder(): Promise<{ folder: string; remove: () => Promise<void> }> {
  const folder = await mkdtemp(join(tmpdir(), 'noonwell-cli-'));
  return { folder, remove: () => rm(folder, { recursive: true, force: true }) };
}

/** Writes the default scenario with one value changed; `path` is dotted as in messages. */
export async function writeScenario(file: string, path?: string, value?: unknown): Promise<Scenario> {
  const scenario = newScenario();
  const document: unknown = JSON.parse(JSON.stringify(scenario));
  if (path !== undefined) setAt(document, path.split('.'), value);
  await writeFile(file, JSON.stringify(document));
  return scenario;
}

function setAt(target: unknown, keys: readonly string[], value: unknown): void {
  const [key, ...rest] = keys;
  if (typeof target !== 'object' || target === null || key === undefined)
    throw new TypeError('no such place');
  if (rest.length === 0) Reflect.set(target, key, value);
  else setAt(Reflect.get(target, key), rest, value);
}
