import { redirect, type RouteObject } from 'react-router-dom';
import { limitsVersionsQuery, messagesQuery, usersQuery } from '../../features/shop/api/shop-queries.js';
import { queryClient } from '../query-client.js';

export const shopRoutes: RouteObject[] = [
  { path: 'shop', loader: () => redirect('/shop/limits'), Component: () => null },
  { path: 'shop/limits', loader: () => (void queryClient.prefetchQuery(limitsVersionsQuery), null), lazy: () => import('./shop/limits-page.js').then((m) => ({ Component: m.LimitsPage })) },
  { path: 'shop/people', loader: () => (void queryClient.prefetchQuery(usersQuery), null), lazy: () => import('./shop/people-page.js').then((m) => ({ Component: m.PeoplePage })) },
  { path: 'shop/messages', loader: () => (void queryClient.prefetchQuery(messagesQuery), null), lazy: () => import('./shop/messages-page.js').then((m) => ({ Component: m.MessagesPage })) },
];
