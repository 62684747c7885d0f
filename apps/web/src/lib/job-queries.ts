import { historySchema, jobSheetSchema } from '@shared/jobs';
import { recordListSchema } from '@shared/records';
import { queryOptions } from '@tanstack/react-query';
import { http } from './http.js';

/** Everything that belongs to one job hangs under its identifier: one stroke makes all of it stale. */
export const jobKeys = {
  sheet: (id: string) => ['jobs', id] as const,
  records: (id: string) => ['jobs', id, 'records'] as const,
  history: (id: string) => ['jobs', id, 'history'] as const,
};

export const jobSheetQuery = (id: string) => queryOptions({ queryKey: jobKeys.sheet(id), queryFn: ({ signal }) => http.get(`/jobs/${id}`, jobSheetSchema, { signal }) });
export const jobRecordsQuery = (id: string) => queryOptions({ queryKey: jobKeys.records(id), queryFn: ({ signal }) => http.get(`/jobs/${id}/records`, recordListSchema, { signal }) });
export const jobHistoryQuery = (id: string) => queryOptions({ queryKey: jobKeys.history(id), queryFn: ({ signal }) => http.get(`/jobs/${id}/history`, historySchema, { signal }) });
