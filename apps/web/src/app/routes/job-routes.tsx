import type { LoaderFunctionArgs, RouteObject } from 'react-router-dom';
import { floorPageQuery, floorStepsQuery } from '../../lib/floor-queries.js';
import { jobRecordsQuery, jobSheetQuery } from '../../lib/job-queries.js';
import { filterOf, paramsOf } from '../../features/jobs/floor-filter.js';
import { queryClient } from '../query-client.js';

/** What a page will ask for starts with its code; the page itself shows how it went. */
function warm({ request }: LoaderFunctionArgs): null {
  const params = new URL(request.url).searchParams;
  if (params.get('wall') !== '1') {
    void queryClient.prefetchQuery(floorPageQuery(paramsOf(filterOf(params))));
    void queryClient.prefetchQuery(floorStepsQuery);
  }
  return null;
}

function warmJob({ params }: LoaderFunctionArgs): null {
  const id = params['id'] ?? '';
  void queryClient.prefetchQuery(jobSheetQuery(id));
  void queryClient.prefetchQuery(jobRecordsQuery(id));
  return null;
}

export const jobRoutes: RouteObject[] = [
  { path: 'floor', loader: warm, lazy: () => import('./floor/floor-page.js').then((m) => ({ Component: m.FloorPage })) },
  { path: 'jobs/:id', loader: warmJob, lazy: () => import('./jobs/job-page.js').then((m) => ({ Component: m.JobPage })) },
];
