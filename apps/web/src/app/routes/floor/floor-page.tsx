import { AnchorButton, Button } from '@blueprintjs/core';
import { useQuery } from '@tanstack/react-query';
import { Link, useNavigate, useSearchParams } from 'react-router-dom';
import { Answer, Empty } from '../../../components/faces.js';
import { PageHeader, Panel } from '../../../components/panel.js';
import { FloorFilters } from '../../../features/jobs/components/floor-filters.js';
import { FloorTable } from '../../../features/jobs/components/floor-table.js';
import { SavedFilters } from '../../../features/jobs/components/saved-filters.js';
import { StepStrip } from '../../../features/jobs/components/step-strip.js';
import { csvAddress, filterOf, isFiltered, paramsOf } from '../../../features/jobs/floor-filter.js';
import { t } from '../../../features/jobs/floor-text.js';
import { floorPageQuery, floorStepsQuery } from '../../../lib/floor-queries.js';
import { shopToday } from '../../../lib/format.js';
import { useMay } from '../../../lib/me.js';
import { FloorWallPage } from './floor-wall-page.js';

/** Every job in the house: where it stands, what is late, what waits. */
export function FloorPage() {
  const [params] = useSearchParams();
  return params.get('wall') === '1' ? <FloorWallPage /> : <FloorList />;
}

function FloorList() {
  const [params] = useSearchParams();
  const navigate = useNavigate();
  const mayBook = useMay('jobs.book');
  const filter = filterOf(params);
  const page = useQuery(floorPageQuery(paramsOf(filter)));
  const steps = useQuery(floorStepsQuery);
  const today = shopToday(new Date());
  const filtered = isFiltered(filter);
  const wall = new URLSearchParams(params);
  wall.set('wall', '1');
  return (
    <div className="stack">
      <PageHeader
        title={t('title')}
        below={<span role="status">{page.data && (page.data.total === 1 ? t('countOne') : t('count', { total: page.data.total }))}</span>}
        actions={
          <>
            <AnchorButton text={t('export')} href={csvAddress(filter)} download="" />
            <Button text={t('wall')} onClick={() => void navigate(`?${wall}`)} />
          </>
        }
      />
      {steps.data && <StepStrip steps={steps.data} chosen={filter.step} />}
      <FloorFilters filter={filter} />
      <SavedFilters params={paramsOf({ ...filter, page: undefined })} filtered={filtered} />
      <Answer
        query={page}
        isEmpty={(data) => data.rows.length === 0}
        empty={
          filtered ? (
            <Empty title={t('noMatch')}>{t('noMatchHelp')}</Empty>
          ) : (
            <Empty title={t('nothing')}>
              <p>{t('nothingHelp')}</p>
              {mayBook && <Link to="/counter/book-in">{t('bookIn')}</Link>}
            </Empty>
          )
        }
      >
        {(data) => (
          <Panel tight>
            <FloorTable page={data} today={today} />
          </Panel>
        )}
      </Answer>
    </div>
  );
}
