import type { RouteObject } from 'react-router-dom';

export const counterRoutes: RouteObject[] = [
  { path: 'counter', lazy: () => import('./counter/counter-page.js').then((m) => ({ Component: m.CounterPage })) },
  { path: 'counter/book-in', lazy: () => import('./counter/book-in-page.js').then((m) => ({ Component: m.BookInPage })) },
  { path: 'counter/booked/:id', lazy: () => import('./counter/booked-page.js').then((m) => ({ Component: m.BookedPage })) },
  { path: 'counter/customers', lazy: () => import('./counter/customers-page.js').then((m) => ({ Component: m.CustomersPage })) },
  { path: 'counter/customers/new', lazy: () => import('./counter/new-customer-page.js').then((m) => ({ Component: m.NewCustomerPage })) },
  { path: 'counter/customers/:id', lazy: () => import('./counter/customer-page.js').then((m) => ({ Component: m.CustomerPage })) },
  { path: 'counter/machines/:id', lazy: () => import('./counter/machine-page.js').then((m) => ({ Component: m.MachinePage })) },
];
