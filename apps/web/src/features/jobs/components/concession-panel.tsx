import { Button } from '@blueprintjs/core';
import type { JobSheet } from '@shared/jobs';
import type { RecordView } from '@shared/records';
import { useState } from 'react';
import { useMay } from '../../../lib/me.js';
import { useReleaseInconclusive, useSignConcession } from '../api/job-changes.js';
import { concessionOn, decisionStanding, releaseOfInconclusive } from '../sign-off-standing.js';
import { t } from '../work-text.js';
import { SignatureLine } from './signature-line.js';
import { SignWithReason } from './sign-with-reason.js';

interface PanelProps {
  readonly job: JobSheet;
  readonly record: RecordView;
}

/** The core does not conform and the customer accepts it: a manager signs. */
export function ConcessionPanel({ job, record }: PanelProps) {
  const concession = concessionOn(job.signOffs, record);
  const { decision, holds } = decisionStanding(job.signOffs, 'core-test-after', record);
  const maySign = useMay('concessions.sign');
  const sign = useSignConcession(job.id);
  const [open, setOpen] = useState(false);
  if (concession) return <SignatureLine signOff={concession} words={(s) => t('concessionSigned', s)} />;
  if (!decision || !holds || decision.detail['choice'] !== 'accept-with-concession') return null;
  return (
    <div className="lb-to-answer">
      <h3>{t('concession')}</h3>
      <p>{t('concessionWords')}</p>
      {maySign ? <Button intent="primary" text={t('signConcession')} onClick={() => setOpen(true)} /> : <p className="muted">{t('managerOnly')}</p>}
      {open && (
        <SignWithReason
          title={t('concessionTitle')}
          label={t('concessionReason')}
          emptyWords={t('concessionReasonEmpty')}
          pending={sign.isPending}
          error={sign.error}
          onClose={() => setOpen(false)}
          onSign={(reason, password) => sign.mutate({ recordId: record.id, decisionId: decision.id, reason, password }, { onSuccess: () => setOpen(false) })}
        >
          <p>{t('concessionWords')}</p>
        </SignWithReason>
      )}
    </div>
  );
}

/** The limit lies inside the uncertainty: repeat, or a manager releases it. */
export function InconclusivePanel({ job, record }: PanelProps) {
  const released = releaseOfInconclusive(job.signOffs, record);
  const maySign = useMay('concessions.sign');
  const release = useReleaseInconclusive(job.id, record.id);
  const [open, setOpen] = useState(false);
  if (released) return <SignatureLine signOff={released} words={(s) => t('inconclusiveSigned', s)} />;
  return (
    <div className="lb-to-answer">
      <h3>{t('inconclusive')}</h3>
      <p>{t('inconclusiveWords')}</p>
      {maySign && <Button text={t('releaseInconclusive')} onClick={() => setOpen(true)} />}
      {open && (
        <SignWithReason
          title={t('inconclusiveTitle')}
          label={t('reason')}
          emptyWords={t('reasonEmpty')}
          pending={release.isPending}
          error={release.error}
          onClose={() => setOpen(false)}
          onSign={(reason, password) => release.mutate({ reason, password }, { onSuccess: () => setOpen(false) })}
        >
          <p>{t('inconclusive')}.</p>
        </SignWithReason>
      )}
    </div>
  );
}
