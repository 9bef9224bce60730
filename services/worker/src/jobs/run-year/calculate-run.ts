import {
  ACCOUNTS,
  DomainError,
  RunError,
  STATE_CHANNELS,
  type HourlyColumns,
  type Machine,
  type WeatherYear,
  type YearRun,
} from '@noonwell/engine';
import { encodeColumns, type NumberColumn, type RunOutcome } from '@noonwell/persistence';
import { parseScenario, serializeSummary, summariseRun, toMachine } from '@noonwell/schema';
import { WeatherDecodeError, decodeWeatherYear } from '@noonwell/weather';

/** What a run is made of, as it is stored. */
export interface RunInput {
  readonly document: unknown;
  readonly weatherBytes: Uint8Array;
}

/** The engine's way in; tests put their own in its place. */
export type StartYear = (machine: Machine, weather: WeatherYear) => YearRun;

/** The run can never succeed as it stands: trying again would end the same. The message is for people. */
export class RunRefused extends Error {
  override readonly name = 'RunRefused';
}

/** Reports of progress over a year. */
const REPORTS = 100;

/**
 * Runs the year. The same function serves the worker's thread and the demo's seed.
 * @param onProgress called with 0 to 1 about a hundred times
 * @throws RunRefused with a sentence that names the part, field or weather record
 */
export function calculateRun(
  input: RunInput,
  startYear: StartYear,
  onProgress: (progress: number) => void = () => undefined,
): RunOutcome {
  const parsed = parseScenario(input.document);
  if (!parsed.ok) {
    const places = parsed.problems.map(({ path, message }) => `${path || 'scenario'}: ${message}`);
    throw new RunRefused(
      `The scenario cannot be run: ${places.join('; ')}. Save it again with these corrected.`,
    );
  }
  const weather = inSentences(() => decodeWeatherYear(input.weatherBytes));
  return inSentences(() => {
    const startedAt = performance.now();
    const year = startYear(toMachine(parsed.scenario), weather);
    const chunk = Math.max(1, Math.ceil(year.records / REPORTS));
    while (year.done < year.records) {
      year.advance(chunk);
      onProgress(year.done / year.records);
    }
    const result = year.finish();
    const engineMs = performance.now() - startedAt;
    return {
      modelVersion: result.modelVersion,
      summary: serializeSummary(summariseRun(result)),
      columns: encodeColumns(hourlyColumns(result.hourly)),
      engineMs,
    };
  });
}

/** Turns what is known to be final into a sentence; anything else goes on as it is and is tried again. */
function inSentences<Result>(work: () => Result): Result {
  try {
    return work();
  } catch (error) {
    if (error instanceof RunError) throw new RunRefused(`The run stopped. ${sentence(error.message)}`);
    if (error instanceof DomainError) {
      throw new RunRefused(
        `The run cannot start: ${sentence(error.message)} Correct it in the scenario or the weather year.`,
      );
    }
    if (error instanceof WeatherDecodeError) {
      throw new RunRefused(
        `The weather year cannot be read: ${sentence(error.message)} Upload its file again.`,
      );
    }
    throw error;
  }
}

function sentence(text: string): string {
  const capital = text.charAt(0).toUpperCase() + text.slice(1);
  return capital.endsWith('.') ? capital : `${capital}.`;
}

/** The engine's channels under their own keys, then the tank's layers from bottom to top. */
export function hourlyColumns(hourly: HourlyColumns): NumberColumn[] {
  return [
    { key: 'startLocalMs', unit: 'ms', values: hourly.startLocalMs },
    ...ACCOUNTS.map((key) => ({ key, unit: 'W', values: hourly.powersW[key] })),
    ...STATE_CHANNELS.map(({ key, unit }) => ({ key, unit, values: hourly.states[key] })),
    ...hourly.tankLayersC.map((values, layer) => ({ key: `tankLayer${String(layer)}`, unit: '°C', values })),
  ];
}
