import { INVOICE_STATES, invoiceQuerySchema, type InvoiceQuery } from '@shared/invoices';

/** The list of invoices as its address says it. What the address cannot mean is left out, so that an old link still opens. */
export type InvoiceFilter = Partial<Pick<InvoiceQuery, 'state' | 'q' | 'page'>>;
const KEYS = ['state', 'q', 'page'] as const;
export const STATE_FILTERS = ['all', ...INVOICE_STATES, 'overdue'] as const;

export function filterOf(params: URLSearchParams): InvoiceFilter {
  const filter: Record<string, unknown> = {};
  for (const key of KEYS) {
    const value = params.get(key);
    if (value === null || value.trim() === '') continue;
    const parsed = invoiceQuerySchema.shape[key].safeParse(value);
    if (parsed.success) filter[key] = parsed.data;
  }
  return filter as InvoiceFilter;
}

/** As the server takes it, in one order, so that the same list is asked for once. */
export function paramsOf(filter: InvoiceFilter): string {
  const params = new URLSearchParams();
  for (const key of KEYS) if (filter[key] !== undefined) params.set(key, String(filter[key]));
  return params.toString();
}

export const isFiltered = ({ state, q }: InvoiceFilter): boolean => (state !== undefined && state !== 'all') || Boolean(q);
