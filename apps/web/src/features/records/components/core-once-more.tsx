import type { CoreTestResult } from '@libs/core-loss';
import { formatUsual } from '@libs/quantities';
import type { JobSheet } from '@shared/jobs';
import type { RecordView } from '@shared/records';
import { Panel } from '../../../components/panel.js';
import { Quantity } from '../../../components/quantity.js';
import { useUnits } from '../../../components/units.js';
import { isVerdict, VerdictTag } from '../../../components/verdict-tag.js';
import { coreResultOf, countingAfter, countingBefore } from '../../../lib/core-figures.js';
import { signedPercent } from '../../../lib/core-strip.js';
import { momentOf } from '../../../lib/format.js';
import { coreStanding } from '../core-standing.js';
import { t } from '../text.js';

/** The core as its last test found it: shown beside the final test, judged at its own gate. */
export function CoreOnceMore({ job, records }: { readonly job: JobSheet; readonly records: readonly RecordView[] }) {
  const record = countingAfter(records) ?? countingBefore(records);
  const result = record && coreResultOf(record);
  const standing = record && coreStanding(job, record);
  return (
    <Panel title={t('core')}>
      {record && result ? (
        <>
          <div className="row">
            <span className="lb-core-figure measured">
              <Quantity si={result.wattsPerKgReferred} kind="specific-loss" />
            </span>
            {isVerdict(record.verdict) && <VerdictTag verdict={record.verdict} />}
            <span className="muted">{t('coreLine', { when: momentOf(record.at) })}</span>
          </div>
          <CoreJudgements result={result} />
          {standing && <p className={standing.settled ? '' : 'lb-problem'}>{standing.words}</p>}
        </>
      ) : (
        <p className="muted">{t('coreNone')}</p>
      )}
    </Panel>
  );
}

/** What the core was held to: only what was judged against a limit; a fall is a question, and asked at the core test. */
function CoreJudgements({ result }: { readonly result: CoreTestResult }) {
  const system = useUnits();
  const figure = (si: number, unit: '1' | 'K' | 'W/kg') => (unit === '1' ? signedPercent(si) : formatUsual(si, unit === 'K' ? 'temperature-difference' : 'specific-loss', system));
  return (
    <>
      {result.judgements.map(({ test, verdict, measured, limit, unit, source, standing }) =>
        test !== 'fall' && isVerdict(verdict) && verdict !== 'shown-not-judged' && limit !== undefined ? (
          <p key={test} className="lb-judged">
            <VerdictTag verdict={verdict} />
            <span>
              {t(`core-${test}`)} {measured !== undefined && <b className="measured num">{figure(measured, unit)}</b>} <span className="num">{t('limitAtMost', { limit: figure(limit, unit) })}</span>{' '}
              <span className="muted">{t('sourceOf', { source, standing })}</span>
            </span>
          </p>
        ) : null,
      )}
    </>
  );
}
