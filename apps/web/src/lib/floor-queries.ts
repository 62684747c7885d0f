import { floorPageSchema, floorStepsSchema } from '@shared/jobs';
import { queryOptions } from '@tanstack/react-query';
import { http } from './http.js';

/** Lists of jobs, as the floor and the counter ask for them. Every change of a job makes them stale. */
export const floorKeys = { all: ['floor'] as const };

export const floorPageQuery = (params: string) =>
  queryOptions({
    queryKey: [...floorKeys.all, 'page', params],
    queryFn: ({ signal }) => http.get(`/jobs${params === '' ? '' : `?${params}`}`, floorPageSchema, { signal }),
    placeholderData: (old) => old,
  });

export const floorStepsQuery = queryOptions({
  queryKey: [...floorKeys.all, 'steps'],
  queryFn: ({ signal }) => http.get('/jobs/steps', floorStepsSchema, { signal }),
});
