import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { Answer } from '../../../components/faces.js';
import { PageHeader, Panel } from '../../../components/panel.js';
import { portalJobQuery } from '../../../features/portal/api/portal-queries.js';
import { CorePanel } from '../../../features/portal/components/core-panel.js';
import { JobMoneyList, JobPapers, JobPhotos } from '../../../features/portal/components/job-papers.js';
import { Way } from '../../../features/portal/components/way.js';
import { happensNow } from '../../../features/portal/plain-words.js';
import { t } from '../../../features/portal/text.js';
import { calendarDay, dayOf } from '../../../lib/format.js';

/** One machine in the shop, for its owner. */
export function PortalJobPage() {
  const { id = '' } = useParams();
  const job = useQuery(portalJobQuery(id));
  return (
    <Answer query={job}>
      {(data) => (
        <div className="stack">
          <PageHeader title={data.machine} below={t('jobBelow', { number: data.number, day: dayOf(data.receivedAt) })} />
          <Panel title={t('now')}>
            <div className="stack">
              <p className="lb-portal-now">{happensNow(data, data.quotes.map((q) => q.state))}</p>
              {data.promisedOn && (data.state === 'open' || data.state === 'on-hold') && <p className="muted">{t('promisedFor', { day: calendarDay(data.promisedOn) })}</p>}
            </div>
          </Panel>
          <JobMoneyList job={data} />
          {data.core && <CorePanel core={data.core} />}
          <Panel title={t('way')}>
            <Way job={data} />
          </Panel>
          <JobPapers job={data} />
          <JobPhotos photos={data.photos} />
          <Panel title={t('complaint')}>
            <p className="lb-plain-note">{data.complaint}</p>
          </Panel>
        </div>
      )}
    </Answer>
  );
}
