import { loadPageSchema, loadViewSchema, waitingJobsSchema, type CorrectLoad, type CreateLoad, type LoadView } from '@shared/burnouts';
import { queryOptions, useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { http } from '../../../lib/http.js';
import { jobKeys } from '../../../lib/job-queries.js';

export const loadKeys = { all: ['burnouts'] as const };

export const loadsQuery = (query: string) => queryOptions({ queryKey: [...loadKeys.all, 'list', query], queryFn: ({ signal }) => http.get(`/burnouts?${query}`, loadPageSchema, { signal }) });
export const loadQuery = (id: string) => queryOptions({ queryKey: [...loadKeys.all, 'one', id], queryFn: ({ signal }) => http.get(`/burnouts/${id}`, loadViewSchema, { signal }) });
export const waitingJobsQuery = queryOptions({ queryKey: [...loadKeys.all, 'waiting'], queryFn: ({ signal }) => http.get('/burnouts/waiting', waitingJobsSchema, { signal }) });

/** The load itself is known at once; lists, charts and the sheets of its jobs are asked for again. */
async function kept(client: QueryClient, load: LoadView): Promise<void> {
  client.setQueryData(loadQuery(load.id).queryKey, load);
  await Promise.all([
    client.invalidateQueries({ queryKey: [...loadKeys.all, 'list'] }),
    client.invalidateQueries({ queryKey: [...loadKeys.all, 'waiting'] }),
    client.invalidateQueries({ queryKey: ['insight'] }),
    ...load.jobs.map((job) => client.invalidateQueries({ queryKey: jobKeys.sheet(job.jobId) })),
  ]);
}

export function useCreateLoad(idempotencyKey: string) {
  const client = useQueryClient();
  return useMutation({ mutationFn: (input: CreateLoad) => http.post('/burnouts', input, loadViewSchema, { idempotencyKey }), onSuccess: (load) => kept(client, load) });
}

export function useCorrectLoad(id: string) {
  const client = useQueryClient();
  return useMutation({ mutationFn: (input: CorrectLoad) => http.put(`/burnouts/${id}`, input, loadViewSchema), onSuccess: (load) => kept(client, load) });
}

export interface FileToSend {
  readonly file: File;
  readonly version: number;
  readonly hints: Readonly<Record<string, string>>;
  readonly idempotencyKey: string;
}
export function useSendFile(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ file, version, hints, idempotencyKey }: FileToSend) => http.upload(`/burnouts/${id}/file?${new URLSearchParams({ version: String(version), ...hints }).toString()}`, file, loadViewSchema, { idempotencyKey }),
    onSuccess: (load) => kept(client, load),
  });
}
