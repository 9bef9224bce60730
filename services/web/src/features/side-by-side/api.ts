import { runSummarySchema } from '@noonwell/schema';
import { queryOptions, useQuery } from '@tanstack/react-query';
import { requestColumns } from '../../shared/api/arrow.js';
import { request } from '../../shared/api/client.js';
import { studyQuery } from '../../shared/api/studies.js';

/** A finished run never changes: what was fetched of it stays good. */
const FOR_EVER = { staleTime: Infinity } as const;
const WATCH_EVERY_MS = 2000;

export function runSummaryQuery(runId: string) {
  return queryOptions({
    queryKey: ['runs', runId, 'summary'],
    queryFn: ({ signal }) =>
      request('GET /api/runs/{id}/summary', runSummarySchema, { params: { id: runId }, signal }),
    ...FOR_EVER,
  });
}

/** The year's hours of some channels; the record's start comes with them. */
export function runColumnsQuery(runId: string, channels: readonly string[]) {
  return queryOptions({
    queryKey: ['runs', runId, 'columns', ...channels],
    queryFn: ({ signal }) =>
      requestColumns('GET /api/runs/{id}/columns', {
        params: { id: runId },
        query: { channels: channels.join(',') },
        signal,
      }),
    ...FOR_EVER,
  });
}

/** The study, looked at again while one of its runs is not over. */
export function useWatchedStudy(studyId: string) {
  return useQuery({
    ...studyQuery(studyId),
    refetchInterval: ({ state }) => ((state.data?.activeRuns ?? 0) > 0 ? WATCH_EVERY_MS : false),
  });
}
