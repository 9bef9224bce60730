import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import type { DayCase } from './day-cases.js';

/** What scipy found for one case, with the case it was given. */
export interface StiffFigures {
  readonly case: DayCase;
  readonly scipy: string;
  /** Layer temperatures, bottom first, at the end of each hour [°C]. */
  readonly hourlyC: readonly (readonly number[])[];
}

const SCRIPT = fileURLToPath(new URL('stiff_tank.py', import.meta.url));
export const FIGURES_FILE = fileURLToPath(new URL('stiff-figures.json', import.meta.url));

/** A Python that has scipy: Debian's own first, else the one on the path; undefined where there is none. */
export function pythonWithScipy(): string | undefined {
  return ['/usr/bin/python3', 'python3'].find((python) => {
    try {
      execFileSync(python, ['-c', 'import scipy.integrate'], { stdio: 'ignore' });
      return true;
    } catch {
      return false;
    }
  });
}

/** Solves a case with scipy. */
export function solveStiff(python: string, dayCase: DayCase): StiffFigures {
  const output = execFileSync(python, [SCRIPT], { input: JSON.stringify(dayCase), encoding: 'utf8' });
  const { scipy, hourlyC } = JSON.parse(output) as Omit<StiffFigures, 'case'>;
  return { case: dayCase, scipy, hourlyC };
}

/** The figures stored beside this file by write-stiff-figures.ts. */
export function storedFigures(): readonly StiffFigures[] {
  return JSON.parse(readFileSync(FIGURES_FILE, 'utf8')) as StiffFigures[];
}
