import { checkoutStartedSchema, invoiceViewSchema, paymentReturnSchema, type InvoiceView } from '@shared/invoices';
import { portalHomeSchema, portalJobSchema, portalMachinesSchema } from '@shared/portal';
import { quoteViewSchema, type ApproveInPortal, type DeclineQuote, type QuoteView } from '@shared/quotes';
import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { ApiError, http, newKey } from '../../../lib/http.js';

export const portalKeys = { all: ['portal'] as const };

export const portalHomeQuery = queryOptions({ queryKey: [...portalKeys.all, 'home'], queryFn: ({ signal }) => http.get('/portal', portalHomeSchema, { signal }) });
export const portalMachinesQuery = queryOptions({ queryKey: [...portalKeys.all, 'machines'], queryFn: ({ signal }) => http.get('/portal/machines', portalMachinesSchema, { signal }) });
export const portalJobQuery = (id: string) => queryOptions({ queryKey: [...portalKeys.all, 'jobs', id], queryFn: ({ signal }) => http.get(`/portal/jobs/${id}`, portalJobSchema, { signal }) });
export const portalQuoteQuery = (id: string) => queryOptions({ queryKey: [...portalKeys.all, 'quotes', id], queryFn: ({ signal }) => http.get(`/portal/quotes/${id}`, quoteViewSchema, { signal }) });
export const portalInvoiceQuery = (id: string) => queryOptions({ queryKey: [...portalKeys.all, 'invoices', id], queryFn: ({ signal }) => http.get(`/portal/invoices/${id}`, invoiceViewSchema, { signal }) });

/** Asked this often, this long apart, before the customer is asked to look again later. */
const ASKS = 6;
const EVERY_MS = 2_500;

/** What became of a payment; a bank that has not confirmed yet is asked again a few times. */
export const paymentReturnQuery = (invoiceId: string, sessionId: string) =>
  queryOptions({
    queryKey: [...portalKeys.all, 'payment-return', invoiceId, sessionId],
    queryFn: ({ signal }) => http.get(`/portal/invoices/${invoiceId}/payment-return?session_id=${encodeURIComponent(sessionId)}`, paymentReturnSchema, { signal }),
    refetchInterval: ({ state }) => (state.data?.outcome === 'not-yet' && state.dataUpdateCount < ASKS ? EVERY_MS : false),
  });
export const stillAsks = (updates: number): boolean => updates < ASKS;

/** An answer to a quote changes the job, the overview and the quote itself. */
function useAnswer<Input>(id: string, path: string) {
  const client = useQueryClient();
  const [idempotencyKey, setKey] = useState(newKey);
  return useMutation({
    mutationFn: (input: Input) => http.post(`/portal/quotes/${id}/${path}`, input, quoteViewSchema, { idempotencyKey }),
    onSuccess: (quote: QuoteView) => {
      client.setQueryData(portalQuoteQuery(id).queryKey, quote);
      return client.invalidateQueries({ queryKey: portalKeys.all });
    },
    onError: (error) => {
      if (!(error instanceof ApiError) || error.status < 400 || error.status >= 500) return;
      setKey(newKey());
      // it stands differently than the page shows: the page follows
      if (error.code !== 'INPUT_NOT_VALID') void client.invalidateQueries({ queryKey: portalKeys.all });
    },
  });
}
export const useApproveQuote = (id: string) => useAnswer<ApproveInPortal>(id, 'approval');
export const useDeclineQuote = (id: string) => useAnswer<DeclineQuote>(id, 'decline');

/** Leads to the payment page. Whatever the page showed, the amount comes from the shop. */
export function useStartCheckout(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ version }: Pick<InvoiceView, 'version'>) => http.post(`/portal/invoices/${id}/checkout`, { version }, checkoutStartedSchema),
    onError: () => client.invalidateQueries({ queryKey: portalKeys.all }),
  });
}
