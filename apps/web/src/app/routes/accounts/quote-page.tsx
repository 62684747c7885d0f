import type { QuoteView } from '@shared/quotes';
import { useQuery, useQueryClient } from '@tanstack/react-query';
import { Link, useParams } from 'react-router-dom';
import { Answer } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { StateMark } from '../../../components/state-mark.js';
import { useTell } from '../../../components/toaster.js';
import { useUpdateQuote } from '../../../features/accounts/api/accounts-changes.js';
import { quoteQuery } from '../../../features/accounts/api/accounts-queries.js';
import { QuoteActions } from '../../../features/accounts/components/quote-actions.js';
import { QuoteEditor } from '../../../features/accounts/components/quote-editor.js';
import { QuoteReader } from '../../../features/accounts/components/quote-reader.js';
import { formOf } from '../../../features/accounts/quote-form.js';
import { t } from '../../../features/accounts/quote-text.js';
import { quoteStateWords } from '../../../features/accounts/state-words.js';
import { t as words } from '../../../features/accounts/text.js';
import { calendarDay, momentOf } from '../../../lib/format.js';
import { useMay } from '../../../lib/me.js';

/** One quote: written while it is a draft, read from then on. */
export function QuotePage() {
  const { id = '' } = useParams();
  const quote = useQuery(quoteQuery(id));
  const mayWrite = useMay('quotes.write');
  return (
    <Answer query={quote}>
      {(data) => (
        <div className="stack">
          <QuoteHeader quote={data} />
          {data.state === 'draft' && mayWrite ? <QuoteDraft key={data.id} quote={data} /> : <QuoteReader quote={data} />}
        </div>
      )}
    </Answer>
  );
}

function QuoteHeader({ quote }: { readonly quote: QuoteView }) {
  return (
    <PageHeader
      title={t('title', { number: quote.number })}
      below={
        <span className="row">
          <StateMark {...quoteStateWords(quote)} />
          {quote.revision > 1 && <span>{words('revision', { n: quote.revision })}</span>}
          <span>{t('forCustomer', { customer: quote.customerName })}</span>
          <Link to={`/jobs/${quote.jobId}?tab=money`}>{quote.jobNumber}</Link>
          {quote.sentAt && <span>{t('sentOn', { when: momentOf(quote.sentAt) })}</span>}
          {quote.state !== 'draft' && <span>{words('validUntil', { day: calendarDay(quote.validUntil) })}</span>}
        </span>
      }
    />
  );
}

function QuoteDraft({ quote }: { readonly quote: QuoteView }) {
  const update = useUpdateQuote(quote.jobId, quote.id);
  const client = useQueryClient();
  const tell = useTell();
  return (
    <QuoteEditor
      quote={quote}
      start={formOf(quote)}
      currency={quote.currency}
      draftKey={`quote:${quote.id}`}
      pending={update.isPending}
      error={update.error}
      onSave={(input, version, done) => update.mutate({ ...input, version }, done)}
      onSaved={(saved) => tell(t('saved', { number: saved.number }))}
      onGone={(theirs) => client.setQueryData(quoteQuery(quote.id).queryKey, theirs)}
      actions={(unsaved) => <QuoteActions quote={quote} invoiced={false} unsaved={unsaved} />}
    />
  );
}
