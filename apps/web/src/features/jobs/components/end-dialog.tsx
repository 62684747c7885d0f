import { endJobSchema } from '@shared/jobs';
import { useForm } from 'react-hook-form';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { ChoiceField, TextAreaField, TextField } from '../../../components/fields.js';
import { useTell } from '../../../components/toaster.js';
import { checked, showServerProblems } from '../../../lib/form-problems.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useEndJob } from '../api/job-changes.js';
import { endOf, type EndForm } from '../move-form.js';
import { t } from '../text.js';
import type { JobDialogProps } from './move-back-dialog.js';

const ENDS = (['returned-unrepaired', 'replaced', 'scrapped'] as const).map((value) => ({ value, label: t(value) }));
const HOWS = (['phone', 'e-mail', 'in-person', 'portal'] as const).map((value) => ({ value, label: t(value) }));

/** The job ends without a repair; who agreed stands in its history for good. */
export function EndDialog({ job, onClose }: JobDialogProps) {
  const end = useEndJob(job.id);
  const tell = useTell();
  const { control, clearErrors, handleSubmit, setError } = useForm<EndForm>({ defaultValues: { end: null, consentBy: '', consentHow: null, words: '' } });
  const send = (form: EndForm) => {
    const input = checked(endJobSchema, endOf(form, job.version), setError);
    if (!input) return;
    end.mutate(input, {
      onSuccess: (sheet) => {
        tell(t('endedDone', { number: sheet.number }));
        onClose();
      },
      onError: (error) => showServerProblems(error, setError),
    });
  };
  return (
    <ConfirmDialog open title={t('endTitle')} confirm={t('endConfirm')} pending={end.isPending} error={unsaid(end.error, control)} onConfirm={() => sendForm({ clearErrors, handleSubmit }, send)} onClose={onClose}>
      <p>{t('endWords')}</p>
      <ChoiceField control={control} name="end" label={t('endHow')} options={ENDS} />
      <TextField control={control} name="consentBy" label={t('consentBy')} />
      <ChoiceField control={control} name="consentHow" label={t('consentHow')} options={HOWS} />
      <TextAreaField control={control} name="words" label={t('words')} optional />
    </ConfirmDialog>
  );
}
