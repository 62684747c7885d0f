import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { Answer } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { Revisions } from '../../../features/records/components/revisions.js';
import { t } from '../../../features/records/text.js';
import { jobSheetQuery } from '../../../lib/job-queries.js';
import { revisionsQuery } from '../../../lib/job-records.js';
import { recordName } from '../../../lib/record-names.js';

/** Every revision of one record. */
export function RevisionsPage() {
  const { recordId = '' } = useParams();
  const revisions = useQuery(revisionsQuery(recordId));
  const jobId = revisions.data?.[0]?.jobId;
  const job = useQuery({ ...jobSheetQuery(jobId ?? ''), enabled: jobId !== undefined });
  return (
    <Answer query={revisions}>
      {(all) => (
        <>
          <PageHeader
            title={`${t('revisionsTitle')} · ${recordName(all[0]!.kind)}`}
            below={job.data && <Link to={`/jobs/${job.data.id}/work/${all[0]!.kind}`}>{t('toRecord', { number: job.data.number })}</Link>}
          />
          <Revisions revisions={all} />
        </>
      )}
    </Answer>
  );
}
