import { Button } from '@blueprintjs/core';
import type { JobSheet } from '@shared/jobs';
import { askWaiverSchema, WAIVER_REASONS, type AskWaiver } from '@shared/waivers';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { SelectField, TextAreaField } from '../../../components/fields.js';
import { Fold } from '../../../components/fold.js';
import { checked, showServerProblems } from '../../../lib/form-problems.js';
import { useMay } from '../../../lib/me.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useAskWaiver, useCountersign } from '../api/job-changes.js';
import { waiverStanding } from '../sign-off-standing.js';
import { t } from '../work-text.js';
import { SignatureLine } from './signature-line.js';
import { SignWithReason } from './sign-with-reason.js';

const REASONS = WAIVER_REASONS.map((value) => ({ value, label: t(value) }));

/** No core test before: a typed reason and a manager's countersignature, never an invented reading. */
export function WaiverPanel({ job, testMade }: { readonly job: JobSheet; readonly testMade: boolean }) {
  const { waiver, countersignature } = waiverStanding(job.signOffs);
  const mayAsk = useMay('waivers.ask');
  const mayCountersign = useMay('waivers.countersign');
  const [open, setOpen] = useState<'ask' | 'countersign' | null>(null);
  const close = () => setOpen(null);
  if (!waiver) {
    if (testMade || !mayAsk) return null;
    return (
      <>
        <Fold summary={t('waiver')}>
          <p>{t('waiverWords')}</p>
          <Button text={t('askWaiver')} onClick={() => setOpen('ask')} />
        </Fold>
        {open === 'ask' && <AskWaiverDialog jobId={job.id} onClose={close} />}
      </>
    );
  }
  return (
    <div className="lb-to-answer">
      <SignatureLine signOff={waiver} words={(s) => t('waiverAsked', s)} />
      {countersignature ? (
        <SignatureLine signOff={countersignature} words={(s) => t('countersigned', s)} />
      ) : (
        <>
          <p>{t('waiverWaits')}</p>
          {mayCountersign && <Button intent="primary" text={t('countersign')} onClick={() => setOpen('countersign')} />}
        </>
      )}
      {open === 'countersign' && <CountersignDialog jobId={job.id} waiverId={waiver.id} who={waiver.by} reason={waiver.reason} onClose={close} />}
    </div>
  );
}

function AskWaiverDialog({ jobId, onClose }: { readonly jobId: string; readonly onClose: () => void }) {
  const ask = useAskWaiver(jobId);
  const { control, clearErrors, handleSubmit, setError } = useForm<{ reason: AskWaiver['reason'] | null; words: string }>({ defaultValues: { reason: null, words: '' } });
  return (
    <ConfirmDialog
      open
      title={t('waiver')}
      confirm={t('waiverSend')}
      pending={ask.isPending}
      error={unsaid(ask.error, control)}
      onClose={onClose}
      onConfirm={() =>
        sendForm({ clearErrors, handleSubmit }, (form) => {
          const input = checked(askWaiverSchema, form, setError);
          if (input) ask.mutate(input, { onSuccess: onClose, onError: (error) => showServerProblems(error, setError) });
        })
      }
    >
      <p>{t('waiverWords')}</p>
      <SelectField control={control} name="reason" label={t('waiverReason')} options={REASONS} ask={t('choose')} />
      <TextAreaField control={control} name="words" label={t('waiverCase')} />
    </ConfirmDialog>
  );
}

interface CountersignProps {
  readonly jobId: string;
  readonly waiverId: string;
  readonly who: string;
  readonly reason: string;
  readonly onClose: () => void;
}

function CountersignDialog({ jobId, waiverId, who, reason, onClose }: CountersignProps) {
  const countersign = useCountersign(jobId, waiverId);
  return (
    <SignWithReason title={t('countersignTitle')} label={t('remark')} pending={countersign.isPending} error={countersign.error} onClose={onClose} onSign={(remark, password) => countersign.mutate({ remark, password }, { onSuccess: onClose })}>
      <p>{t('countersignWords', { who, reason })}</p>
    </SignWithReason>
  );
}
