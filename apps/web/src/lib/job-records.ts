import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { Entered } from '@shared/fields';
import { bayViewSchema } from '@shared/instruments';
import { limitsVersionViewSchema, type LimitsSet } from '@shared/limits';
import { recordListSchema, recordViewSchema, type ReadingsOf, type RecordKind, type RecordView } from '@shared/records';
import { http } from './http.js';
import { floorKeys } from './floor-queries.js';
import { jobKeys } from './job-queries.js';

export const revisionsQuery = (recordId: string) =>
  queryOptions({ queryKey: ['records', recordId, 'revisions'], queryFn: ({ signal }) => http.get(`/records/${recordId}/revisions`, recordListSchema, { signal }) });

/** A published version of the limits never changes, so it is asked for once. */
export const limitsQuery = (version: number) =>
  queryOptions({
    queryKey: ['limits', version],
    queryFn: async ({ signal }) => (await http.get(`/limits/${version}`, limitsVersionViewSchema, { signal })).set as unknown as LimitsSet,
    staleTime: Infinity,
  });

export const bayQuery = queryOptions({ queryKey: ['bay'], queryFn: ({ signal }) => http.get('/bay', bayViewSchema, { signal }), staleTime: 60_000 });

export const recordsOfKind = (records: readonly RecordView[], kind: RecordKind): RecordView[] => records.filter((r) => r.kind === kind).sort((a, b) => a.ordinal - b.ordinal);
export const lastOfKind = (records: readonly RecordView[], kind: RecordKind): RecordView | undefined => recordsOfKind(records, kind).at(-1);
/** The readings of a record that is known to be of this kind; the server took them by the same contract. */
export const readingsOf = <K extends RecordKind>(record: RecordView & { readonly kind: RecordKind }, _kind: K): ReadingsOf<K> => record.readings as unknown as ReadingsOf<K>;

export interface RecordToKeep {
  readonly kind: RecordKind;
  readonly readings: unknown;
  readonly entered: Entered;
}
export interface Correction {
  readonly recordId: string;
  readonly version: number;
  readonly reason: string;
}

/** Keeps a new record, or the next revision of one that is corrected with a reason. */
export function useKeepRecord(jobId: string, idempotencyKey: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ record, correction }: { readonly record: RecordToKeep; readonly correction: Correction | null }) =>
      correction
        ? http.post(`/records/${correction.recordId}/revisions`, { version: correction.version, reason: correction.reason, record }, recordViewSchema, { idempotencyKey })
        : http.post(`/jobs/${jobId}/records`, { record }, recordViewSchema, { idempotencyKey }),
    onSuccess: async (kept) => {
      await Promise.all([
        client.invalidateQueries({ queryKey: jobKeys.sheet(jobId) }),
        client.invalidateQueries({ queryKey: ['records', kept.id] }),
        client.invalidateQueries({ queryKey: floorKeys.all }),
      ]);
    },
  });
}
