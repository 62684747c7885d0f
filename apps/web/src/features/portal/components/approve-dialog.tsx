import { approveInPortalSchema, type QuoteView } from '@shared/quotes';
import { useForm } from 'react-hook-form';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { TextField } from '../../../components/fields.js';
import { checked, showServerProblems } from '../../../lib/form-problems.js';
import { moneyOf } from '../../../lib/format.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useApproveQuote } from '../api/portal-queries.js';
import { t } from '../text.js';

interface AnswerDialogProps {
  readonly quote: QuoteView;
  readonly onClose: () => void;
}

/** The second tap: the amount once more, and a name that stands for it. */
export function ApproveDialog({ quote, onClose }: AnswerDialogProps) {
  const approve = useApproveQuote(quote.id);
  const form = useForm({ defaultValues: { name: '', purchaseOrder: '' } });
  const { control, setError } = form;
  const money = moneyOf(quote.grossMinor, quote.currency);
  const send = (values: { name: string; purchaseOrder: string }) => {
    const input = checked(approveInPortalSchema, { ...values, version: quote.version }, setError);
    if (input) approve.mutate(input, { onSuccess: onClose, onError: (error) => showServerProblems(error, setError) });
  };
  return (
    <ConfirmDialog open title={t('approveTitle', { number: quote.number })} confirm={t('approveConfirm', { money })} pending={approve.isPending} error={unsaid(approve.error)} onConfirm={() => sendForm(form, send)} onClose={onClose}>
      <p>{t('approveWords', { money })}</p>
      <TextField control={control} name="name" label={t('yourName')} help={t('yourNameHelp')} autoComplete="name" />
      <TextField control={control} name="purchaseOrder" label={t('purchaseOrder')} optional />
    </ConfirmDialog>
  );
}
