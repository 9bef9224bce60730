import { scenarioSchema, type Scenario } from './scenario.js';

export interface ScenarioProblem {
  /** "catch.dish.apertureDiameterM"; empty for the document itself. */
  readonly path: string;
  readonly message: string;
}

export type ScenarioParse =
  | { readonly ok: true; readonly scenario: Scenario }
  | { readonly ok: false; readonly problems: readonly ScenarioProblem[] };

/** Checks an unknown value; every problem names its field. */
export function parseScenario(value: unknown): ScenarioParse {
  const result = scenarioSchema.safeParse(value);
  if (result.success) return { ok: true, scenario: result.data };
  return {
    ok: false,
    problems: result.error.issues.map((issue) => ({
      path: issue.path.map(String).join('.'),
      message: issue.message,
    })),
  };
}

/** Reads a scenario file's text. NaN and Infinity are not JSON and are refused as such. */
export function parseScenarioText(text: string): ScenarioParse {
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch (error) {
    return {
      ok: false,
      problems: [
        {
          path: '',
          message: `The file is not JSON: ${error instanceof Error ? error.message : String(error)}`,
        },
      ],
    };
  }
  return parseScenario(value);
}

/**
 * The one way a scenario is written: keys in the schema's order, so that the same scenario is the same bytes
 * whether it comes from the app, the database or the command line.
 */
export function serializeScenario(scenario: Scenario): string {
  return `${JSON.stringify(scenarioSchema.parse(scenario), null, 2)}\n`;
}
