import { certificateCheckSchema } from '@shared/papers';
import { queryOptions } from '@tanstack/react-query';
import { http } from '../../../lib/http.js';

export const checkQuery = (code: string) => queryOptions({ queryKey: ['check', code], queryFn: ({ signal }) => http.get(`/check/${encodeURIComponent(code)}`, certificateCheckSchema, { signal }), staleTime: 60_000 });
