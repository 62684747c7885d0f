import { createdJobSchema, tagSchema, type BookIn } from '@shared/jobs';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { customerKeys, machineKeys } from '../../../lib/customer-queries.js';
import { floorKeys } from '../../../lib/floor-queries.js';
import { http, newKey } from '../../../lib/http.js';

/** One key for one filled form: a double tap, or a try after a lost answer, books one job in. */
export function useBookIn() {
  const client = useQueryClient();
  const [idempotencyKey] = useState(newKey);
  return useMutation({
    mutationFn: (input: BookIn) => http.post('/jobs', input, createdJobSchema, { idempotencyKey }),
    onSuccess: () => Promise.all([floorKeys.all, customerKeys.all, machineKeys.all].map((queryKey) => client.invalidateQueries({ queryKey }))),
  });
}

export function usePrintTag(jobId: string) {
  const [idempotencyKey] = useState(newKey);
  return useMutation({ mutationFn: () => http.post(`/jobs/${jobId}/tag`, {}, tagSchema, { idempotencyKey }) });
}
