import type { LoaderFunctionArgs, RouteObject } from 'react-router-dom';
import { invoicePageQuery, invoiceQuery, quoteQuery, waitingQuotesQuery } from '../../features/accounts/api/accounts-queries.js';
import { filterOf, paramsOf } from '../../features/accounts/invoice-filter.js';
import { meQuery } from '../../lib/me.js';
import { queryClient } from '../query-client.js';

/** What a page will ask for starts with its code; the page itself shows how it went. */
function warmList({ request }: LoaderFunctionArgs): null {
  const may = queryClient.getQueryData(meQuery.queryKey)?.permissions ?? [];
  if (may.includes('quotes.read')) void queryClient.prefetchQuery(waitingQuotesQuery);
  if (may.includes('invoices.read')) void queryClient.prefetchQuery(invoicePageQuery(paramsOf(filterOf(new URL(request.url).searchParams))));
  return null;
}
const warmQuote = ({ params }: LoaderFunctionArgs): null => (void queryClient.prefetchQuery(quoteQuery(params['id'] ?? '')), null);
const warmInvoice = ({ params }: LoaderFunctionArgs): null => (void queryClient.prefetchQuery(invoiceQuery(params['id'] ?? '')), null);

export const accountsRoutes: RouteObject[] = [
  { path: 'accounts', loader: warmList, lazy: () => import('./accounts/accounts-page.js').then((m) => ({ Component: m.AccountsPage })) },
  { path: 'accounts/quotes/:id', loader: warmQuote, lazy: () => import('./accounts/quote-page.js').then((m) => ({ Component: m.QuotePage })) },
  { path: 'accounts/invoices/:id', loader: warmInvoice, lazy: () => import('./accounts/invoice-page.js').then((m) => ({ Component: m.InvoicePage })) },
  { path: 'jobs/:jobId/quotes/new', lazy: () => import('./accounts/new-quote-page.js').then((m) => ({ Component: m.NewQuotePage })) },
];
