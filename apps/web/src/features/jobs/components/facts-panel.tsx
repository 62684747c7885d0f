import { Button } from '@blueprintjs/core';
import { moveLimitsSchema, type JobSheet } from '@shared/jobs';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { Link } from 'react-router-dom';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { TextField } from '../../../components/fields.js';
import { Facts, Panel } from '../../../components/panel.js';
import { useUnits } from '../../../components/units.js';
import { calendarDay } from '../../../lib/format.js';
import { checked, showServerProblems } from '../../../lib/form-problems.js';
import { useMay } from '../../../lib/me.js';
import { plateLine } from '../../../lib/plate-words.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useMoveLimits } from '../api/job-changes.js';
import { limitsVersionsQuery } from '../api/limits-query.js';
import { isEnded } from '../move-form.js';
import { CONTAMINATION_WORDS, t } from '../text.js';
import { EditFacts } from './edit-facts.js';

/** What was taken in, and for whom; changed here by the counter. */
export function FactsPanel({ job }: { readonly job: JobSheet }) {
  const [editing, setEditing] = useState(false);
  const [newer, setNewer] = useState(false);
  const mayEdit = useMay('jobs.edit');
  const mayMoveLimits = useMay('limits.publish') && !isEnded(job);
  const units = useUnits();
  const { nameplate } = job.machine;
  const newest = useQuery({ ...limitsVersionsQuery, enabled: mayMoveLimits }).data?.[0]?.version ?? job.limitsVersion;
  const contamination = `${CONTAMINATION_WORDS[job.contamination] ?? job.contamination}${job.contaminationWords ? `: ${job.contaminationWords}` : ''}`;
  return (
    <Panel title={t('facts')} actions={mayEdit && !editing ? <Button text={t('edit')} onClick={() => setEditing(true)} /> : undefined}>
      {editing ? (
        <EditFacts job={job} onDone={() => setEditing(false)} />
      ) : (
        <div className="stack">
          <p className="lb-complaint">{job.complaint}</p>
          <Facts
            rows={[
              [t('accessories'), job.accessories || t('nothing')],
              [t('contamination'), contamination],
              [t('promisedOn'), job.promisedOn ? calendarDay(job.promisedOn) : t('noPromise')],
              [t('customerReference'), job.customerReference || '–'],
              [t('plate'), plateLine(nameplate, units) || '–'],
              [t('serial'), nameplate.serial || '–'],
              [t('contact'), [job.customer.contactName, job.customer.phone].filter(Boolean).join(', ') || job.customer.email],
              [t('terms'), `${job.customer.terms === 'account' ? t('account', { days: job.customer.netDays }) : t('prepayment')}${job.customer.creditStop ? `, ${t('creditStop').toLowerCase()}` : ''}`],
            ]}
          />
          <p className="muted row">
            <Link to={`/shop/limits/${job.limitsVersion}`}>{t('limits', { n: job.limitsVersion })}</Link>
            {mayMoveLimits && newest > job.limitsVersion && <Button variant="minimal" text={t('newerLimits')} onClick={() => setNewer(true)} />}
          </p>
        </div>
      )}
      {newer && <NewerLimits job={job} onClose={() => setNewer(false)} />}
    </Panel>
  );
}

function NewerLimits({ job, onClose }: { readonly job: JobSheet; readonly onClose: () => void }) {
  const move = useMoveLimits(job.id);
  const { control, clearErrors, handleSubmit, setError } = useForm({ defaultValues: { reason: '' } });
  const send = ({ reason }: { reason: string }) => {
    const input = checked(moveLimitsSchema, { version: job.version, reason }, setError);
    if (input) move.mutate(input, { onSuccess: onClose, onError: (error) => showServerProblems(error, setError) });
  };
  return (
    <ConfirmDialog open title={t('newerLimitsTitle')} confirm={t('newerLimitsConfirm')} pending={move.isPending} error={unsaid(move.error, control)} onClose={onClose} onConfirm={() => sendForm({ clearErrors, handleSubmit }, send)}>
      <p>{t('newerLimitsWords')}</p>
      <TextField control={control} name="reason" label={t('why')} />
    </ConfirmDialog>
  );
}
