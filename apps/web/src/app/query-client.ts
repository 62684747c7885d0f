import { QueryClient } from '@tanstack/react-query';
import { ApiError } from '../lib/http.js';

/** A refusal is not asked again; a shop's computer that did not answer is, twice. */
export const queryClient = new QueryClient({
  defaultOptions: {
    queries: { staleTime: 5_000, retry: (count, error) => count < 2 && error instanceof ApiError && (error.status === 0 || error.status >= 500) },
    mutations: { retry: false },
  },
});
