import { holdJobSchema } from '@shared/jobs';
import { useForm } from 'react-hook-form';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { ChoiceField, TextField } from '../../../components/fields.js';
import { useTell } from '../../../components/toaster.js';
import { checked, showServerProblems } from '../../../lib/form-problems.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useHoldJob } from '../api/job-changes.js';
import { holdOf, type HoldForm } from '../move-form.js';
import { t } from '../text.js';
import type { JobDialogProps } from './move-back-dialog.js';

const WAITS = (['customer', 'part', 'outside-work', 'manager', 'other'] as const).map((value) => ({ value, label: t(`wait-${value}`) }));

/** Nothing goes on for a while: why, and who is waited for. */
export function HoldDialog({ job, onClose }: JobDialogProps) {
  const hold = useHoldJob(job.id);
  const tell = useTell();
  const { control, clearErrors, handleSubmit, setError } = useForm<HoldForm>({ defaultValues: { reason: '', waitingFor: null } });
  const send = (form: HoldForm) => {
    const input = checked(holdJobSchema, holdOf(form, job.version), setError);
    if (!input) return;
    hold.mutate(input, {
      onSuccess: (sheet) => {
        tell(t('heldDone', { number: sheet.number }));
        onClose();
      },
      onError: (error) => showServerProblems(error, setError),
    });
  };
  return (
    <ConfirmDialog open title={t('holdTitle')} confirm={t('holdConfirm')} pending={hold.isPending} error={unsaid(hold.error, control)} onConfirm={() => sendForm({ clearErrors, handleSubmit }, send)} onClose={onClose}>
      <TextField control={control} name="reason" label={t('holdReason')} autoFocus />
      <ChoiceField control={control} name="waitingFor" label={t('holdWaits')} options={WAITS} />
    </ConfirmDialog>
  );
}
