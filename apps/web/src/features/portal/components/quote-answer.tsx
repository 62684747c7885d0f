import { Button } from '@blueprintjs/core';
import type { QuoteView } from '@shared/quotes';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { Notice } from '../../../components/notice.js';
import { calendarDay, momentOf, moneyOf } from '../../../lib/format.js';
import { portalJobQuery } from '../api/portal-queries.js';
import { t } from '../text.js';
import { ApproveDialog } from './approve-dialog.js';
import { DeclineDialog } from './decline-dialog.js';
import './portal.css';

/** How the quote stands with its customer: to be answered, answered, or not to be answered any more. */
export function QuoteAnswer({ quote }: { readonly quote: QuoteView }) {
  const { state, approval } = quote;
  if (state === 'superseded') return <Superseded quote={quote} />;
  if (state === 'approved' && approval) {
    return (
      <Notice intent="success" title={t('approvedTitle')} role="status">
        <p>
          {t('approvedWords', { by: approval.by, when: momentOf(approval.at) })}
          {approval.purchaseOrder !== '' && ` ${t('approvedOrder', { number: approval.purchaseOrder })}`}
          {approval.notToExceedMinor !== null && ` ${t('approvedLimit', { money: moneyOf(approval.notToExceedMinor, quote.currency) })}`}
        </p>
      </Notice>
    );
  }
  if (state === 'declined') {
    return (
      <Notice intent="warning" title={t('declinedTitle')} role="status">
        <p>{t('declinedWords', { reason: quote.declineReason ?? '' })}</p>
      </Notice>
    );
  }
  if (quote.expired) {
    return (
      <Notice intent="warning" title={t('expiredTitle')}>
        <p>{t('expiredWords', { day: calendarDay(quote.validUntil) })}</p>
      </Notice>
    );
  }
  return <Buttons quote={quote} />;
}

function Buttons({ quote }: { readonly quote: QuoteView }) {
  const [open, setOpen] = useState<'approve' | 'decline' | null>(null);
  const close = () => setOpen(null);
  return (
    <div className="lb-answer-buttons">
      <Button className="lb-big-button" intent="primary" text={t('approve', { money: moneyOf(quote.grossMinor, quote.currency) })} onClick={() => setOpen('approve')} />
      <Button className="lb-big-button lb-decline" text={t('decline')} onClick={() => setOpen('decline')} />
      {open === 'approve' && <ApproveDialog quote={quote} onClose={close} />}
      {open === 'decline' && <DeclineDialog quote={quote} onClose={close} />}
    </div>
  );
}

/** The newer quote is one tap away as soon as it was sent. */
function Superseded({ quote }: { readonly quote: QuoteView }) {
  const { data: job } = useQuery(portalJobQuery(quote.jobId));
  const newer = job?.quotes.filter((q) => q.number === quote.number && q.revision > quote.revision && q.state !== 'superseded').at(0);
  return (
    <Notice intent="warning" title={t('supersededTitle')}>
      <div className="stack">
        <p>{newer || !job ? t('supersededWords') : t('supersededNone')}</p>
        {newer && (
          <Link className="lb-big-link" to={`/portal/quotes/${newer.id}`}>
            {t('supersededSee')}
          </Link>
        )}
      </div>
    </Notice>
  );
}
