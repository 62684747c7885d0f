import { resumeJobSchema } from '@shared/jobs';
import { useForm } from 'react-hook-form';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { TextField } from '../../../components/fields.js';
import { useTell } from '../../../components/toaster.js';
import { checked } from '../../../lib/form-problems.js';
import { useResumeJob } from '../api/job-changes.js';
import { waitingWords } from '../floor-text.js';
import { t } from '../text.js';
import type { JobDialogProps } from './move-back-dialog.js';

/** What was waited for is here: the job goes on where it stood. */
export function ResumeDialog({ job, onClose }: JobDialogProps) {
  const resume = useResumeJob(job.id);
  const tell = useTell();
  const { control, handleSubmit, setError } = useForm({ defaultValues: { why: '' } });
  const send = ({ why }: { why: string }) => {
    const input = checked(resumeJobSchema, { version: job.version, why }, setError);
    if (!input) return;
    resume.mutate(input, {
      onSuccess: (sheet) => {
        tell(t('resumed', { number: sheet.number }));
        onClose();
      },
    });
  };
  return (
    <ConfirmDialog open title={t('resumeTitle')} confirm={t('resumeConfirm')} pending={resume.isPending} error={resume.error} onConfirm={() => void handleSubmit(send)()} onClose={onClose}>
      <p>{t('resumeWords', { who: waitingWords(job.waitingFor), reason: job.holdReason ?? '' })}</p>
      <TextField control={control} name="why" label={t('words')} optional />
    </ConfirmDialog>
  );
}
