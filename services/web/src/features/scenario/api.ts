import {
  pageOf,
  scenarioVersionSchema,
  scenarioViewSchema,
  type saveScenarioRequestSchema,
} from '@noonwell/schema';
import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { request } from '../../shared/api/client.js';
import { ApiProblem } from '../../shared/api/problem.js';
import { STUDIES_KEY } from '../../shared/api/studies.js';

export const VERSIONS_ON_A_PAGE = 10;

export function scenarioQuery(scenarioId: string) {
  return queryOptions({
    queryKey: ['scenarios', scenarioId],
    queryFn: ({ signal }) =>
      request('GET /api/scenarios/{id}', scenarioViewSchema, { params: { id: scenarioId }, signal }),
  });
}

export function versionsQuery(scenarioId: string, page: number) {
  return queryOptions({
    queryKey: ['scenarios', scenarioId, 'versions', page],
    queryFn: ({ signal }) =>
      request('GET /api/scenarios/{id}/versions', pageOf(scenarioVersionSchema), {
        params: { id: scenarioId },
        query: { page, pageSize: VERSIONS_ON_A_PAGE },
        signal,
      }),
    placeholderData: keepPreviousData,
  });
}

/** Saves a new version; refused when somebody else has saved one since. */
export function useSaveScenario(scenarioId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof saveScenarioRequestSchema>) =>
      request('PUT /api/scenarios/{id}', scenarioViewSchema, { params: { id: scenarioId }, body }),
    onSuccess: async (scenario) => {
      client.setQueryData(scenarioQuery(scenarioId).queryKey, scenario);
      await Promise.all([
        client.invalidateQueries({ queryKey: ['scenarios', scenarioId, 'versions'] }),
        client.invalidateQueries({ queryKey: STUDIES_KEY }),
      ]);
    },
  });
}

/** Somebody else has saved the scenario since it was loaded here. */
export function isVersionConflict(error: unknown): boolean {
  return (
    error instanceof ApiProblem && error.status === 409 && error.problem.type.endsWith(':version-conflict')
  );
}
