import type { RouteObject } from 'react-router-dom';
import { Waiting } from '../../components/faces.js';
import { ErrorPage } from './error-page.js';

const page = () => import('./check/check-page.js').then((m) => ({ Component: m.CheckPage }));

export const checkRoutes: RouteObject[] = [
  { path: '/check', lazy: page, HydrateFallback: Waiting, ErrorBoundary: ErrorPage },
  { path: '/check/:code', lazy: page, HydrateFallback: Waiting, ErrorBoundary: ErrorPage },
];
