import { Button } from '@blueprintjs/core';
import type { JobSheet } from '@shared/jobs';
import { useId, type ReactNode } from 'react';
import { Conditions, ErrorNotice } from '../../../components/notices.js';
import { useTell } from '../../../components/toaster.js';
import { useMay } from '../../../lib/me.js';
import { stepName } from '../../../lib/step-names.js';
import { useMoveJob } from '../api/job-changes.js';
import { t } from '../text.js';

interface NextStepProps {
  readonly job: JobSheet;
  readonly linkOf: (place: string, words: string) => ReactNode;
}

/** The next step, what stands in front of it, and the button that goes there. */
export function NextStep({ job, linkOf }: NextStepProps) {
  const move = useMoveJob(job.id);
  const tell = useTell();
  const listId = useId();
  const mayMove = useMay('jobs.move');
  const mayRelease = useMay('jobs.release');
  const { next } = job;
  if (!next) return null;
  const allowed = next.step === 'released' ? mayRelease : mayMove;
  const missing = next.conditions.filter((c) => !c.met);
  const go = () => move.mutate({ version: job.version, to: next.step, why: '' }, { onSuccess: (sheet) => tell(t('movedOn', { number: sheet.number, step: stepName(sheet.step) })) });
  return (
    <div className="stack">
      <div id={listId}>{next.conditions.length > 0 ? <Conditions conditions={[...missing, ...next.conditions.filter((c) => c.met)]} linkOf={linkOf} /> : <p>{t('nothingStopsBut', { step: stepName(next.step) })}</p>}</div>
      <ErrorNotice error={move.error} />
      {allowed ? (
        <Button
          className="lb-move"
          intent="primary"
          size="large"
          text={next.step === 'released' ? t('release') : t('moveOn', { step: stepName(next.step) })}
          disabled={!next.open}
          aria-describedby={listId}
          loading={move.isPending}
          onClick={go}
        />
      ) : (
        <p className="muted">{next.step === 'released' ? t('mayNotRelease') : t('mayNotMove')}</p>
      )}
    </div>
  );
}
