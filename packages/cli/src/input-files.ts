import { readFile, stat } from 'node:fs/promises';
import { parseScenarioText, type Scenario } from '@noonwell/schema';
import { describeProblem, problemOfSize, readWeatherFile, type WeatherAccepted } from '@noonwell/weather';
import { badInput } from './outcome.js';

/** A scenario is a few kilobytes; anything larger is another file. */
const SCENARIO_LIMIT_BYTES = 1024 * 1024;

/** A file that exists and is not too large, with its size checked before it is read. */
async function readInput(
  path: string,
  what: string,
  refuseSize: (bytes: number) => string | null,
): Promise<Uint8Array> {
  try {
    const about = await stat(path);
    if (!about.isFile()) throw badInput(`The ${what} ${path} is not a file.`);
    const refusal = refuseSize(about.size);
    if (refusal !== null) throw badInput(`The ${what} ${path} is refused: ${refusal}`);
    return await readFile(path);
  } catch (error) {
    if (!(error instanceof Error) || !('code' in error)) throw error;
    if (error.code === 'ENOENT') throw badInput(`There is no ${what} ${path}.`);
    throw badInput(`The ${what} ${path} cannot be read: ${error.message}.`);
  }
}

/** The scenario of a file, checked whole; every problem is one sentence that names its field. */
export async function readScenarioFile(path: string): Promise<Scenario> {
  const bytes = await readInput(path, 'scenario file', (size) =>
    size > SCENARIO_LIMIT_BYTES ? `it has ${size} bytes, which no scenario has.` : null,
  );
  const parsed = parseScenarioText(new TextDecoder().decode(bytes));
  if (parsed.ok) return parsed.scenario;
  throw badInput(
    `The scenario file ${path} is refused:`,
    ...parsed.problems.map(({ path: field, message }) =>
      `  ${field === '' ? '' : `${field}: `}${message}.`.replace(/\.\.$/, '.'),
    ),
  );
}

/** The weather year of a file; a refusal lists each problem with line, column and reason. */
export async function readWeatherInput(path: string): Promise<WeatherAccepted> {
  const bytes = await readInput(path, 'weather file', (size) => {
    const problem = problemOfSize(size);
    return problem === null ? null : describeProblem(problem);
  });
  const result = readWeatherFile(bytes, path);
  if (result.kind === 'accepted') return result;
  const unlisted = result.problemCount - result.problems.length;
  throw badInput(
    `The weather file ${path} is refused:`,
    ...result.problems.map((problem) => `  ${describeProblem(problem)}`),
    ...(unlisted > 0 ? [`  … and ${unlisted} more problems.`] : []),
  );
}
