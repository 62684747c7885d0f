import { Button } from '@blueprintjs/core';
import type { QuoteView } from '@shared/quotes';
import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { useTell } from '../../../components/toaster.js';
import { moneyOf } from '../../../lib/format.js';
import { useMay } from '../../../lib/me.js';
import { useReviseQuote, useSendQuote } from '../api/accounts-changes.js';
import { t } from '../text.js';
import { ApprovalDialog } from './approval-dialog.js';
import { IssueInvoice } from './issue-invoice.js';

interface QuoteActionsProps {
  readonly quote: QuoteView;
  /** an invoice was issued from it already: nothing is left to bill or to revise */
  readonly invoiced: boolean;
  /** the form of the draft stands beside it, with changes that are not saved: sending would leave them behind */
  readonly unsaved?: boolean;
}

type Open = 'send' | 'revise' | 'approve' | null;

/** What can be done to a quote as it stands, by whoever looks at it. */
export function QuoteActions({ quote, invoiced, unsaved = false }: QuoteActionsProps) {
  const [open, setOpen] = useState<Open>(null);
  const mayWrite = useMay('quotes.write');
  const mayApprove = useMay('quotes.approve-for-customer');
  const mayIssue = useMay('invoices.issue');
  const close = () => setOpen(null);
  const { state } = quote;
  return (
    <div className="row">
      {state === 'draft' && mayWrite && <Button intent="primary" text={t('send')} disabled={unsaved} onClick={() => setOpen('send')} />}
      {state === 'sent' && mayApprove && <Button intent="primary" text={t('approve')} onClick={() => setOpen('approve')} />}
      {state === 'approved' && mayIssue && !invoiced && <IssueInvoice quote={quote} />}
      {(state === 'sent' || state === 'approved' || state === 'declined') && mayWrite && !invoiced && <Button text={t('revise')} onClick={() => setOpen('revise')} />}
      {open === 'send' && <SendDialog quote={quote} onClose={close} />}
      {open === 'revise' && <ReviseDialog quote={quote} onClose={close} />}
      {open === 'approve' && <ApprovalDialog quote={quote} onClose={close} />}
    </div>
  );
}

interface QuoteDialogProps {
  readonly quote: QuoteView;
  readonly onClose: () => void;
}

function SendDialog({ quote, onClose }: QuoteDialogProps) {
  const send = useSendQuote(quote.jobId, quote.id);
  const tell = useTell();
  const { number, customerName: customer } = quote;
  const confirm = () =>
    send.mutate(
      { version: quote.version },
      {
        onSuccess: () => {
          tell(t('sentDone', { number, customer }));
          onClose();
        },
      },
    );
  return (
    <ConfirmDialog open title={t('sendTitle', { number })} confirm={t('sendConfirm')} pending={send.isPending} error={send.error} onConfirm={confirm} onClose={onClose}>
      <p>{t('sendWords', { customer, money: moneyOf(quote.grossMinor, quote.currency) })}</p>
    </ConfirmDialog>
  );
}

function ReviseDialog({ quote, onClose }: QuoteDialogProps) {
  const revise = useReviseQuote(quote.jobId, quote.id);
  const tell = useTell();
  const navigate = useNavigate();
  const confirm = () =>
    revise.mutate(
      { version: quote.version },
      {
        onSuccess: (next) => {
          tell(t('revisedDone', { n: next.revision }));
          void navigate(`/accounts/quotes/${next.id}`);
        },
      },
    );
  return (
    <ConfirmDialog open title={t('reviseTitle', { number: quote.number })} confirm={t('reviseConfirm')} pending={revise.isPending} error={revise.error} onConfirm={confirm} onClose={onClose}>
      <p>{t('reviseWords')}</p>
      {quote.state === 'approved' && <p>{t('reviseApproved')}</p>}
    </ConfirmDialog>
  );
}
