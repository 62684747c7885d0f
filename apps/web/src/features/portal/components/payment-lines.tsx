import type { InvoiceView } from '@shared/invoices';
import { moneyOf } from '../../../lib/format.js';
import { receivedWords } from '../../../lib/money-words.js';
import { t } from '../text.js';
import './portal.css';

/** Total, what came in, what is left. */
export function PaymentLines({ invoice }: { readonly invoice: InvoiceView }) {
  const { currency, payments, balanceMinor } = invoice;
  return (
    <dl className="lb-portal-balance num">
      {payments.length > 0 && (
        <div>
          <dt>{t('total')}</dt>
          <dd>{moneyOf(invoice.grossMinor, currency)}</dd>
        </div>
      )}
      {payments.map((payment) => (
        <div key={payment.id}>
          <dt>{`${t(payment.kind)}, ${receivedWords(payment.receivedAt)}`}</dt>
          <dd>{moneyOf(payment.amountMinor, currency)}</dd>
        </div>
      ))}
      <div className="left">
        <dt>{t('stillToPay')}</dt>
        <dd>{moneyOf(balanceMinor, currency)}</dd>
      </div>
    </dl>
  );
}
