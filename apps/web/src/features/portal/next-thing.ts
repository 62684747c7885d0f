import type { PortalHome } from '@shared/portal';

type Quote = PortalHome['quotesToAnswer'][number];
type Invoice = PortalHome['invoicesToPay'][number];
export type Thing = { readonly kind: 'quote'; readonly quote: Quote } | { readonly kind: 'invoice'; readonly invoice: Invoice };

/**
 * What the customer is asked to do, the most pressing first: a late invoice, then quotes (a machine stands still until
 * one is answered), then invoices by their day.
 */
export function thingsToDo({ quotesToAnswer, invoicesToPay }: Pick<PortalHome, 'quotesToAnswer' | 'invoicesToPay'>): Thing[] {
  const byDay = [...invoicesToPay].sort((a, b) => a.dueOn.localeCompare(b.dueOn));
  const quotes = [...quotesToAnswer].sort((a, b) => a.validUntil.localeCompare(b.validUntil));
  const invoice = (of: Invoice): Thing => ({ kind: 'invoice', invoice: of });
  return [...byDay.filter((i) => i.overdue).map(invoice), ...quotes.map((quote): Thing => ({ kind: 'quote', quote })), ...byDay.filter((i) => !i.overdue).map(invoice)];
}
