import { Button } from '@blueprintjs/core';
import type { InvoiceView } from '@shared/invoices';
import { useEffect } from 'react';
import { Notice } from '../../../components/notice.js';
import { ErrorNotice } from '../../../components/notices.js';
import { moneyOf } from '../../../lib/format.js';
import { ApiError } from '../../../lib/http.js';
import { useMe } from '../../../lib/me.js';
import { useStartCheckout } from '../api/portal-queries.js';
import { t } from '../text.js';
import './portal.css';

/** Leads to the payment page. It stays busy until the page changes, so that a second tap does nothing. */
export function PayButton({ invoice }: { readonly invoice: InvoiceView }) {
  const checkout = useStartCheckout(invoice.id);
  const { shop } = useMe();
  const { reset } = checkout;
  useEffect(() => {
    // the back button may bring the page back as it was left, with the button still busy
    const back = (event: PageTransitionEvent) => {
      if (event.persisted) reset();
    };
    window.addEventListener('pageshow', back);
    return () => window.removeEventListener('pageshow', back);
  }, [reset]);
  const changed = checkout.error instanceof ApiError && checkout.error.code === 'CHANGED_MEANWHILE';
  const pay = () => checkout.mutate({ version: invoice.version }, { onSuccess: ({ url }) => window.location.assign(url) });
  return (
    <div className="stack">
      {changed ? (
        <Notice intent="warning" role="alert" title={t('changed')}>
          <p>{t('changedWords')}</p>
        </Notice>
      ) : (
        <ErrorNotice error={checkout.error} />
      )}
      <Button className="lb-big-button" fill intent="primary" text={t('pay', { money: moneyOf(invoice.balanceMinor, invoice.currency) })} loading={checkout.isPending || checkout.isSuccess} onClick={pay} />
      <p className="muted">
        {t('payWords')} {t('payOther')}
      </p>
      {shop.demo && <p className="muted">{t('payDemo')}</p>}
    </div>
  );
}
