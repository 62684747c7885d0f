import type { InvoiceView } from '@shared/invoices';
import { useQuery } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { Answer } from '../../../components/faces.js';
import { MoneyLines } from '../../../components/money-lines.js';
import { Notice } from '../../../components/notice.js';
import { PageHeader, Panel } from '../../../components/panel.js';
import { StateMark } from '../../../components/state-mark.js';
import { portalInvoiceQuery } from '../../../features/portal/api/portal-queries.js';
import { PayButton } from '../../../features/portal/components/pay-button.js';
import { PaymentLines } from '../../../features/portal/components/payment-lines.js';
import { invoiceStateWords } from '../../../features/portal/state-words.js';
import { t } from '../../../features/portal/text.js';
import { calendarDay } from '../../../lib/format.js';

/** An invoice: what is owed, the way to pay it, and what it is for. */
export function PortalInvoicePage() {
  const { id = '' } = useParams();
  const invoice = useQuery(portalInvoiceQuery(id));
  return <Answer query={invoice}>{(data) => <Invoice invoice={data} />}</Answer>;
}

function Invoice({ invoice }: { readonly invoice: InvoiceView }) {
  return (
    <div className="stack">
      <PageHeader
        title={t('invoiceTitle', { number: invoice.number })}
        below={
          <span className="row">
            <StateMark {...invoiceStateWords(invoice)} />
            <span>
              {t('quoteBelowShort')} <Link to={`/portal/jobs/${invoice.jobId}`}>{invoice.jobNumber}</Link>
            </span>
            {invoice.balanceMinor > 0 && <span>{t('due', { day: calendarDay(invoice.dueOn) })}</span>}
          </span>
        }
      />
      {invoice.balanceMinor > 0 ? (
        <Panel>
          <div className="stack">
            <PaymentLines invoice={invoice} />
            <PayButton invoice={invoice} />
          </div>
        </Panel>
      ) : (
        <>
          <Notice intent="success" title={t('paidTitle')}>
            <p>{t('paidWords')}</p>
          </Notice>
          <Panel title={t('payments')}>
            <PaymentLines invoice={invoice} />
          </Panel>
        </>
      )}
      <Panel
        title={t('lines')}
        actions={
          invoice.paperId && (
            <a href={`/api/portal/papers/${invoice.paperId}/pdf`} target="_blank" rel="noreferrer">
              {t('pdf')}
            </a>
          )
        }
      >
        <MoneyLines of={invoice} caption={t('linesCaption')} />
      </Panel>
    </div>
  );
}
