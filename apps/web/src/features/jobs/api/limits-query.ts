import { limitsVersionViewSchema } from '@shared/limits';
import { queryOptions } from '@tanstack/react-query';
import { z } from 'zod';
import { http } from '../../../lib/http.js';

/** The published versions of the acceptance limits, the newest first. */
export const limitsVersionsQuery = queryOptions({
  queryKey: ['limits', 'all'],
  queryFn: async ({ signal }) => [...(await http.get('/limits', z.array(limitsVersionViewSchema), { signal }))].sort((a, b) => b.version - a.version),
  staleTime: 60_000,
});
