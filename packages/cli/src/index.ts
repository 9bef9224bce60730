export { runCommandLine } from './command-line.js';
export { hourlyCsvRows, writeHourlyCsv } from './hourly-csv.js';
export { EXIT, type ExitCode, type Surroundings } from './outcome.js';
