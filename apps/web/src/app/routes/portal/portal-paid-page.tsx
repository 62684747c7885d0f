import { Button, Spinner } from '@blueprintjs/core';
import { paymentReturnQuerySchema, type PaymentReturn } from '@shared/invoices';
import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';
import { Link, useParams, useSearchParams } from 'react-router-dom';
import { Answer, Empty } from '../../../components/faces.js';
import { Notice } from '../../../components/notice.js';
import { PageHeader } from '../../../components/panel.js';
import { paymentReturnQuery, portalInvoiceQuery, portalKeys, stillAsks } from '../../../features/portal/api/portal-queries.js';
import { PayButton } from '../../../features/portal/components/pay-button.js';
import { t } from '../../../features/portal/text.js';
import { moneyOf } from '../../../lib/format.js';

/** Back from the payment page: what became of the payment, asked of the shop and never read from the address. */
export function PortalPaidPage() {
  const { id = '' } = useParams();
  const [params] = useSearchParams();
  const named = paymentReturnQuerySchema.safeParse({ session_id: params.get('session_id') ?? '' });
  return (
    <div className="stack">
      <PageHeader title={t('returnTitle')} />
      {named.success ? (
        <Outcome invoiceId={id} sessionId={named.data.session_id} />
      ) : (
        <Empty title={t('returnNoSession')}>
          <p>{t('returnNoSessionWords')}</p>
          <Link to={`/portal/invoices/${id}`}>{t('toInvoice')}</Link>
        </Empty>
      )}
    </div>
  );
}

function Outcome({ invoiceId, sessionId }: { readonly invoiceId: string; readonly sessionId: string }) {
  const client = useQueryClient();
  const back = useQuery(paymentReturnQuery(invoiceId, sessionId));
  const updates = client.getQueryState(paymentReturnQuery(invoiceId, sessionId).queryKey)?.dataUpdateCount ?? 0;
  const outcome = back.data?.outcome;
  const invoice = back.data?.invoice;
  useEffect(() => {
    if (!outcome || !invoice) return;
    client.setQueryData(portalInvoiceQuery(invoice.id).queryKey, invoice);
    void client.invalidateQueries({ queryKey: portalKeys.all, predicate: ({ queryKey }) => queryKey[1] !== 'payment-return' });
  }, [client, outcome, invoice]);
  return (
    <>
      <Answer query={back}>
        {(data) => (
          <>
            <div role="status">
              <Said data={data} asking={stillAsks(updates)} onAgain={() => void back.refetch()} busy={back.isFetching} />
            </div>
            {data.outcome === 'not-paid' && data.invoice.balanceMinor > 0 && <PayButton invoice={data.invoice} />}
          </>
        )}
      </Answer>
      <p className="row">
        <Link to={`/portal/invoices/${invoiceId}`}>{t('toInvoice')}</Link>
        {invoice && <Link to={`/portal/jobs/${invoice.jobId}`}>{t('toJob')}</Link>}
        <Link to="/portal">{t('toOverview')}</Link>
      </p>
    </>
  );
}

interface SaidProps {
  readonly data: PaymentReturn;
  readonly asking: boolean;
  readonly busy: boolean;
  readonly onAgain: () => void;
}

function Said({ data: { outcome, invoice }, asking, busy, onAgain }: SaidProps) {
  if (outcome === 'paid') {
    return (
      <Notice intent="success" title={t('paidTitle')}>
        <p>{t('returnPaid', { money: moneyOf(invoice.paidMinor, invoice.currency), number: invoice.number })}</p>
        <p>{t('returnReceipt')}</p>
      </Notice>
    );
  }
  if (outcome === 'not-paid') {
    return (
      <Notice intent="warning" title={t('returnNotPaid')}>
        <p>{t('returnNotPaidWords')}</p>
      </Notice>
    );
  }
  return (
    <Notice intent="warning" title={t('returnNotYet')}>
      <div className="stack">
        <p>{asking ? t('returnNotYetWords') : t('returnNotYetLater')}</p>
        {asking ? <Spinner size={24} /> : <div><Button text={t('returnAgain')} loading={busy} onClick={onAgain} /></div>}
      </div>
    </Notice>
  );
}
