import type { QuoteView } from '@shared/quotes';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { Answer, Empty } from '../../../components/faces.js';
import { Panel } from '../../../components/panel.js';
import { StateMark } from '../../../components/state-mark.js';
import { calendarDay, moneyOf } from '../../../lib/format.js';
import { jobSheetQuery } from '../../../lib/job-queries.js';
import { useMay } from '../../../lib/me.js';
import { invoicesOfJobQuery, quotesOfJobQuery } from '../api/accounts-queries.js';
import { invoiceStateWords, quotePaperNumber, quoteStateWords } from '../state-words.js';
import { t } from '../text.js';
import { QuoteActions } from './quote-actions.js';
import { QuoteAnswer } from './quote-answer.js';
import './accounts.css';

/** The money part of the job sheet: what was quoted, what was answered, what was billed. */
export function JobMoney({ jobId }: { readonly jobId: string }) {
  const mayRead = useMay('quotes.read');
  const mayInvoices = useMay('invoices.read');
  if (!mayRead) return <p className="muted">{t('moneyElsewhere')}</p>;
  return (
    <div className="stack">
      <JobQuotes jobId={jobId} knowsInvoices={mayInvoices} />
      {mayInvoices ? <JobInvoices jobId={jobId} /> : <p className="muted">{t('invoicesElsewhere')}</p>}
    </div>
  );
}

function JobQuotes({ jobId, knowsInvoices }: { readonly jobId: string; readonly knowsInvoices: boolean }) {
  const mayWrite = useMay('quotes.write');
  const quotes = useQuery(quotesOfJobQuery(jobId));
  const invoices = useQuery({ ...invoicesOfJobQuery(jobId), enabled: knowsInvoices });
  const { data: job } = useQuery(jobSheetQuery(jobId));
  const paperOf = (quote: QuoteView) => job?.papers.find((p) => p.kind === 'quote' && p.number === quotePaperNumber(quote));
  const newQuote = mayWrite && <Link to={`/jobs/${jobId}/quotes/new`}>{t('newQuote')}</Link>;
  return (
    <Panel title={t('quotes')} actions={newQuote}>
      <Answer query={quotes} isEmpty={(all) => all.length === 0} empty={<Empty title={t('noQuotes')}>{mayWrite ? t('noQuotesHelp') : t('noQuotesReadOnly')}</Empty>}>
        {(all) => (
          <ul className="lb-money-list">
            {all.map((quote) => {
              const paper = paperOf(quote);
              return (
                <li key={quote.id} className={quote.state === 'superseded' ? 'lb-out-of-force' : undefined}>
                  <div className="row spread">
                    <span className="row">
                      <Link to={`/accounts/quotes/${quote.id}`} aria-label={t('openQuote', { number: quotePaperNumber(quote) })}>
                        <b className="num">{quote.number}</b>
                      </Link>
                      {quote.revision > 1 && <span className="muted">{t('revision', { n: quote.revision })}</span>}
                      <StateMark {...quoteStateWords(quote)} />
                    </span>
                    <b className="num">{moneyOf(quote.grossMinor, quote.currency)}</b>
                  </div>
                  <div className="row muted">
                    {(quote.state === 'draft' || quote.state === 'sent') && <span>{t('validUntil', { day: calendarDay(quote.validUntil) })}</span>}
                    {paper && (
                      <a href={`/api/papers/${paper.id}/pdf`} target="_blank" rel="noreferrer" aria-label={t('paperOf', { number: paper.number })}>
                        {t('paper')}
                      </a>
                    )}
                  </div>
                  <QuoteAnswer quote={quote} />
                  <QuoteActions quote={quote} invoiced={invoices.data?.some((i) => i.quoteNumber === quote.number) ?? false} />
                </li>
              );
            })}
          </ul>
        )}
      </Answer>
    </Panel>
  );
}

function JobInvoices({ jobId }: { readonly jobId: string }) {
  const invoices = useQuery(invoicesOfJobQuery(jobId));
  return (
    <Panel title={t('invoices')}>
      <Answer query={invoices} isEmpty={(all) => all.length === 0} empty={<Empty title={t('noInvoices')}>{t('noInvoicesHelp')}</Empty>}>
        {(all) => (
          <ul className="lb-money-list">
            {all.map((invoice) => (
              <li key={invoice.id}>
                <div className="row spread">
                  <span className="row">
                    <Link to={`/accounts/invoices/${invoice.id}`}>
                      <b className="num">{invoice.number}</b>
                    </Link>
                    <StateMark {...invoiceStateWords(invoice)} />
                  </span>
                  <b className="num">{moneyOf(invoice.grossMinor, invoice.currency)}</b>
                </div>
                <div className="row muted">
                  <span>{t('ofQuote', { number: invoice.quoteNumber })}</span>
                  {invoice.balanceMinor > 0 && <span>{t('due', { day: calendarDay(invoice.dueOn) })}</span>}
                  {invoice.balanceMinor > 0 && invoice.paidMinor > 0 && <span>{t('balance', { money: moneyOf(invoice.balanceMinor, invoice.currency) })}</span>}
                  {invoice.paperId && (
                    <a href={`/api/papers/${invoice.paperId}/pdf`} target="_blank" rel="noreferrer" aria-label={t('paperOf', { number: invoice.number })}>
                      {t('paper')}
                    </a>
                  )}
                </div>
              </li>
            ))}
          </ul>
        )}
      </Answer>
    </Panel>
  );
}
