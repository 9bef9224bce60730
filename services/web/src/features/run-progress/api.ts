import { startRunsResponseSchema, type StudyView } from '@noonwell/schema';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { request, requestRaw } from '../../shared/api/client.js';
import { STUDIES_KEY, studyQuery } from '../../shared/api/studies.js';

/** Queues what has no result yet; the runs stand in the study at once. */
export function useStartRuns(studyId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (scenarioIds?: string[]) =>
      request('POST /api/studies/{id}/runs', startRunsResponseSchema, {
        params: { id: studyId },
        body: scenarioIds === undefined ? {} : { scenarioIds },
      }),
    onSuccess: ({ runs }) => {
      client.setQueryData(
        studyQuery(studyId).queryKey,
        (study: StudyView | undefined) =>
          study && {
            ...study,
            scenarios: study.scenarios.map((scenario) => ({
              ...scenario,
              latestRun: runs.find(({ scenarioId }) => scenarioId === scenario.id) ?? scenario.latestRun,
            })),
          },
      );
      return client.invalidateQueries({ queryKey: STUDIES_KEY });
    },
  });
}

/** Asks a run to stop, or to be tried again. What becomes of it comes with the events and from the row. */
export function useRunAction(action: 'cancel' | 'retry') {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (runId: string) => requestRaw(`POST /api/runs/{id}/${action}`, { params: { id: runId } }),
    onSettled: () => client.invalidateQueries({ queryKey: STUDIES_KEY }),
  });
}
