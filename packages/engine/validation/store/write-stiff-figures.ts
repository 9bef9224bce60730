/** Makes stiff-figures.json anew: `tsx packages/engine/validation/store/write-stiff-figures.ts`. */
import { writeFileSync } from 'node:fs';
import { DAY_CASES } from './day-cases.js';
import { FIGURES_FILE, pythonWithScipy, solveStiff } from './stiff-solver.js';

const python = pythonWithScipy();
if (python === undefined) throw new Error('No Python with scipy: install Debian’s python3-scipy.');
const figures = DAY_CASES.map((dayCase) => solveStiff(python, dayCase));
writeFileSync(FIGURES_FILE, `${JSON.stringify(figures, undefined, 1)}\n`);
