import { createBrowserRouter, redirect, type LoaderFunctionArgs, type RouteObject } from 'react-router-dom';
import { Waiting } from '../components/faces.js';
import { ApiError } from '../lib/http.js';
import { meQuery } from '../lib/me.js';
import { queryClient } from './query-client.js';
import { ErrorPage, NotFoundPage } from './routes/error-page.js';
import { SignInPage } from './routes/sign-in.js';
import { homeOf } from './shell/rooms.js';
import { Shell } from './shell/shell.js';
import { accountsRoutes } from './routes/accounts-routes.js';
import { bayRoutes } from './routes/bay-routes.js';
import { checkRoutes } from './routes/check-routes.js';
import { counterRoutes } from './routes/counter-routes.js';
import { insightRoutes } from './routes/insight-routes.js';
import { jobRoutes } from './routes/job-routes.js';
import { portalRoutes } from './routes/portal-routes.js';
import { shopRoutes } from './routes/shop-routes.js';

/** Whoever is not signed in goes to sign in, and comes back to where they wanted to go. */
async function signedIn({ request }: LoaderFunctionArgs): Promise<null> {
  try {
    await queryClient.ensureQueryData(meQuery);
    return null;
  } catch (error) {
    if (error instanceof ApiError && error.status === 401) {
      const url = new URL(request.url);
      throw redirect(`/sign-in?next=${encodeURIComponent(url.pathname + url.search)}`);
    }
    throw error;
  }
}

async function toHome(): Promise<Response> {
  return redirect(homeOf(await queryClient.ensureQueryData(meQuery)));
}

const inside: RouteObject[] = [
  { index: true, loader: toHome, Component: Waiting },
  ...jobRoutes,
  ...counterRoutes,
  ...bayRoutes,
  ...accountsRoutes,
  ...insightRoutes,
  ...shopRoutes,
  ...portalRoutes,
  { path: '*', Component: NotFoundPage },
];

export const router = createBrowserRouter([
  { path: '/sign-in', Component: SignInPage, ErrorBoundary: ErrorPage },
  ...checkRoutes,
  {
    path: '/',
    Component: Shell,
    loader: signedIn,
    shouldRevalidate: () => false,
    HydrateFallback: Waiting,
    ErrorBoundary: ErrorPage,
    children: [{ ErrorBoundary: ErrorPage, children: inside }],
  },
]);
