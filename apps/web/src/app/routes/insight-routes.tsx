import type { RouteObject } from 'react-router-dom';
import { ovensQuery } from '../../features/insight/api/oven-queries.js';
import { queryClient } from '../query-client.js';

export const insightRoutes: RouteObject[] = [{ path: 'insight', loader: () => (void queryClient.prefetchQuery(ovensQuery), null), lazy: () => import('./insight/insight-page.js').then((m) => ({ Component: m.InsightPage })) }];
