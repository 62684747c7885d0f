import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { Answer } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { CoreVisits } from '../../../features/customers/components/core-visits.js';
import { MachinePlate } from '../../../features/customers/components/machine-plate.js';
import { CoreSize, MachineVisits } from '../../../features/customers/components/machine-visits.js';
import { t } from '../../../features/customers/text.js';
import { machineQuery } from '../../../lib/customer-queries.js';
import { useMay } from '../../../lib/me.js';

/** One machine over its whole life: plate, visits, and the core's loss in each of them. */
export function MachinePage() {
  const { id = '' } = useParams();
  const machine = useQuery(machineQuery(id));
  const mayBook = useMay('jobs.book');
  return (
    <Answer query={machine}>
      {(data) => (
        <div className="stack" key={data.id}>
          <PageHeader
            title={data.description}
            below={<Link to={`/counter/customers/${data.customerId}`}>{data.customerName}</Link>}
            actions={mayBook ? <Link className="lb-name" to={`/counter/book-in?customer=${data.customerId}&machine=${data.id}`}>{t('bookIn')}</Link> : undefined}
          />
          <CoreVisits visits={data.visits} />
          <div className="two-columns">
            <MachinePlate machine={data} />
            <div className="stack">
              <MachineVisits visits={data.visits} />
              <CoreSize geometry={data.coreGeometry} />
            </div>
          </div>
        </div>
      )}
    </Answer>
  );
}
