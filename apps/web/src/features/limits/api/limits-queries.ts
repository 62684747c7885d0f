import { limitsComparisonSchema, limitsVersionViewSchema, type PublishLimits } from '@shared/limits';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { z } from 'zod';
import { ApiError, http, newKey } from '../../../lib/http.js';

const keys = { all: ['limits'] as const };

/** Every published version, the newest first. */
export const limitVersionsQuery = queryOptions({
  queryKey: [...keys.all, 'versions'],
  queryFn: async ({ signal }) => [...(await http.get('/limits', z.array(limitsVersionViewSchema), { signal }))].sort((a, b) => b.version - a.version),
});

/** Two versions never change, so neither does what differs between them. */
export const comparisonQuery = (from: number, to: number) =>
  queryOptions({ queryKey: [...keys.all, 'compare', from, to], queryFn: ({ signal }) => http.get(`/limits/${from}/compare/${to}`, limitsComparisonSchema, { signal }), staleTime: Infinity });

export function usePublishLimits() {
  const client = useQueryClient();
  const [idempotencyKey, setKey] = useState(newKey);
  return useMutation({
    mutationFn: (input: PublishLimits) => http.post('/limits', input, limitsVersionViewSchema, { idempotencyKey }),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.all }),
    // what is put right and sent again is another thing; what was not heard may have been done
    onError: (error) => {
      if (!(error instanceof ApiError && error.code === 'UNREACHABLE')) setKey(newKey());
    },
  });
}
