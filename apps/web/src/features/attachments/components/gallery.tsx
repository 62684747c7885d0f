import { Document } from '@blueprintjs/icons';
import type { AttachmentView } from '@shared/jobs';
import { momentOf, sizeOf } from '../../../lib/format.js';
import { t } from '../text.js';
import './attachments.css';

/** The newest first; each opens in full beside the sheet. */
export function Gallery({ attachments }: { readonly attachments: readonly AttachmentView[] }) {
  return (
    <ul className="lb-gallery" aria-label={t('gallery')}>
      {[...attachments].reverse().map((a) => (
        <li key={a.id}>
          <a href={`/api/attachments/${a.id}`} target="_blank" rel="noreferrer" aria-label={t('open', { name: a.name })}>
            {a.mime.startsWith('image/') ? <img src={`/api/attachments/${a.id}/thumb`} alt="" loading="lazy" width={160} height={120} /> : <span className="lb-gallery-paper"><Document size={40} /></span>}
            <span className="lb-gallery-name">{a.name}</span>
          </a>
          <small className="muted">{t('by', { who: a.addedBy, when: momentOf(a.addedAt), size: sizeOf(a.sizeBytes) })}</small>
        </li>
      ))}
    </ul>
  );
}
