import type { ErrorCode } from '@shared/errors';
import { invoiceViewSchema, type InvoiceView, type IssueInvoice, type RecordPayment } from '@shared/invoices';
import { quoteViewSchema, type ApproveForCustomer, type CreateQuote, type QuoteView, type UpdateQuote, type VersionOnly } from '@shared/quotes';
import { useMutation, useQueryClient, type QueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { ApiError, http, newKey } from '../../../lib/http.js';
import { floorKeys } from '../../../lib/floor-queries.js';
import { jobKeys } from '../../../lib/job-queries.js';
import { accountsKeys, invoiceQuery, quoteQuery } from './accounts-queries.js';

/** After these the screen is older than the thing: it is asked for again, so that the next try is right. */
const STALE: readonly ErrorCode[] = ['STATE_NOT_RIGHT', 'ALREADY_DONE'];

/** A quote or an invoice moves gates and papers of its job as well. */
function refresh(client: QueryClient, jobId: string): Promise<unknown> {
  const keys = [accountsKeys.quotes, accountsKeys.invoices, jobKeys.sheet(jobId), floorKeys.all];
  return Promise.all(keys.map((queryKey) => client.invalidateQueries({ queryKey })));
}

type Send<Input, Answer> = (input: Input, options: { readonly idempotencyKey: string }) => Promise<Answer>;

/** One key for one filled form, however often it is sent; the next form gets the next key. */
function useSend<Input, Answer>(jobId: string, send: Send<Input, Answer>, done: (answer: Answer, client: QueryClient) => void, staleOn: readonly ErrorCode[] = STALE) {
  const client = useQueryClient();
  const [idempotencyKey, setKey] = useState(newKey);
  return useMutation({
    mutationFn: (input: Input) => send(input, { idempotencyKey }),
    onSuccess: (answer) => {
      setKey(newKey());
      done(answer, client);
      return refresh(client, jobId);
    },
    onError: (error) => {
      // a refused form is filled anew: the next try is another thing than the one before
      if (error instanceof ApiError && error.status >= 400 && error.status < 500) setKey(newKey());
      if (error instanceof ApiError && staleOn.includes(error.code as ErrorCode)) void refresh(client, jobId);
    },
  });
}

const keepQuote = (quote: QuoteView, client: QueryClient) => void client.setQueryData(quoteQuery(quote.id).queryKey, quote);
const keepInvoice = (invoice: InvoiceView, client: QueryClient) => void client.setQueryData(invoiceQuery(invoice.id).queryKey, invoice);
/** Where only the version counts, the newer state is shown and the person decides again. */
const ALSO_CHANGED: readonly ErrorCode[] = [...STALE, 'CHANGED_MEANWHILE'];

export const useCreateQuote = (jobId: string) => useSend(jobId, (input: CreateQuote, key) => http.post(`/jobs/${jobId}/quotes`, input, quoteViewSchema, key), keepQuote);
export const useUpdateQuote = (jobId: string, id: string) => useSend(jobId, (input: UpdateQuote) => http.put(`/quotes/${id}`, input, quoteViewSchema), keepQuote);
export const useSendQuote = (jobId: string, id: string) => useSend(jobId, (input: VersionOnly, key) => http.post(`/quotes/${id}/send`, input, quoteViewSchema, key), keepQuote, ALSO_CHANGED);
export const useReviseQuote = (jobId: string, id: string) => useSend(jobId, (input: VersionOnly, key) => http.post(`/quotes/${id}/revision`, input, quoteViewSchema, key), keepQuote, ALSO_CHANGED);
export const useApproveForCustomer = (jobId: string, id: string) => useSend(jobId, (input: ApproveForCustomer, key) => http.post(`/quotes/${id}/approval-for-customer`, input, quoteViewSchema, key), keepQuote, ALSO_CHANGED);
export const useIssueInvoice = (jobId: string) => useSend(jobId, (input: IssueInvoice, key) => http.post(`/jobs/${jobId}/invoices`, input, invoiceViewSchema, key), keepInvoice, ALSO_CHANGED);
export const useRecordPayment = (jobId: string, id: string) => useSend(jobId, (input: RecordPayment, key) => http.post(`/invoices/${id}/payments`, input, invoiceViewSchema, key), keepInvoice);
