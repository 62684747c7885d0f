import { ovenInsightSchema, ovenListSchema, type AddOvenHistory, type OvenInsight } from '@shared/insight';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { http } from '../../../lib/http.js';

export const insightKeys = { all: ['insight'] as const };

export const ovensQuery = queryOptions({ queryKey: [...insightKeys.all, 'ovens'], queryFn: ({ signal }) => http.get('/insight/ovens', ovenListSchema, { signal }) });
export const ovenQuery = (ovenId: string) =>
  queryOptions({ queryKey: [...insightKeys.all, 'oven', ovenId], queryFn: ({ signal }) => http.get(`/insight/ovens/${encodeURIComponent(ovenId)}`, ovenInsightSchema, { signal }) });

function useAnswerKept() {
  const client = useQueryClient();
  return (oven: OvenInsight) => void client.setQueryData(ovenQuery(oven.oven.id).queryKey, oven);
}

export function useAddHistory(ovenId: string, idempotencyKey: string) {
  const onSuccess = useAnswerKept();
  return useMutation({ mutationFn: (input: AddOvenHistory) => http.post(`/insight/ovens/${encodeURIComponent(ovenId)}/history`, input, ovenInsightSchema, { idempotencyKey }), onSuccess });
}

export function useWithdraw(entryId: string, idempotencyKey: string) {
  const onSuccess = useAnswerKept();
  return useMutation({ mutationFn: (reason: string) => http.post(`/insight/history/${entryId}/withdrawal`, { reason }, ovenInsightSchema, { idempotencyKey }), onSuccess });
}
