import { withdrawOvenHistorySchema, type OvenPoint } from '@shared/insight';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { TextField } from '../../../components/fields.js';
import { useTell } from '../../../components/toaster.js';
import { calendarDay } from '../../../lib/format.js';
import { checked } from '../../../lib/form-problems.js';
import { newKey } from '../../../lib/http.js';
import { useWithdraw } from '../api/oven-queries.js';
import { percentWords } from '../percent.js';
import { t } from '../text.js';

/** A figure of the older book leaves the chart, with a reason. */
export function TakeBack({ point, onClose }: { readonly point: OvenPoint; readonly onClose: () => void }) {
  const [key] = useState(newKey);
  const withdraw = useWithdraw(point.entry?.id ?? '', key);
  const tell = useTell();
  const { control, handleSubmit, setError } = useForm({ defaultValues: { reason: '' } });
  const send = (values: { reason: string }) => {
    const input = checked(withdrawOvenHistorySchema, values, setError);
    if (!input) return;
    withdraw.mutate(input.reason, {
      onSuccess: () => {
        tell(t('takenBack'));
        onClose();
      },
    });
  };
  return (
    <ConfirmDialog open title={t('takeBackTitle', { day: calendarDay(point.day) })} confirm={t('takeBack')} pending={withdraw.isPending} error={withdraw.error} onConfirm={() => void handleSubmit(send)()} onClose={onClose}>
      <p>{t('takeBackWords', { change: percentWords(point.change) })}</p>
      <TextField control={control} name="reason" label={t('why')} />
    </ConfirmDialog>
  );
}
