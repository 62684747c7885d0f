import { Button, Callout } from '@blueprintjs/core';
import type { CoreTestResult } from '@libs/core-loss';
import { formatUsual, unitOf } from '@libs/quantities';
import type { JobSheet } from '@shared/jobs';
import type { LimitsSet } from '@shared/limits';
import type { RecordView } from '@shared/records';
import { Link, useNavigate } from 'react-router-dom';
import { BeforeAfterStrip } from '../../../components/before-after-strip.js';
import { Ring } from '../../../components/ring.js';
import { PageHeader, Panel } from '../../../components/panel.js';
import { useUnits } from '../../../components/units.js';
import { momentOf } from '../../../lib/format.js';
import { readingsOf, recordsOfKind } from '../../../lib/job-records.js';
import { useMay } from '../../../lib/me.js';
import { beforeRecord } from '../before-test.js';
import type { Phase } from '../bench-form.js';
import { stripOf } from '../strip-of.js';
import { t } from '../text.js';
import { ResultPanel } from './result-panel.js';
import { SpineRail } from './spine-rail.js';
import '../bench.css';

const resultOf = (record: RecordView) => record.result as unknown as CoreTestResult;

/** A test as it is kept, with the server's own verdict, every test after on one strip, and what can be done next. */
export function KeptTest({ job, phase, record, records, limits, differs }: { readonly job: JobSheet; readonly phase: Phase; readonly record: RecordView; readonly records: readonly RecordView[]; readonly limits: LimitsSet; readonly differs: boolean }) {
  const system = useUnits();
  const navigate = useNavigate();
  const mayWrite = useMay('records.write');
  const result = resultOf(record);
  const { geometry, reading, temperatures } = readingsOf(record, 'core-test-before');
  const before = phase === 'before' ? record : beforeRecord(records);
  const tests = phase === 'after' ? recordsOfKind(records, 'core-test-after') : [];
  const { hottestSlot, meanC, hottestC } = temperatures;
  const strip = stripOf({
    before: before ? resultOf(before) : null,
    after: tests.map((r) => ({ label: r.verdict === 'not-valid' ? t('notValidNo', { n: r.ordinal }) : tests.length > 1 ? t('afterNo', { n: r.ordinal }) : t('after'), result: resultOf(r) })),
    increaseLimit: limits.core.increaseLimit,
    system,
  });
  return (
    <div className="stack">
      <PageHeader
        title={`${t(phase === 'before' ? 'titleBefore' : 'titleAfter')} · ${job.number}`}
        below={t('kept', { n: record.ordinal, revision: record.revision, by: record.by, when: momentOf(record.at) })}
        actions={
          mayWrite && (
            <>
              <Button className="lb-bench-big" text={t('correct')} onClick={() => void navigate(`?amend=${record.id}`)} />
              <Button className="lb-bench-big" text={t('repeat')} onClick={() => void navigate('?again=1')} />
            </>
          )
        }
      />
      {differs && <Callout intent="warning">{t('screenDiffers')}</Callout>}
      <div className="lb-kept">
        <SpineRail job={job} />
        <Panel>
          <Ring
            interactive
            geometry={geometry}
            turns={reading.excitingTurns}
            reading={{
              figure: formatUsual(result.wattsPerKgReferred, 'specific-loss', system, { unit: false }),
              unit: unitOf('specific-loss', system),
              below: t('share', { flux: formatUsual(result.fluxDensityT, 'flux-density', system), share: formatUsual(result.fluxShareOfTarget, 'percent', system) }),
            }}
            {...(hottestSlot === undefined ? {} : { hottestSlot })}
            {...(hottestSlot !== undefined && meanC !== undefined && hottestC !== undefined ? { heat: new Map([[hottestSlot, hottestC - meanC]]), heatFullK: result.hotSpotLimitK ?? 10 } : {})}
          />
        </Panel>
        <Panel>
          <ResultPanel result={result} />
        </Panel>
      </div>
      <Panel>
        <BeforeAfterStrip {...strip} />
      </Panel>
      <div className="row">
        <Link className="lb-bench-big lb-bench-link" to={`/jobs/${job.id}`}>
          {t('toJob', { number: job.number })}
        </Link>
        {record.revision > 1 && <Link to={`/records/${record.id}/revisions`}>{t('revisions')}</Link>}
      </div>
    </div>
  );
}
