import { Button } from '@blueprintjs/core';
import type { JobSheet } from '@shared/jobs';
import { useState } from 'react';
import { useMay } from '../../../lib/me.js';
import { stepsBehind } from '../move-form.js';
import { t } from '../text.js';
import { EndDialog } from './end-dialog.js';
import { HoldDialog } from './hold-dialog.js';
import { MoveBackDialog } from './move-back-dialog.js';
import { ResumeDialog } from './resume-dialog.js';

type Open = 'back' | 'hold' | 'resume' | 'end' | null;

/** What else can be done to a job: back, hold, go on, end. */
export function JobActions({ job }: { readonly job: JobSheet }) {
  const [open, setOpen] = useState<Open>(null);
  const mayMove = useMay('jobs.move');
  const mayEnd = useMay('jobs.edit');
  const close = () => setOpen(null);
  const held = job.state === 'on-hold';
  if (!mayMove && !mayEnd) return null;
  return (
    <div className="lb-job-actions">
      {mayMove && held && <Button intent="primary" text={t('resume')} onClick={() => setOpen('resume')} />}
      {mayMove && !held && <Button text={t('hold')} onClick={() => setOpen('hold')} />}
      {mayMove && !held && stepsBehind(job.route, job.step).length > 0 && <Button text={t('back')} onClick={() => setOpen('back')} />}
      {mayEnd && <Button text={t('end')} onClick={() => setOpen('end')} />}
      {open === 'back' && <MoveBackDialog job={job} onClose={close} />}
      {open === 'hold' && <HoldDialog job={job} onClose={close} />}
      {open === 'resume' && <ResumeDialog job={job} onClose={close} />}
      {open === 'end' && <EndDialog job={job} onClose={close} />}
    </div>
  );
}
