import { useQuery } from '@tanstack/react-query';
import { Answer } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { portalHomeQuery } from '../../../features/portal/api/portal-queries.js';
import { JobList } from '../../../features/portal/components/job-list.js';
import { NextThing } from '../../../features/portal/components/next-thing.js';
import { t } from '../../../features/portal/text.js';

/** The customer's start: one thing to do, then what happens to their machines. */
export function PortalHomePage() {
  const home = useQuery(portalHomeQuery);
  return (
    <Answer query={home}>
      {(data) => (
        <div className="stack">
          <PageHeader title={t('overview', { customer: data.customerName })} />
          <NextThing home={data} />
          <JobList home={data} />
        </div>
      )}
    </Answer>
  );
}
