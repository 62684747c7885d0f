import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { Answer } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { Equipment } from '../../../features/bay/components/equipment.js';
import { QueueList } from '../../../features/bay/components/queue-list.js';
import { t } from '../../../features/bay/text.js';
import { t as burnoutText } from '../../../features/burnouts/text.js';
import { floorPageQuery } from '../../../lib/floor-queries.js';
import { bayQuery } from '../../../lib/job-records.js';
import '../../../features/bay/bay.css';
import '../../../features/burnouts/burnouts.css';

/** The technician's room: what waits, and what there is to do it with. */
export function BayPage() {
  const jobs = useQuery({ ...floorPageQuery('size=100&sort=promisedOn'), refetchInterval: 60_000 });
  const bay = useQuery(bayQuery);
  return (
    <>
      <PageHeader
        title={t('title')}
        below={t('queue')}
        actions={
          <Link className="lb-load-go lb-load-go-quiet" to="/bay/burnouts">
            {burnoutText('title')}
          </Link>
        }
      />
      <div className="lb-bay">
        <Answer query={jobs}>{(page) => <QueueList rows={page.rows} total={page.total} />}</Answer>
        <Answer query={bay}>{(view) => <Equipment bay={view} />}</Answer>
      </div>
    </>
  );
}
