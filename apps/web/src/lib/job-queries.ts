import { historySchema } from '@shared/jobs';
import { queryOptions } from '@tanstack/react-query';
import { http } from './http.js';

/** Everything that belongs to one job hangs under its identifier: one stroke makes all of it stale. */
export const jobKeys = { sheet: (id: string) => ['jobs', id] as const };

export const jobHistoryQuery = (id: string) => queryOptions({ queryKey: ['jobs', id, 'history'], queryFn: ({ signal }) => http.get(`/jobs/${id}/history`, historySchema, { signal }) });
