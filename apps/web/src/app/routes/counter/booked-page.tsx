import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import { Answer } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { AttachmentsPanel } from '../../../features/attachments/components/attachments-panel.js';
import { Receipt } from '../../../features/counter/components/receipt.js';
import { t } from '../../../features/counter/text.js';
import { jobSheetQuery } from '../../../lib/job-queries.js';

/** A job that was booked in just now: tag, receipt, photos, next. */
export function BookedPage() {
  const { id = '' } = useParams();
  const job = useQuery(jobSheetQuery(id));
  return (
    <>
      <PageHeader title={t('bookedIn')} />
      <Answer query={job}>{(sheet) => <Receipt key={sheet.id} job={sheet} photos={<AttachmentsPanel jobId={sheet.id} attachments={sheet.attachments} />} />}</Answer>
    </>
  );
}
