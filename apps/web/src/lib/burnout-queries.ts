import { jobLoadsSchema } from '@shared/burnouts';
import { queryOptions } from '@tanstack/react-query';
import { http } from './http.js';
import { jobKeys } from './job-queries.js';

/** The burnout loads a job stood in, the newest first. */
export const jobLoadsQuery = (jobId: string) =>
  queryOptions({ queryKey: [...jobKeys.sheet(jobId), 'burnouts'], queryFn: ({ signal }) => http.get(`/jobs/${jobId}/burnouts`, jobLoadsSchema, { signal }) });
