import type { LoaderFunctionArgs, RouteObject } from 'react-router-dom';
import { portalHomeQuery, portalInvoiceQuery, portalJobQuery, portalMachinesQuery, portalQuoteQuery } from '../../features/portal/api/portal-queries.js';
import { queryClient } from '../query-client.js';

/** What a page will ask for starts with its code; the page itself shows how it went. */
const warm = (ask: (id: string) => Promise<void>) =>
  ({ params }: LoaderFunctionArgs): null => {
    void ask(params['id'] ?? '');
    return null;
  };

export const portalRoutes: RouteObject[] = [
  { path: 'portal', loader: warm(() => queryClient.prefetchQuery(portalHomeQuery)), lazy: () => import('./portal/portal-home-page.js').then((m) => ({ Component: m.PortalHomePage })) },
  { path: 'portal/machines', loader: warm(() => queryClient.prefetchQuery(portalMachinesQuery)), lazy: () => import('./portal/portal-machines-page.js').then((m) => ({ Component: m.PortalMachinesPage })) },
  { path: 'portal/jobs/:id', loader: warm((id) => queryClient.prefetchQuery(portalJobQuery(id))), lazy: () => import('./portal/portal-job-page.js').then((m) => ({ Component: m.PortalJobPage })) },
  { path: 'portal/quotes/:id', loader: warm((id) => queryClient.prefetchQuery(portalQuoteQuery(id))), lazy: () => import('./portal/portal-quote-page.js').then((m) => ({ Component: m.PortalQuotePage })) },
  { path: 'portal/invoices/:id', loader: warm((id) => queryClient.prefetchQuery(portalInvoiceQuery(id))), lazy: () => import('./portal/portal-invoice-page.js').then((m) => ({ Component: m.PortalInvoicePage })) },
  { path: 'portal/invoices/:id/paid', lazy: () => import('./portal/portal-paid-page.js').then((m) => ({ Component: m.PortalPaidPage })) },
];
