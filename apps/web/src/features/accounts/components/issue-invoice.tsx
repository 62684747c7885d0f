import { Button } from '@blueprintjs/core';
import type { QuoteView } from '@shared/quotes';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { useTell } from '../../../components/toaster.js';
import { moneyOf } from '../../../lib/format.js';
import { jobSheetQuery } from '../../../lib/job-queries.js';
import { useIssueInvoice } from '../api/accounts-changes.js';
import { t } from '../text.js';

/** From an approved quote to its invoice; the job's version says that nobody moved it meanwhile. */
export function IssueInvoice({ quote }: { readonly quote: QuoteView }) {
  const [open, setOpen] = useState(false);
  const issue = useIssueInvoice(quote.jobId);
  const { data: job } = useQuery(jobSheetQuery(quote.jobId));
  const tell = useTell();
  const navigate = useNavigate();
  const confirm = () =>
    job &&
    issue.mutate(
      { jobVersion: job.version, quoteId: quote.id },
      {
        onSuccess: (invoice) => {
          tell(t('issuedDone', { number: invoice.number }));
          void navigate(`/accounts/invoices/${invoice.id}`);
        },
      },
    );
  return (
    <>
      <Button intent="primary" text={t('issue')} onClick={() => setOpen(true)} />
      <ConfirmDialog open={open} title={t('issueTitle', { number: quote.number })} confirm={t('issueConfirm')} pending={issue.isPending || !job} error={issue.error} onConfirm={confirm} onClose={() => setOpen(false)}>
        <p>{t('issueWords', { customer: quote.customerName, money: moneyOf(quote.grossMinor, quote.currency) })}</p>
      </ConfirmDialog>
    </>
  );
}
