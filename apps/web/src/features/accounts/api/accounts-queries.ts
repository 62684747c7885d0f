import { invoicePageSchema, invoiceViewSchema } from '@shared/invoices';
import { floorPageSchema } from '@shared/jobs';
import { quoteViewSchema } from '@shared/quotes';
import { queryOptions } from '@tanstack/react-query';
import { z } from 'zod';
import { http } from '../../../lib/http.js';

/** Quotes and invoices of a job hang under the job's own key, so that a change of it refreshes them too. */
export const accountsKeys = {
  quotes: ['quotes'] as const,
  invoices: ['invoices'] as const,
  waiting: ['quotes', 'waiting'] as const,
};

export const quotesOfJobQuery = (jobId: string) =>
  queryOptions({ queryKey: ['jobs', jobId, 'quotes'], queryFn: ({ signal }) => http.get(`/jobs/${jobId}/quotes`, z.array(quoteViewSchema), { signal }) });

export const invoicesOfJobQuery = (jobId: string) =>
  queryOptions({ queryKey: ['jobs', jobId, 'invoices'], queryFn: ({ signal }) => http.get(`/jobs/${jobId}/invoices`, z.array(invoiceViewSchema), { signal }) });

export const quoteQuery = (id: string) => queryOptions({ queryKey: [...accountsKeys.quotes, id], queryFn: ({ signal }) => http.get(`/quotes/${id}`, quoteViewSchema, { signal }) });

export const invoiceQuery = (id: string) => queryOptions({ queryKey: [...accountsKeys.invoices, id], queryFn: ({ signal }) => http.get(`/invoices/${id}`, invoiceViewSchema, { signal }) });

export const invoicePageQuery = (params: string) =>
  queryOptions({
    queryKey: [...accountsKeys.invoices, 'page', params],
    queryFn: ({ signal }) => http.get(`/invoices${params === '' ? '' : `?${params}`}`, invoicePageSchema, { signal }),
    placeholderData: (old) => old,
  });

/** Jobs that stand at the approval, each with its quotes: what is drafted, what is sent, what has no quote yet. */
export const waitingQuotesQuery = queryOptions({
  queryKey: accountsKeys.waiting,
  queryFn: async ({ signal }) => {
    const jobs = await http.get('/jobs?step=awaiting-approval&size=30', floorPageSchema, { signal });
    const quotes = await Promise.all(jobs.rows.map((job) => http.get(`/jobs/${job.id}/quotes`, z.array(quoteViewSchema), { signal })));
    return { total: jobs.total, jobs: jobs.rows.map((job, i) => ({ job, quotes: quotes[i]! })) };
  },
});
