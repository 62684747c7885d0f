import type { RouteObject } from 'react-router-dom';

export const accountsRoutes: RouteObject[] = [
  { path: 'jobs/:jobId/quotes/new', lazy: () => import('./accounts/new-quote-page.js').then((m) => ({ Component: m.NewQuotePage })) },
  { path: 'accounts/quotes/:id', lazy: () => import('./accounts/quote-page.js').then((m) => ({ Component: m.QuotePage })) },
];
