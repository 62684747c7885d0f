import { Button } from '@blueprintjs/core';
import type { JobSheet } from '@shared/jobs';
import type { RecordView } from '@shared/records';
import { useState } from 'react';
import { SignDialog } from '../../../components/sign-dialog.js';
import { useMay, useMe } from '../../../lib/me.js';
import { useReleaseTested, useSignTested } from '../api/job-changes.js';
import { finalSignatures } from '../sign-off-standing.js';
import { t } from '../work-text.js';
import { SignatureLine } from './signature-line.js';

/** The technician signs what was measured; a second person releases it. */
export function FinalSignatures({ job, record }: { readonly job: JobSheet; readonly record: RecordView }) {
  const { tested, released, correctedSince } = finalSignatures(job.signOffs, record);
  const maySign = useMay('records.sign');
  const mayRelease = useMay('final-test.release');
  const me = useMe();
  const sign = useSignTested(job.id, record.id);
  const release = useReleaseTested(job.id, record.id);
  const [open, setOpen] = useState<'sign' | 'release' | null>(null);
  const close = () => setOpen(null);
  const mine = tested?.by === me.name;
  return (
    <div className="lb-to-answer">
      <h3>{t('signatures')}</h3>
      {tested ? <SignatureLine signOff={tested} words={(s) => t('tested', s)} /> : <p>{correctedSince ? t('corrected') : t('testedMissing')}</p>}
      {!tested && maySign && <Button intent="primary" text={t('sign')} onClick={() => setOpen('sign')} />}
      {released ? <SignatureLine signOff={released} words={(s) => t('released', s)} /> : <p>{t('releasedMissing')}</p>}
      {tested && !released && mayRelease && record.verdict === 'conforms' && <Button intent={mine ? 'none' : 'primary'} text={t('releasePerson')} onClick={() => setOpen('release')} />}
      <SignDialog open={open === 'sign'} title={t('signTitle')} pending={sign.isPending} error={sign.error} onClose={close} onSign={(password) => sign.mutate({ version: record.version, password }, { onSuccess: close })}>
        <p>{t('signWords', { n: record.revision })}</p>
      </SignDialog>
      <SignDialog open={open === 'release'} title={t('releaseTitle')} pending={release.isPending} error={release.error} onClose={close} onSign={(password) => release.mutate({ version: record.version, password }, { onSuccess: close })}>
        <p>{t('releaseWords', { n: record.revision })}</p>
      </SignDialog>
    </div>
  );
}
