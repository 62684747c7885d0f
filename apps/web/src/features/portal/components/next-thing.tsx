import { Link } from 'react-router-dom';
import type { PortalHome } from '@shared/portal';
import { calendarDay, moneyOf } from '../../../lib/format.js';
import { thingsToDo, type Thing } from '../next-thing.js';
import { t } from '../text.js';
import './portal.css';

/** The one thing the customer is asked to do, large; what else waits stands below it in a line each. */
export function NextThing({ home }: { readonly home: PortalHome }) {
  const [first, ...others] = thingsToDo(home);
  return (
    <>
      {first ? <ThingCard thing={first} /> : <Nothing />}
      {others.length > 0 && (
        <section aria-label={t('also')}>
          <h2>{t('also')}</h2>
          <ul className="lb-portal-list">
            {others.map((thing) => (
              <li key={thing.kind === 'quote' ? thing.quote.id : thing.invoice.id}>
                <ThingLine thing={thing} />
              </li>
            ))}
          </ul>
        </section>
      )}
    </>
  );
}

function Nothing() {
  return (
    <section className="lb-thing lb-thing-none">
      <h2>{t('nothingToDo')}</h2>
      <p className="muted">{t('nothingToDoWords')}</p>
    </section>
  );
}

function ThingCard({ thing }: { readonly thing: Thing }) {
  if (thing.kind === 'quote') {
    const { id, number, jobNumber, grossMinor, currency, validUntil } = thing.quote;
    return (
      <section className="lb-thing">
        <h2>{t('answerQuote')}</h2>
        <p>{t('answerQuoteWords', { number, job: jobNumber, money: moneyOf(grossMinor, currency), day: calendarDay(validUntil) })}</p>
        <Link className="lb-big-link" to={`/portal/quotes/${id}`}>
          {t('openQuote')}
        </Link>
      </section>
    );
  }
  const { id, number, jobNumber, balanceMinor, currency, dueOn, overdue } = thing.invoice;
  return (
    <section className="lb-thing">
      <h2>{t(overdue ? 'payInvoiceLate' : 'payInvoice')}</h2>
      <p>{t('payInvoiceWords', { number, job: jobNumber, money: moneyOf(balanceMinor, currency), day: calendarDay(dueOn) })}</p>
      <Link className="lb-big-link" to={`/portal/invoices/${id}`}>
        {t('openInvoice')}
      </Link>
    </section>
  );
}

function ThingLine({ thing }: { readonly thing: Thing }) {
  if (thing.kind === 'quote') {
    const { id, number, grossMinor, currency } = thing.quote;
    return <Link to={`/portal/quotes/${id}`}>{t('alsoQuote', { number, money: moneyOf(grossMinor, currency) })}</Link>;
  }
  const { id, number, balanceMinor, currency } = thing.invoice;
  return <Link to={`/portal/invoices/${id}`}>{t('alsoInvoice', { number, money: moneyOf(balanceMinor, currency) })}</Link>;
}
