import { declineQuoteSchema, type QuoteView } from '@shared/quotes';
import { useForm } from 'react-hook-form';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { TextField } from '../../../components/fields.js';
import { checked, showServerProblems } from '../../../lib/form-problems.js';
import { useDeclineQuote } from '../api/portal-queries.js';
import { t } from '../text.js';

export function DeclineDialog({ quote, onClose }: { readonly quote: QuoteView; readonly onClose: () => void }) {
  const decline = useDeclineQuote(quote.id);
  const { control, handleSubmit, setError } = useForm({ defaultValues: { reason: '' } });
  const send = handleSubmit((form) => {
    const input = checked(declineQuoteSchema, { ...form, version: quote.version }, setError);
    if (input) decline.mutate(input, { onSuccess: onClose, onError: (error) => showServerProblems(error, setError) });
  });
  return (
    <ConfirmDialog open title={t('declineTitle', { number: quote.number })} confirm={t('declineConfirm')} pending={decline.isPending} error={decline.error} onConfirm={() => void send()} onClose={onClose}>
      <p>{t('declineWords')}</p>
      <TextField control={control} name="reason" label={t('declineReason')} />
    </ConfirmDialog>
  );
}
