import type { ScenarioView, StudyView } from '@noonwell/schema';
import { useQueries } from '@tanstack/react-query';
import { markedWeatherName } from '../../shared/format/weather-name.js';
import { runSummaryQuery } from './api.js';
import type { Compared } from './model/compared.js';

export interface ComparedScenarios {
  /** Those with a result, in the order asked for. */
  readonly compared: readonly Compared[];
  /** Those whose newest version has none (yet). */
  readonly without: readonly ScenarioView[];
  readonly loading: boolean;
  readonly error: Error | null;
  readonly retry: () => void;
}

/** Scenarios with their results. The study brings the summaries along; one that it left out is fetched. */
export function useCompared(
  scenarios: readonly ScenarioView[],
  weatherYears: StudyView['weatherYears'],
): ComparedScenarios {
  const done = scenarios.flatMap((scenario) =>
    scenario.latestRun?.state === 'done' ? [{ scenario, run: scenario.latestRun }] : [],
  );
  const results = useQueries({
    queries: done.map(({ run }) => ({
      ...runSummaryQuery(run.id),
      ...(run.summary ? { initialData: run.summary } : {}),
    })),
  });
  return {
    compared: done.flatMap(({ scenario, run }, index): Compared[] => {
      const summary = results[index]?.data;
      if (!summary) return [];
      const year = weatherYears.find(({ id }) => id === run.weatherYearId);
      return [
        {
          scenarioId: scenario.id,
          runId: run.id,
          name: scenario.name,
          position: scenario.position,
          version: scenario.version,
          weatherYearId: run.weatherYearId,
          weatherYearName: year === undefined ? (scenario.weatherYearName ?? '') : markedWeatherName(year),
          document: scenario.document,
          summary,
        },
      ];
    }),
    without: scenarios.filter(({ latestRun }) => latestRun?.state !== 'done'),
    loading: results.some(({ isPending }) => isPending),
    error: results.find(({ error }) => error !== null)?.error ?? null,
    retry: () => {
      for (const result of results) if (result.isError) void result.refetch();
    },
  };
}
