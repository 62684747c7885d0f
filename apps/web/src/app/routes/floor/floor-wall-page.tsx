import { useQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router-dom';
import { Answer } from '../../../components/faces.js';
import { FloorWall } from '../../../features/jobs/components/floor-wall.js';
import { filterOf, paramsOf } from '../../../features/jobs/floor-filter.js';
import { t } from '../../../features/jobs/floor-text.js';
import { floorPageQuery } from '../../../lib/floor-queries.js';
import { momentOf, shopToday } from '../../../lib/format.js';

const EVERY_MS = 30_000;

/** The floor on a screen on the wall: large, and fresh by itself. */
export function FloorWallPage() {
  const [params] = useSearchParams();
  const { page: _page, ...filter } = filterOf(params);
  const query = useQuery({ ...floorPageQuery(paramsOf(filter, { size: '200' })), refetchInterval: EVERY_MS, refetchIntervalInBackground: true });
  const list = new URLSearchParams(params);
  list.delete('wall');
  return (
    <div className="lb-wall">
      <title>{`${t('title')} · Loopbay`}</title>
      <div className="lb-wall-head">
        <h1>{t('title')}</h1>
        {query.dataUpdatedAt > 0 && <span className="muted">{t('wallHelp', { time: momentOf(new Date(query.dataUpdatedAt).toISOString()) })}</span>}
        <Link to={`/floor${list.size > 0 ? `?${list}` : ''}`}>{t('wallClose')}</Link>
      </div>
      <Answer query={query}>{(data) => (
          <>
            <FloorWall rows={data.rows} today={shopToday(new Date())} />
            {data.total > data.rows.length && <p className="muted">{t('wallFirst', { shown: data.rows.length, total: data.total })}</p>}
          </>
        )}</Answer>
    </div>
  );
}
