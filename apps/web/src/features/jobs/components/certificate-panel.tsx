import { Button } from '@blueprintjs/core';
import type { JobSheet } from '@shared/jobs';
import { issueCertificateSchema, type IssueCertificate } from '@shared/papers';
import { hasReached } from '@shared/route';
import { useForm } from 'react-hook-form';
import { ChoiceField, TextField } from '../../../components/fields.js';
import { Fold } from '../../../components/fold.js';
import { ErrorNotice } from '../../../components/notices.js';
import { Panel } from '../../../components/panel.js';
import { useTell } from '../../../components/toaster.js';
import { useUnits } from '../../../components/units.js';
import { checked, showServerProblems } from '../../../lib/form-problems.js';
import { useMay } from '../../../lib/me.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useIssueCertificate } from '../api/job-changes.js';
import { t } from '../work-text.js';

const SIZES = [
  { value: 'A4', label: 'A4' },
  { value: 'Letter', label: 'Letter' },
];
const UNITS = [
  { value: 'si', label: t('si') },
  { value: 'inch-pound', label: t('inchPound') },
];

/** The certificate in force, and the form that issues it or one that replaces it. */
export function CertificatePanel({ job }: { readonly job: JobSheet }) {
  const mayIssue = useMay('certificates.issue');
  const inForce = job.papers.filter((p) => p.kind === 'certificate' && p.supersededBy === null).at(-1);
  const reached = hasReached(job.route, job.step, 'ready');
  return (
    <Panel title={<span id="certificate">{t('certificate')}</span>}>
      <div className="stack">
        {inForce ? (
          <div className="row">
            <span>{t('certificateInForce', { number: inForce.number })}</span>
            <a className="lb-number" href={`/api/papers/${inForce.id}/pdf`} target="_blank" rel="noreferrer">
              {t('issuedOpen', { number: inForce.number })}
            </a>
          </div>
        ) : (
          <p>{reached ? t('certificateNone') : t('certificateNotYet')}</p>
        )}
        {mayIssue && reached && !inForce && <IssueForm job={job} replaces={null} />}
        {mayIssue && reached && inForce && (
          <Fold key={inForce.id} summary={t('certificateReplaceAsk')}>
            <IssueForm job={job} replaces={inForce.number} />
          </Fold>
        )}
      </div>
    </Panel>
  );
}

function IssueForm({ job, replaces }: { readonly job: JobSheet; readonly replaces: string | null }) {
  const units = useUnits();
  const issue = useIssueCertificate(job.id);
  const tell = useTell();
  const { control, clearErrors, handleSubmit, setError } = useForm<Omit<IssueCertificate, 'jobVersion'>>({ defaultValues: { paperSize: units === 'si' ? 'A4' : 'Letter', units, reason: '' } });
  const send = (form: Omit<IssueCertificate, 'jobVersion'>) => {
    if (replaces !== null && form.reason.trim() === '') return setError('reason', { message: t('replaceEmpty') }, { shouldFocus: true });
    const input = checked(issueCertificateSchema, { ...form, jobVersion: job.version }, setError);
    if (input) issue.mutate(input, { onSuccess: (paper) => tell(t('issued', { number: paper.number })), onError: (error) => showServerProblems(error, setError) });
  };
  return (
    <form
      className="stack"
      noValidate
      onSubmit={(e) => {
        e.preventDefault();
        sendForm({ clearErrors, handleSubmit }, send);
      }}
    >
      <div className="fields">
        <ChoiceField control={control} name="paperSize" label={t('paperSize')} options={SIZES} />
        <ChoiceField control={control} name="units" label={t('units')} options={UNITS} />
        {replaces !== null && <TextField control={control} name="reason" label={t('replaceReason')} help={t('replaceHelp')} wide />}
      </div>
      <ErrorNotice error={unsaid(issue.error, control)} />
      <div>
        <Button type="submit" intent={replaces === null ? 'primary' : 'none'} text={replaces === null ? t('certificateIssue') : t('certificateReplace')} loading={issue.isPending} />
      </div>
    </form>
  );
}
