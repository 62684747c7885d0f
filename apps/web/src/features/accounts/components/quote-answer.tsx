import type { QuoteView } from '@shared/quotes';
import { moneyOf, momentOf } from '../../../lib/format.js';
import { t } from '../text.js';

/** What the customer said to a quote, in one or two sentences. */
export function QuoteAnswer({ quote }: { readonly quote: QuoteView }) {
  const { approval, state, declineReason, currency } = quote;
  if (state === 'superseded') return <p className="muted">{t('supersededWords')}</p>;
  if (declineReason) return <p>{t('declinedWords', { reason: declineReason })}</p>;
  if (!approval) return null;
  return (
    <p>
      {t('approvedWords', { how: t(`how-${approval.how}`), by: approval.by, when: momentOf(approval.at) })}
      {approval.purchaseOrder !== '' && ` ${t('order', { number: approval.purchaseOrder })}`}
      {approval.notToExceedMinor !== null && ` ${t('limit', { money: moneyOf(approval.notToExceedMinor, currency) })}`}
    </p>
  );
}
