import { redirect, type RouteObject } from 'react-router-dom';
import { equipmentQuery } from '../../features/equipment/api/equipment-queries.js';
import { limitVersionsQuery } from '../../features/limits/api/limits-queries.js';
import { messagesQuery, usersQuery } from '../../features/shop/api/shop-queries.js';
import { queryClient } from '../query-client.js';

export const shopRoutes: RouteObject[] = [
  { path: 'shop', loader: () => redirect('/shop/limits'), Component: () => null },
  { path: 'shop/limits', loader: () => (void queryClient.prefetchQuery(limitVersionsQuery), null), lazy: () => import('./shop/limits-page.js').then((m) => ({ Component: m.LimitsPage })) },
  { path: 'shop/limits/new', lazy: () => import('./shop/new-limits-page.js').then((m) => ({ Component: m.NewLimitsPage })) },
  { path: 'shop/limits/:version', lazy: () => import('./shop/limits-version-page.js').then((m) => ({ Component: m.LimitsVersionPage })) },
  { path: 'shop/equipment', loader: () => (void queryClient.prefetchQuery(equipmentQuery), null), lazy: () => import('./shop/equipment-page.js').then((m) => ({ Component: m.EquipmentPage })) },
  { path: 'shop/people', loader: () => (void queryClient.prefetchQuery(usersQuery), null), lazy: () => import('./shop/people-page.js').then((m) => ({ Component: m.PeoplePage })) },
  { path: 'shop/messages', loader: () => (void queryClient.prefetchQuery(messagesQuery), null), lazy: () => import('./shop/messages-page.js').then((m) => ({ Component: m.MessagesPage })) },
];
