import { pageOf, pageQuerySchema, weatherYearSchema } from '@noonwell/schema';
import { keepPreviousData, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { requestColumns } from './arrow.js';
import { request, requestRaw } from './client.js';

export const WEATHER_KEY = ['weather-years'] as const;

/** The longest page that the API gives, for choosing from all years at once. */
export const MOST_LISTED = pageQuerySchema.shape.pageSize.unwrap().maxValue ?? 50;

export function weatherYearsQuery(page: number, pageSize: number) {
  return queryOptions({
    queryKey: [...WEATHER_KEY, 'list', { page, pageSize }],
    queryFn: ({ signal }) =>
      request('GET /api/weather-years', pageOf(weatherYearSchema), { query: { page, pageSize }, signal }),
    placeholderData: keepPreviousData,
  });
}

export function weatherYearQuery(id: string) {
  return queryOptions({
    queryKey: [...WEATHER_KEY, 'one', id],
    queryFn: ({ signal }) =>
      request('GET /api/weather-years/{id}', weatherYearSchema, { params: { id }, signal }),
  });
}

/** Hourly columns of a weather year; they never change, so they are never fetched twice. */
export function weatherColumnsQuery(id: string) {
  return queryOptions({
    queryKey: [...WEATHER_KEY, 'columns', id],
    queryFn: ({ signal }) =>
      requestColumns('GET /api/weather-years/{id}/columns', { params: { id }, signal }),
    staleTime: Infinity,
  });
}

export function useDeleteWeatherYear() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) => requestRaw('DELETE /api/weather-years/{id}', { params: { id } }),
    onSuccess: (_, id) => {
      client.removeQueries({ queryKey: weatherYearQuery(id).queryKey });
      return client.invalidateQueries({ queryKey: [...WEATHER_KEY, 'list'] });
    },
  });
}
