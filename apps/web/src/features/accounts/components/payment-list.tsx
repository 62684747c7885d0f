import { formatMoney } from '@libs/money';
import type { InvoiceView } from '@shared/invoices';
import { receivedWords } from '../../../lib/money-words.js';
import { t } from '../invoice-text.js';
import './accounts.css';

type Payment = InvoiceView['payments'][number];

export function PaymentList({ payments }: { readonly payments: readonly Payment[] }) {
  if (payments.length === 0) return <p className="muted">{t('noPayments')}</p>;
  return (
    <ul className="lb-money-list" aria-label={t('paymentsCaption')}>
      {payments.map((payment) => (
        <li key={payment.id}>
          <div className="row spread">
            <span className="row">
              <b>{t(payment.kind)}</b>
              <span>{receivedWords(payment.receivedAt)}</span>
            </span>
            <b className="num">{formatMoney(payment.amountMinor, payment.currency)}</b>
          </div>
          <div className="muted">
            {[payment.reference && t('referenceIs', { reference: payment.reference }), payment.recordedBy && t('recordedBy', { name: payment.recordedBy })].filter(Boolean).join(', ')}
          </div>
        </li>
      ))}
    </ul>
  );
}
