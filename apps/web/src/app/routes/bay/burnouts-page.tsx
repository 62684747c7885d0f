import { HTMLSelect } from '@blueprintjs/core';
import { useQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router-dom';
import { useBayDensity } from '../../../components/density.js';
import { Answer, Empty } from '../../../components/faces.js';
import { PageHeader, Panel } from '../../../components/panel.js';
import { loadsQuery } from '../../../features/burnouts/api/load-queries.js';
import { LoadList } from '../../../features/burnouts/components/load-list.js';
import { t } from '../../../features/burnouts/text.js';
import { bayQuery } from '../../../lib/job-records.js';
import { useMay } from '../../../lib/me.js';
import '../../../features/burnouts/burnouts.css';

/** What stood in the ovens, the newest first; of one oven where the address says so. */
export function BurnoutsPage() {
  useBayDensity();
  const [params, setParams] = useSearchParams();
  const mayWrite = useMay('burnouts.write');
  const mayInsight = useMay('insight.read');
  const mayBay = useMay('instruments.read');
  const ovenId = params.get('oven') ?? '';
  const loads = useQuery(loadsQuery(new URLSearchParams({ page: params.get('page') ?? '1', size: '25', ...(ovenId === '' ? {} : { ovenId }) }).toString()));
  const bay = useQuery({ ...bayQuery, enabled: mayBay });
  const add = mayWrite && (
    <Link className="lb-load-go" to="/bay/burnouts/new">
      {t('newLoad')}
    </Link>
  );
  return (
    <div className="stack">
      <PageHeader
        title={t('title')}
        below={
          <>
            {t('below')} {mayBay && <Link to="/bay">{t('toBay')}</Link>} {mayInsight && <Link to="/insight">{t('toInsight')}</Link>}
          </>
        }
        actions={
          <>
            {bay.data && (
              <HTMLSelect aria-label={t('filterOven')} value={ovenId} onChange={(e) => setParams(e.target.value === '' ? {} : { oven: e.target.value })}>
                <option value="">{t('everyOven')}</option>
                {bay.data.ovens.map((o) => (
                  <option key={o.id} value={o.id}>
                    {o.name}
                  </option>
                ))}
              </HTMLSelect>
            )}
            {add}
          </>
        }
      />
      <Answer
        query={loads}
        isEmpty={(page) => page.rows.length === 0}
        empty={
          <Empty title={t('none')}>
            <p>{t('noneWords')}</p>
            {add}
          </Empty>
        }
      >
        {(page) => (
          <Panel tight>
            <LoadList page={page} />
          </Panel>
        )}
      </Answer>
    </div>
  );
}
