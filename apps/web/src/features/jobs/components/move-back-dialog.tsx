import { moveJobSchema, type JobSheet } from '@shared/jobs';
import { useForm } from 'react-hook-form';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { SelectField, TextField } from '../../../components/fields.js';
import { useTell } from '../../../components/toaster.js';
import { checked, showServerProblems } from '../../../lib/form-problems.js';
import { sendForm } from '../../../lib/send-form.js';
import { stepName } from '../../../lib/step-names.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useMoveJob } from '../api/job-changes.js';
import { moveBackOf, stepsBehind, type MoveBackForm } from '../move-form.js';
import { t } from '../text.js';

export interface JobDialogProps {
  readonly job: JobSheet;
  readonly onClose: () => void;
}

/** Back to an earlier step, with the reason; nothing that was recorded goes away. */
export function MoveBackDialog({ job, onClose }: JobDialogProps) {
  const move = useMoveJob(job.id);
  const tell = useTell();
  const behind = stepsBehind(job.route, job.step);
  const { control, clearErrors, handleSubmit, setError } = useForm<MoveBackForm>({ defaultValues: { to: behind[0] ?? null, why: '' } });
  const send = (form: MoveBackForm) => {
    const input = checked(moveJobSchema, moveBackOf(form, job.version), setError);
    if (!input) return;
    move.mutate(input, {
      onSuccess: (sheet) => {
        tell(t('movedBack', { number: sheet.number, step: stepName(sheet.step) }));
        onClose();
      },
      onError: (error) => showServerProblems(error, setError),
    });
  };
  return (
    <ConfirmDialog open title={t('backTitle')} confirm={t('backConfirm')} pending={move.isPending} error={unsaid(move.error, control)} onConfirm={() => sendForm({ clearErrors, handleSubmit }, send)} onClose={onClose}>
      <p>{t('backWords')}</p>
      <SelectField control={control} name="to" label={t('backTo')} options={behind.map((step) => ({ value: step, label: stepName(step) }))} />
      <TextField control={control} name="why" label={t('why')} />
    </ConfirmDialog>
  );
}
