import type { QuoteView } from '@shared/quotes';
import { useQuery } from '@tanstack/react-query';
import { MoneyLines } from '../../../components/money-lines.js';
import { Notice } from '../../../components/notice.js';
import { Panel } from '../../../components/panel.js';
import { jobSheetQuery } from '../../../lib/job-queries.js';
import { useMay } from '../../../lib/me.js';
import { invoicesOfJobQuery } from '../api/accounts-queries.js';
import { t } from '../quote-text.js';
import { quotePaperNumber } from '../state-words.js';
import { t as words } from '../text.js';
import { QuoteActions } from './quote-actions.js';
import { QuoteAnswer } from './quote-answer.js';

/** A quote that left the house, or one that only may be read. */
export function QuoteReader({ quote }: { readonly quote: QuoteView }) {
  const mayInvoices = useMay('invoices.read');
  const invoices = useQuery({ ...invoicesOfJobQuery(quote.jobId), enabled: mayInvoices });
  const { data: job } = useQuery(jobSheetQuery(quote.jobId));
  const paper = job?.papers.find((p) => p.kind === 'quote' && p.number === quotePaperNumber(quote));
  return (
    <div className="stack">
      <QuoteAnswer quote={quote} />
      {quote.state === 'sent' && quote.expired && <Notice intent="warning">{t('expiredWords')}</Notice>}
      <Panel
        title={t('lines')}
        actions={
          paper && (
            <a href={`/api/papers/${paper.id}/pdf`} target="_blank" rel="noreferrer" aria-label={words('paperOf', { number: paper.number })}>
              {t('paper')}
            </a>
          )
        }
      >
        <MoneyLines of={quote} caption={t('caption')} />
      </Panel>
      {quote.note && (
        <Panel title={t('note')}>
          <p className="lb-note">{quote.note}</p>
        </Panel>
      )}
      <QuoteActions quote={quote} invoiced={invoices.data?.some((i) => i.quoteNumber === quote.number) ?? false} />
    </div>
  );
}
