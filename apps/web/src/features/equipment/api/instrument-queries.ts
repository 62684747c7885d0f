import { instrumentDetailSchema, instrumentDueListSchema, measuredPageSchema, type AddCalibration } from '@shared/calibrations';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { ApiError, http, newKey } from '../../../lib/http.js';
import { bayQuery } from '../../../lib/job-records.js';

/** Under the register's own key: whoever changes the register makes these stale too. */
const keys = { all: ['instruments'] as const };

export const dueQuery = queryOptions({ queryKey: [...keys.all, 'due'], queryFn: ({ signal }) => http.get('/instruments/due', instrumentDueListSchema, { signal }) });
export const instrumentQuery = (id: string) => queryOptions({ queryKey: [...keys.all, id], queryFn: ({ signal }) => http.get(`/instruments/${id}`, instrumentDetailSchema, { signal }) });

export interface MeasuredParams {
  readonly from?: string;
  readonly to?: string;
  readonly page?: string;
}
export const measuredQuery = (id: string, params: MeasuredParams) => {
  const given = Object.entries(params).filter((entry): entry is [string, string] => typeof entry[1] === 'string' && entry[1] !== '');
  return queryOptions({
    queryKey: [...keys.all, id, 'records', Object.fromEntries(given)],
    queryFn: ({ signal }) => http.get(`/instruments/${id}/records?${new URLSearchParams([...given, ['size', '25']])}`, measuredPageSchema, { signal }),
    placeholderData: (old) => old,
  });
};

function useInstrumentChanged() {
  const client = useQueryClient();
  return () => Promise.all([client.invalidateQueries({ queryKey: keys.all }), client.invalidateQueries({ queryKey: bayQuery.queryKey })]);
}

export function useAddCalibration(id: string) {
  const changed = useInstrumentChanged();
  const [idempotencyKey, setKey] = useState(newKey);
  return useMutation({
    mutationFn: (input: AddCalibration) => http.post(`/instruments/${id}/calibrations`, input, instrumentDetailSchema, { idempotencyKey }),
    onSuccess: changed,
    // what is put right and sent again is another thing; what was not heard may have been done
    onError: (error) => {
      if (!(error instanceof ApiError && error.code === 'UNREACHABLE')) setKey(newKey());
    },
  });
}

export function useAddCertificate(id: string) {
  const changed = useInstrumentChanged();
  return useMutation({
    mutationFn: ({ calibrationId, file, key }: { readonly calibrationId: string; readonly file: File; readonly key: string }) =>
      http.upload(`/instruments/${id}/calibrations/${calibrationId}/certificate`, file, instrumentDetailSchema, { idempotencyKey: key }),
    onSuccess: changed,
  });
}
