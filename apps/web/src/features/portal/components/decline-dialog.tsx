import { declineQuoteSchema, type QuoteView } from '@shared/quotes';
import { useForm } from 'react-hook-form';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { TextField } from '../../../components/fields.js';
import { checked, showServerProblems } from '../../../lib/form-problems.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useDeclineQuote } from '../api/portal-queries.js';
import { t } from '../text.js';

export function DeclineDialog({ quote, onClose }: { readonly quote: QuoteView; readonly onClose: () => void }) {
  const decline = useDeclineQuote(quote.id);
  const form = useForm({ defaultValues: { reason: '' } });
  const { control, setError } = form;
  const send = (values: { reason: string }) => {
    const input = checked(declineQuoteSchema, { ...values, version: quote.version }, setError);
    if (input) decline.mutate(input, { onSuccess: onClose, onError: (error) => showServerProblems(error, setError) });
  };
  return (
    <ConfirmDialog open title={t('declineTitle', { number: quote.number })} confirm={t('declineConfirm')} pending={decline.isPending} error={unsaid(decline.error)} onConfirm={() => sendForm(form, send)} onClose={onClose}>
      <p>{t('declineWords')}</p>
      <TextField control={control} name="reason" label={t('declineReason')} />
    </ConfirmDialog>
  );
}
