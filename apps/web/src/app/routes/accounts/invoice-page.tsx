import type { InvoiceView } from '@shared/invoices';
import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { Answer } from '../../../components/faces.js';
import { MoneyLines } from '../../../components/money-lines.js';
import { PageHeader, Panel } from '../../../components/panel.js';
import { StateMark } from '../../../components/state-mark.js';
import { invoiceQuery } from '../../../features/accounts/api/accounts-queries.js';
import { PaymentList } from '../../../features/accounts/components/payment-list.js';
import { RecordPayment } from '../../../features/accounts/components/record-payment.js';
import { t } from '../../../features/accounts/invoice-text.js';
import { invoiceStateWords } from '../../../features/accounts/state-words.js';
import { t as words } from '../../../features/accounts/text.js';
import { calendarDay, dayOf, moneyOf } from '../../../lib/format.js';
import { useMay } from '../../../lib/me.js';
import '../../../features/accounts/components/accounts.css';

/** One invoice: what it is for, what was paid, what is still owed. */
export function InvoicePage() {
  const { id = '' } = useParams();
  const invoice = useQuery(invoiceQuery(id));
  return <Answer query={invoice}>{(data) => <Invoice invoice={data} />}</Answer>;
}

function Invoice({ invoice }: { readonly invoice: InvoiceView }) {
  const mayRecord = useMay('payments.record');
  return (
    <div className="stack">
      <PageHeader
        title={t('invoiceTitle', { number: invoice.number })}
        below={
          <span className="row">
            <StateMark {...invoiceStateWords(invoice)} />
            <span>{t('forCustomer', { customer: invoice.customerName })}</span>
            <Link to={`/jobs/${invoice.jobId}?tab=money`}>{invoice.jobNumber}</Link>
            <span>{t('fromQuote', { number: invoice.quoteNumber })}</span>
            <span>{t('issuedOn', { day: dayOf(invoice.issuedAt) })}</span>
            <span>{t('dueOn', { day: calendarDay(invoice.dueOn) })}</span>
          </span>
        }
      />
      <div className="two-columns">
        <Panel
          title={t('lines')}
          actions={
            invoice.paperId && (
              <a href={`/api/papers/${invoice.paperId}/pdf`} target="_blank" rel="noreferrer" aria-label={words('paperOf', { number: invoice.number })}>
                {t('paper')}
              </a>
            )
          }
        >
          <MoneyLines of={invoice} caption={t('linesCaption')} />
        </Panel>
        <div className="stack">
          <Panel title={t('payments')}>
            <div className="stack">
              <PaymentList payments={invoice.payments} />
              <Balance invoice={invoice} />
            </div>
          </Panel>
          {mayRecord && invoice.balanceMinor > 0 && (
            <Panel title={t('record')}>
              <RecordPayment key={invoice.id} invoice={invoice} />
            </Panel>
          )}
        </div>
      </div>
    </div>
  );
}

function Balance({ invoice }: { readonly invoice: InvoiceView }) {
  const { currency, grossMinor, paidMinor, balanceMinor } = invoice;
  return (
    <div className="lb-balance">
      <dl>
        <div>
          <dt>{t('total')}</dt>
          <dd className="num">{moneyOf(grossMinor, currency)}</dd>
        </div>
        <div>
          <dt>{t('paidSoFar')}</dt>
          <dd className="num">{moneyOf(paidMinor, currency)}</dd>
        </div>
        <div className="lb-balance-left">
          <dt>{t('balance')}</dt>
          <dd className="num">{moneyOf(balanceMinor, currency)}</dd>
        </div>
      </dl>
      {balanceMinor <= 0 && <p className="muted">{t('settled')}</p>}
    </div>
  );
}
