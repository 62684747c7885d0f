import { Button } from '@blueprintjs/core';
import type { JobSheet } from '@shared/jobs';
import { useState } from 'react';
import { Panel } from '../../../components/panel.js';
import { useMay } from '../../../lib/me.js';
import { useLiftCredit } from '../api/job-changes.js';
import { t } from '../work-text.js';
import { SignatureLine } from './signature-line.js';
import { SignWithReason } from './sign-with-reason.js';

/** A customer on credit stop: a manager lets this one delivery go. Nothing to see for anybody else. */
export function CreditPanel({ job }: { readonly job: JobSheet }) {
  const mayLift = useMay('credit.lift');
  const lift = useLiftCredit(job.id);
  const [open, setOpen] = useState(false);
  if (!job.customer.creditStop) return null;
  const lifted = job.signOffs.filter((s) => s.kind === 'credit-lift').at(-1);
  return (
    <Panel title={t('credit')}>
      {lifted ? (
        <SignatureLine signOff={lifted} words={(s) => t('lifted', s)} />
      ) : (
        <div className="stack">
          <p>{t('creditWords')}</p>
          {mayLift ? (
            <div>
              <Button text={t('liftCredit')} onClick={() => setOpen(true)} />
            </div>
          ) : (
            <p className="muted">{t('managerOnly')}</p>
          )}
        </div>
      )}
      {open && (
        <SignWithReason title={t('liftTitle')} label={t('reason')} emptyWords={t('liftEmpty')} pending={lift.isPending} error={lift.error} onClose={() => setOpen(false)} onSign={(reason, password) => lift.mutate({ reason, password }, { onSuccess: () => setOpen(false) })}>
          <p>{t('creditWords')}</p>
        </SignWithReason>
      )}
    </Panel>
  );
}
