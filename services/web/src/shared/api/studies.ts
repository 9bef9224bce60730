import {
  pageOf,
  studySchema,
  studySummarySchema,
  type changeStudyRequestSchema,
  type createStudyRequestSchema,
} from '@noonwell/schema';
import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { request, requestRaw } from './client.js';

/** Every query about studies starts with this key: invalidate it after any change. */
export const STUDIES_KEY = ['studies'] as const;

export function studiesQuery(page: number, pageSize: number) {
  return queryOptions({
    queryKey: [...STUDIES_KEY, 'list', { page, pageSize }],
    queryFn: ({ signal }) =>
      request('GET /api/studies', pageOf(studySummarySchema), { query: { page, pageSize }, signal }),
    placeholderData: keepPreviousData,
  });
}

/** The study with its scenarios, each with its newest version and that version's newest run. */
export function studyQuery(studyId: string) {
  return queryOptions({
    queryKey: [...STUDIES_KEY, 'one', studyId],
    queryFn: ({ signal }) =>
      request('GET /api/studies/{id}', studySchema, { params: { id: studyId }, signal }),
  });
}

export function useCreateStudy() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof createStudyRequestSchema>) =>
      request('POST /api/studies', studySchema, { body }),
    onSuccess: (study) => {
      client.setQueryData(studyQuery(study.id).queryKey, study);
      return client.invalidateQueries({ queryKey: [...STUDIES_KEY, 'list'] });
    },
  });
}

export function useChangeStudy(studyId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof changeStudyRequestSchema>) =>
      request('PATCH /api/studies/{id}', studySchema, { params: { id: studyId }, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: STUDIES_KEY }),
  });
}

export function useDeleteStudy() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (studyId: string) => requestRaw('DELETE /api/studies/{id}', { params: { id: studyId } }),
    onSuccess: (_, studyId) => {
      client.removeQueries({ queryKey: studyQuery(studyId).queryKey });
      return client.invalidateQueries({ queryKey: [...STUDIES_KEY, 'list'] });
    },
  });
}

/** Points every scenario of a study at one weather year: a new version of each that changes. */
export function usePointStudyAtWeather(studyId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (weatherYearId: string) =>
      request('PUT /api/studies/{id}/weather-year', studySchema, {
        params: { id: studyId },
        body: { weatherYearId },
      }),
    onSuccess: (study) => {
      client.setQueryData(studyQuery(studyId).queryKey, study);
      return client.invalidateQueries({ queryKey: STUDIES_KEY });
    },
  });
}
