import { access, constants, realpath, stat } from 'node:fs/promises';
import { dirname, resolve } from 'node:path';
import { createYearRun, type Machine, type RunResult, type WeatherYear } from '@noonwell/engine';
import { serializeSummary, STEP_MINUTES, summariseRun, toMachine, type Scenario } from '@noonwell/schema';
import { runHelp } from './help.js';
import { hourlyCsvRows, writeHourlyCsv } from './hourly-csv.js';
import { readScenarioFile, readWeatherInput } from './input-files.js';
import { readOptions } from './options.js';
import { badInput, CommandError, EXIT, type Surroundings } from './outcome.js';

/** `noonwell run`: one scenario through one weather year, the summary on standard output. */
export async function runCommand(args: readonly string[], around: Surroundings): Promise<void> {
  const { values, positionals } = readOptions(args, 'run', {
    weather: { type: 'string' },
    step: { type: 'string' },
    hourly: { type: 'string' },
    help: { type: 'boolean', short: 'h' },
  });
  if (values.help === true) {
    around.out(runHelp());
    return;
  }
  const [scenarioPath, ...more] = positionals.map((path) => resolve(around.folder, path));
  if (scenarioPath === undefined) throw badInput('A scenario file is needed.', 'Try: noonwell run --help');
  if (more.length > 0) throw badInput(`One scenario file is run at a time; ${positionals.length} are named.`);
  if (values.weather === undefined) throw badInput('A weather file is needed: --weather FILE.');
  const weatherPath = resolve(around.folder, values.weather);
  const step = values.step === undefined ? undefined : readStep(values.step);
  const hourlyPath = values.hourly === undefined ? undefined : resolve(around.folder, values.hourly);
  if (hourlyPath !== undefined) await requireWritable(hourlyPath, [scenarioPath, weatherPath]);

  const scenario = withStep(await readScenarioFile(scenarioPath), step);
  const weather = await readWeatherInput(weatherPath);
  for (const warning of weather.warnings) around.err(`Weather: ${warning}\n`);
  const result = runWatched(toMachine(scenario), weather.year, around);
  const summary = serializeSummary(summariseRun(result));
  if (hourlyPath !== undefined) await writeHourly(hourlyPath, result, weather.year);
  around.out(summary);
}

function readStep(text: string): Scenario['simulation']['stepMinutes'] {
  const step = STEP_MINUTES.find((minutes) => String(minutes) === text.trim());
  if (step === undefined) {
    throw badInput(`A step of "${text}" minutes is not possible; possible: ${STEP_MINUTES.join(', ')}.`);
  }
  return step;
}

function withStep(scenario: Scenario, step: Scenario['simulation']['stepMinutes'] | undefined): Scenario {
  return step === undefined
    ? scenario
    : { ...scenario, simulation: { ...scenario.simulation, stepMinutes: step } };
}

/** Refuses a place for the hourly table before anything is calculated. */
async function requireWritable(path: string, inputs: readonly string[]): Promise<void> {
  const folder = dirname(path);
  try {
    await access(folder, constants.W_OK);
  } catch {
    throw badInput(
      `The hourly table cannot be written to ${path}: there is no folder ${folder} that may be written to.`,
    );
  }
  const existing = await stat(path).catch(() => null);
  if (existing === null) return;
  if (!existing.isFile()) throw badInput(`The hourly table cannot be written to ${path}: it is not a file.`);
  const realPath = await realpath(path);
  for (const input of inputs) {
    if ((await realpath(input).catch(() => input)) === realPath) {
      throw badInput(`The hourly table would overwrite ${input}, which is read.`);
    }
  }
}

async function writeHourly(path: string, result: RunResult, year: WeatherYear): Promise<void> {
  try {
    await writeHourlyCsv(path, hourlyCsvRows(result.hourly, year.utcOffsetHours));
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error);
    throw new CommandError(EXIT.failedRun, [`The hourly table could not be written to ${path}: ${reason}.`]);
  }
}

const RECORDS_BETWEEN_REPORTS = 500;

function runWatched(machine: Machine, year: WeatherYear, around: Surroundings): RunResult {
  const run = createYearRun(machine, year);
  while (run.done < run.records) {
    run.advance(RECORDS_BETWEEN_REPORTS);
    if (around.isWatched) around.err(`\rRunning: ${Math.floor((100 * run.done) / run.records)} %`);
  }
  if (around.isWatched) around.err('\r\u001B[K');
  return run.finish();
}
