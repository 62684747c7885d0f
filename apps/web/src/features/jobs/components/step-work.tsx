import type { JobSheet } from '@shared/jobs';
import type { RecordKind, RecordView } from '@shared/records';
import { hasReached, type Step } from '@shared/route';
import { Link } from 'react-router-dom';
import { Panel } from '../../../components/panel.js';
import { countingAfter, countingBefore } from '../../../lib/core-figures.js';
import { useMay } from '../../../lib/me.js';
import { STEP_RECORDS } from '../../../lib/record-names.js';
import { stepName } from '../../../lib/step-names.js';
import { isEnded } from '../move-form.js';
import { t } from '../work-text.js';
import { CertificatePanel } from './certificate-panel.js';
import { ConcessionPanel, InconclusivePanel } from './concession-panel.js';
import { CreditPanel } from './credit-panel.js';
import { DecisionPanel } from './decision-panel.js';
import { DeliveryPanel } from './delivery-panel.js';
import { FinalSignatures } from './final-signatures.js';
import { RecordsOfKind } from './record-summary.js';
import { WaiverPanel } from './waiver-panel.js';

interface StepWorkProps {
  readonly job: JobSheet;
  readonly step: Step;
  readonly records: readonly RecordView[];
}

/** What is done at one step: its records in short, and the signatures and answers that belong to it. */
export function StepWork({ job, step, records }: StepWorkProps) {
  const mayRecord = useMay('records.write');
  if (step === 'ready' || step === 'released') return <GoingOut job={job} />;
  const reached = hasReached(job.route, job.step, step);
  const kinds = kindsAt(step, job, records);
  const ofKind = (kind: RecordKind) => <RecordsOfKind key={kind} jobId={job.id} kind={kind} records={records} mayRecord={mayRecord} ended={isEnded(job)} reached={reached} />;
  const work = (
    <Panel title={<span id="work">{`${t('work')}: ${stepName(step)}`}</span>}>
      <div className="stack">
        {!reached && <p className="muted">{t('ahead')}</p>}
        {step === 'received' && <p>{t('received')}</p>}
        {step === 'awaiting-approval' && (
          <>
            <p>{t('approvalWords')}</p>
            <Link className="lb-open-work" to="?tab=money">
              {t('toQuote')}
            </Link>
          </>
        )}
        {kinds.filter((kind) => kind !== 'core-repair').map(ofKind)}
        {step === 'core-test-before' && <BeforeSignatures job={job} records={records} />}
        {step === 'core-test-after' && <AfterSignatures job={job} records={records} />}
        {step === 'final-test' && <LastFinalTest job={job} records={records} />}
        {kinds.filter((kind) => kind === 'core-repair').map(ofKind)}
      </div>
    </Panel>
  );
  // what goes back unrepaired never comes to the step where machines are handed over
  return job.state === 'returned-unrepaired' ? (
    <>
      <DeliveryPanel job={job} />
      {work}
    </>
  ) : (
    work
  );
}

/** A core repair before the strip is shown where the test before stands. */
function kindsAt(step: Step, job: JobSheet, records: readonly RecordView[]): readonly RecordKind[] {
  const kinds = STEP_RECORDS[step];
  const repaired = records.some((r) => r.kind === 'core-repair');
  const noAfter = !job.gates.some((g) => g.before === 'rewind');
  return step === 'core-test-before' && (repaired || noAfter) ? [...kinds, 'core-repair'] : kinds;
}

function BeforeSignatures({ job, records }: Omit<StepWorkProps, 'step'>) {
  const test = countingBefore(records);
  const valid = test && test.verdict !== 'not-valid' ? test : undefined;
  return (
    <>
      {job.route !== 'core-test-only' && <WaiverPanel job={job} testMade={valid !== undefined} />}
      {valid?.verdict === 'does-not-conform' && <DecisionPanel job={job} record={valid} about="core-test-before" />}
      {valid?.verdict === 'inconclusive' && <InconclusivePanel job={job} record={valid} />}
    </>
  );
}

function AfterSignatures({ job, records }: Omit<StepWorkProps, 'step'>) {
  const test = countingAfter(records);
  if (test?.verdict === 'inconclusive') return <InconclusivePanel job={job} record={test} />;
  if (test?.verdict !== 'does-not-conform') return null;
  return (
    <>
      <DecisionPanel job={job} record={test} about="core-test-after" />
      <ConcessionPanel job={job} record={test} />
    </>
  );
}

function LastFinalTest({ job, records }: Omit<StepWorkProps, 'step'>) {
  const test = records.filter((r) => r.kind === 'final-test').sort((a, b) => a.ordinal - b.ordinal).at(-1);
  return test ? <FinalSignatures job={job} record={test} /> : null;
}

function GoingOut({ job }: { readonly job: JobSheet }) {
  return (
    <div className="stack" id="work">
      <CertificatePanel job={job} />
      <CreditPanel job={job} />
      <DeliveryPanel job={job} />
    </div>
  );
}
