import { newScenario, scenarioViewSchema, type ReceiverKind, type StudyView } from '@noonwell/schema';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { request, requestRaw } from '../../shared/api/client.js';
import { STUDIES_KEY } from '../../shared/api/studies.js';

export interface NewScenarioValues {
  name: string;
  receiver: ReceiverKind;
}

/** Adds the default machine with the chosen receiver, on the weather year that the study's first scenario uses. */
export function useCreateScenario(study: StudyView) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ name, receiver }: NewScenarioValues) =>
      request('POST /api/studies/{id}/scenarios', scenarioViewSchema, {
        params: { id: study.id },
        body: {
          name,
          document: newScenario(receiver),
          weatherYearId: study.scenarios[0]?.weatherYearId ?? null,
        },
      }),
    onSuccess: () => client.invalidateQueries({ queryKey: STUDIES_KEY }),
  });
}

export function useDeleteScenario(studyId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => requestRaw('DELETE /api/scenarios/{id}', { params: { id } }),
    onSuccess: () => client.invalidateQueries({ queryKey: [...STUDIES_KEY, 'one', studyId] }),
  });
}
