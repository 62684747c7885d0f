import type { AttachmentView } from '@shared/jobs';
import { Empty } from '../../../components/faces.js';
import { Panel } from '../../../components/panel.js';
import { useMay } from '../../../lib/me.js';
import { t } from '../text.js';
import { Gallery } from './gallery.js';
import { UploadBox } from './upload-box.js';

/** Photos and scans of a job: what is there, and the way to add more. */
export function AttachmentsPanel({ jobId, attachments }: { readonly jobId: string; readonly attachments: readonly AttachmentView[] }) {
  const mayAdd = useMay('attachments.add');
  return (
    <Panel title={t('title')}>
      <div className="stack">
        {mayAdd ? <UploadBox jobId={jobId} /> : <p className="muted">{t('mayNot')}</p>}
        {attachments.length === 0 ? <Empty title={t('empty')}>{t('emptyHelp')}</Empty> : <Gallery attachments={attachments} />}
      </div>
    </Panel>
  );
}
