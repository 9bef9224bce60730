import process from 'node:process';
import { show } from './exec.mjs';
import { installed, workspaceFiles } from './paths.mjs';

/**
 * Type checks every workspace, tests included; the web app is a project of its own because it reads our packages'
 * sources instead of their builds.
 * @returns {Promise<boolean>} whether all is well; faults are on the terminal
 */
export async function typeCheck() {
  const tsc = installed('typescript/bin/tsc');
  const projects = ['tsconfig.json', 'tsconfig.build.json'].flatMap(workspaceFiles);
  const isWeb = (/** @type {string} */ path) => path.startsWith('services/web/');
  const built = await show(process.execPath, [tsc, '-b', ...projects.filter((path) => !isWeb(path))]);
  const web = await show(process.execPath, [tsc, '-p', 'services/web']);
  return built === 0 && web === 0;
}
