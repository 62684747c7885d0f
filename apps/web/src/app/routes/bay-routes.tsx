import type { RouteObject } from 'react-router-dom';

export const bayRoutes: RouteObject[] = [
  { path: 'bay', lazy: () => import('./bay/bay-page.js').then((m) => ({ Component: m.BayPage })) },
  { path: 'bay/instruments', lazy: () => import('./bay/instruments-page.js').then((m) => ({ Component: m.InstrumentsPage })) },
  { path: 'bay/instruments/:id', lazy: () => import('./bay/instrument-page.js').then((m) => ({ Component: m.InstrumentPage })) },
  { path: 'bay/burnouts', lazy: () => import('./bay/burnouts-page.js').then((m) => ({ Component: m.BurnoutsPage })) },
  { path: 'bay/burnouts/new', lazy: () => import('./bay/new-burnout-page.js').then((m) => ({ Component: m.NewBurnoutPage })) },
  { path: 'bay/burnouts/:id', lazy: () => import('./bay/burnout-page.js').then((m) => ({ Component: m.BurnoutPage })) },
  { path: 'jobs/:id/work/core-test-before', lazy: () => import('./bay/core-test-page.js').then((m) => ({ Component: m.CoreTestBeforePage })) },
  { path: 'jobs/:id/work/core-test-after', lazy: () => import('./bay/core-test-page.js').then((m) => ({ Component: m.CoreTestAfterPage })) },
  { path: 'jobs/:id/work/:kind', lazy: () => import('./bay/work-page.js').then((m) => ({ Component: m.WorkPage })) },
  { path: 'records/:recordId/revisions', lazy: () => import('./bay/revisions-page.js').then((m) => ({ Component: m.RevisionsPage })) },
];
