import type { certificateCheckSchema } from '@shared/papers';
import type { z } from 'zod';
import { Notice } from '../../../components/notice.js';
import { Facts } from '../../../components/panel.js';
import { isVerdict, VerdictTag } from '../../../components/verdict-tag.js';
import { calendarDay } from '../../../lib/format.js';
import { t } from '../text.js';

/** Known and in force, known and out of force, or not known: in words first, then what stands on the paper. */
export function CheckAnswer({ code, answer }: { readonly code: string; readonly answer: z.infer<typeof certificateCheckSchema> }) {
  if (!answer.known) {
    return (
      <Notice intent="danger" title={t('unknown')} role="status">
        <p>{t('unknownWords')}</p>
        <p className="muted num">{t('asked', { code })}</p>
      </Notice>
    );
  }
  return (
    <div className="stack">
      {answer.supersededBy ? (
        <Notice intent="warning" title={t('superseded')} role="status">
          <p>{t('supersededWords', { number: answer.supersededBy })}</p>
        </Notice>
      ) : (
        <Notice intent="success" title={t('inForce')} role="status">
          <p>{t('compare')}</p>
        </Notice>
      )}
      <Facts
        rows={[
          [t('certificate'), <b key="n" className="num">{answer.number}</b>],
          [t('issued'), answer.issuedOn ? calendarDay(answer.issuedOn) : '–'],
          [t('shop'), answer.shop ?? '–'],
          [t('machine'), answer.machine || '–'],
          [t('core'), isVerdict(answer.coreVerdict) ? <VerdictTag key="v" verdict={answer.coreVerdict} /> : <span key="v" className="muted">{t('noCore')}</span>],
        ]}
      />
    </div>
  );
}
