import type { ErrorCode } from '@shared/errors';
import { deliverySchema, jobSheetSchema, tagSchema, type EndJob, type HoldJob, type JobSheet, type MoveJob, type MoveLimits, type RecordDelivery, type ResumeJob, type UpdateJob } from '@shared/jobs';
import { paperViewSchema, type IssueCertificate } from '@shared/papers';
import { signOffSchema, type AskWaiver, type Countersign, type LiftCredit, type RecordDecision, type ReleaseInconclusive, type SignConcession, type SignRecord } from '@shared/waivers';
import { useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { floorKeys } from '../../../lib/floor-queries.js';
import { ApiError, http, newKey } from '../../../lib/http.js';
import { jobKeys } from '../../../lib/job-queries.js';

/** After these the sheet on the screen is older than the job: it is asked for again, so that the next try is right. */
const STALE: readonly ErrorCode[] = ['CHANGED_MEANWHILE', 'GATE_SHUT', 'MOVE_NOT_ALLOWED', 'STATE_NOT_RIGHT', 'ALREADY_DONE'];

function refresh(client: QueryClient, jobId: string): Promise<unknown> {
  return Promise.all([client.invalidateQueries({ queryKey: jobKeys.sheet(jobId) }), client.invalidateQueries({ queryKey: floorKeys.all })]);
}

type Send<Input, Answer> = (input: Input, options: { readonly idempotencyKey: string }) => Promise<Answer>;

/** One key for one filled form, however often it is sent; the next form gets the next key. */
function useSend<Input, Answer>(jobId: string, send: Send<Input, Answer>, done?: (answer: Answer, client: QueryClient) => void) {
  const client = useQueryClient();
  const [idempotencyKey, setKey] = useState(newKey);
  return useMutation({
    mutationFn: (input: Input) => send(input, { idempotencyKey }),
    onSuccess: (answer) => {
      setKey(newKey());
      done?.(answer, client);
      return refresh(client, jobId);
    },
    onError: (error) => {
      if (error instanceof ApiError && STALE.includes(error.code as ErrorCode)) void refresh(client, jobId);
    },
  });
}

/** A change of a job: the new sheet stands at once, and everything around it is asked for again. */
const useChange = <Input>(jobId: string, send: Send<Input, JobSheet>) => useSend(jobId, send, (sheet, client) => client.setQueryData(jobKeys.sheet(jobId), sheet));

export const useMoveJob = (id: string) => useChange(id, (input: MoveJob, key) => http.post(`/jobs/${id}/moves`, input, jobSheetSchema, key));
export const useHoldJob = (id: string) => useChange(id, (input: HoldJob, key) => http.post(`/jobs/${id}/hold`, input, jobSheetSchema, key));
export const useResumeJob = (id: string) => useChange(id, (input: ResumeJob, key) => http.post(`/jobs/${id}/resume`, input, jobSheetSchema, key));
export const useEndJob = (id: string) => useChange(id, (input: EndJob, key) => http.post(`/jobs/${id}/end`, input, jobSheetSchema, key));
export const useMoveLimits = (id: string) => useChange(id, (input: MoveLimits, key) => http.post(`/jobs/${id}/limits`, input, jobSheetSchema, key));
export const useUpdateJob = (id: string) => useChange(id, (input: UpdateJob) => http.put(`/jobs/${id}`, input, jobSheetSchema));

export const useAskWaiver = (id: string) => useSend(id, (input: AskWaiver, key) => http.post(`/jobs/${id}/waiver`, input, signOffSchema, key));
export const useCountersign = (id: string, waiverId: string) => useSend(id, (input: Countersign, key) => http.post(`/waivers/${waiverId}/countersignature`, input, signOffSchema, key));
export const useRecordDecision = (id: string) => useSend(id, (input: RecordDecision, key) => http.post(`/jobs/${id}/decisions`, input, signOffSchema, key));
export const useSignConcession = (id: string) => useSend(id, (input: SignConcession, key) => http.post(`/jobs/${id}/concession`, input, signOffSchema, key));
export const useReleaseInconclusive = (id: string, recordId: string) => useSend(id, (input: ReleaseInconclusive, key) => http.post(`/records/${recordId}/inconclusive-release`, input, signOffSchema, key));
export const useSignTested = (id: string, recordId: string) => useSend(id, (input: SignRecord, key) => http.post(`/records/${recordId}/signature`, input, signOffSchema, key));
export const useReleaseTested = (id: string, recordId: string) => useSend(id, (input: SignRecord, key) => http.post(`/records/${recordId}/release`, input, signOffSchema, key));
export const useLiftCredit = (id: string) => useSend(id, (input: LiftCredit, key) => http.post(`/jobs/${id}/credit-lift`, input, signOffSchema, key));

export const useIssueCertificate = (id: string) => useSend(id, (input: IssueCertificate, key) => http.post(`/jobs/${id}/certificate`, input, paperViewSchema, key));
export const useRecordDelivery = (id: string) => useSend(id, (input: RecordDelivery, key) => http.post(`/jobs/${id}/delivery`, input, deliverySchema, key));
export const usePrintTag = (id: string) => useSend(id, (_: void, key) => http.post(`/jobs/${id}/tag`, {}, tagSchema, key));
