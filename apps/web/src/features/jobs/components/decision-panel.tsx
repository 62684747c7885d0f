import { Button } from '@blueprintjs/core';
import type { JobSheet } from '@shared/jobs';
import type { RecordView } from '@shared/records';
import { recordDecisionSchema, type RecordDecision } from '@shared/waivers';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { ChoiceField, SelectField, TextAreaField, TextField } from '../../../components/fields.js';
import { checked, showServerProblems } from '../../../lib/form-problems.js';
import { useMay } from '../../../lib/me.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useRecordDecision } from '../api/job-changes.js';
import { channelName, choiceName, CHOICES } from '../decision-form.js';
import { decisionStanding } from '../sign-off-standing.js';
import { t } from '../work-text.js';
import { SignatureLine } from './signature-line.js';

interface DecisionProps {
  readonly job: JobSheet;
  readonly record: RecordView;
  readonly about: RecordDecision['about'];
}

/** A core that does not conform is the customer's to decide; the answer is recorded with who gave it. */
export function DecisionPanel({ job, record, about }: DecisionProps) {
  const { decision, holds } = decisionStanding(job.signOffs, about, record);
  const mayRecord = useMay('decisions.record');
  const [open, setOpen] = useState(false);
  return (
    <div className="lb-to-answer">
      <h3>{t('decision')}</h3>
      {decision ? (
        <>
          <SignatureLine signOff={decision} words={() => t('decisionAnswered', { by: String(decision.detail['answeredBy'] ?? decision.by), how: channelName(decision.detail['channel']), choice: choiceName(decision.detail['choice']) })} />
          {decision.reason && <p className="muted">“{decision.reason}”</p>}
          {!holds && <p>{t('decisionStale')}</p>}
        </>
      ) : (
        <p>{t('decisionWords')}</p>
      )}
      {mayRecord && <Button intent={holds ? 'none' : 'primary'} text={decision ? t('newDecision') : t('recordDecision')} onClick={() => setOpen(true)} />}
      {open && <DecisionDialog jobId={job.id} recordId={record.id} about={about} onClose={() => setOpen(false)} />}
    </div>
  );
}

interface DialogProps {
  readonly jobId: string;
  readonly recordId: string;
  readonly about: RecordDecision['about'];
  readonly onClose: () => void;
}

const CHANNELS = (['phone', 'e-mail', 'in-person'] as const).map((value) => ({ value, label: channelName(value) }));

function DecisionDialog({ jobId, recordId, about, onClose }: DialogProps) {
  const record = useRecordDecision(jobId);
  const { control, clearErrors, handleSubmit, setError } = useForm<Pick<RecordDecision, 'answeredBy' | 'words'> & { choice: string | null; channel: string | null }>({ defaultValues: { choice: null, answeredBy: '', channel: null, words: '' } });
  return (
    <ConfirmDialog
      open
      title={t('decision')}
      confirm={t('saveDecision')}
      pending={record.isPending}
      error={unsaid(record.error, control)}
      onClose={onClose}
      onConfirm={() =>
        sendForm({ clearErrors, handleSubmit }, (form) => {
          const input = checked(recordDecisionSchema, { recordId, about, ...form }, setError);
          if (input) record.mutate(input, { onSuccess: onClose, onError: (error) => showServerProblems(error, setError) });
        })
      }
    >
      <SelectField control={control} name="choice" label={t('choice')} options={CHOICES[about].map((value) => ({ value, label: choiceName(value) }))} ask={t('choose')} />
      <TextField control={control} name="answeredBy" label={t('answeredBy')} />
      <ChoiceField control={control} name="channel" label={t('channel')} options={CHANNELS} />
      <TextAreaField control={control} name="words" label={t('answerWords')} optional />
    </ConfirmDialog>
  );
}
