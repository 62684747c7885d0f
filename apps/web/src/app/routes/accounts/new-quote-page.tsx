import { useQuery } from '@tanstack/react-query';
import { Link, useNavigate, useParams } from 'react-router-dom';
import { Answer } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { useTell } from '../../../components/toaster.js';
import { useCreateQuote } from '../../../features/accounts/api/accounts-changes.js';
import { QuoteEditor } from '../../../features/accounts/components/quote-editor.js';
import { emptyLine, usualLastDay } from '../../../features/accounts/quote-form.js';
import { t } from '../../../features/accounts/quote-text.js';
import { shopToday } from '../../../lib/format.js';
import { jobSheetQuery } from '../../../lib/job-queries.js';
import { useMe } from '../../../lib/me.js';

/** A quote for a job, from an empty line on. */
export function NewQuotePage() {
  const { jobId = '' } = useParams();
  const { shop } = useMe();
  const job = useQuery(jobSheetQuery(jobId));
  const create = useCreateQuote(jobId);
  const tell = useTell();
  const navigate = useNavigate();
  return (
    <Answer query={job}>
      {(sheet) => (
        <div className="stack">
          <PageHeader
            title={t('newTitle', { number: sheet.number })}
            below={
              <span className="row">
                <span>{t('forCustomer', { customer: sheet.customer.name })}</span>
                <Link to={`/jobs/${jobId}?tab=money`}>{sheet.number}</Link>
              </span>
            }
          />
          <QuoteEditor
            quote={null}
            start={{ lines: [emptyLine()], validUntil: usualLastDay(shopToday(new Date())), note: '' }}
            currency={shop.currency}
            draftKey={`quote:new:${jobId}`}
            pending={create.isPending}
            error={create.error}
            onSave={(input, _version, done) => create.mutate(input, done)}
            onSaved={(saved) => {
              tell(t('saved', { number: saved.number }));
              void navigate(`/accounts/quotes/${saved.id}`, { replace: true });
            }}
          />
        </div>
      )}
    </Answer>
  );
}
