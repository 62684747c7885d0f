import { instrumentViewSchema, type CreateInstrument } from '@shared/instruments';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { z } from 'zod';
import { http } from '../../../lib/http.js';
import { bayQuery } from '../../../lib/job-records.js';

export const instrumentsQuery = queryOptions({ queryKey: ['instruments'], queryFn: ({ signal }) => http.get('/instruments', z.array(instrumentViewSchema), { signal }) });

export interface InstrumentChange {
  readonly input: CreateInstrument;
  /** the instrument that is changed, as it was read; null for a new one */
  readonly of: { readonly id: string; readonly version: number } | null;
}

export function useKeepInstrument(idempotencyKey: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ input, of }: InstrumentChange) =>
      of ? http.put(`/instruments/${of.id}`, { ...input, version: of.version }, instrumentViewSchema) : http.post('/instruments', input, instrumentViewSchema, { idempotencyKey }),
    onSuccess: () => Promise.all([client.invalidateQueries({ queryKey: instrumentsQuery.queryKey }), client.invalidateQueries({ queryKey: bayQuery.queryKey })]),
  });
}
