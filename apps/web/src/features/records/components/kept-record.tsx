import { Button } from '@blueprintjs/core';
import type { TestJudgement } from '@libs/machine-tests';
import type { JobSheet } from '@shared/jobs';
import { ONCE_A_JOB, type RecordView } from '@shared/records';
import { Link, useNavigate } from 'react-router-dom';
import { Facts, PageHeader, Panel } from '../../../components/panel.js';
import { useUnits } from '../../../components/units.js';
import { isVerdict, VerdictTag } from '../../../components/verdict-tag.js';
import { calendarDay, momentOf } from '../../../lib/format.js';
import { useMay } from '../../../lib/me.js';
import { recordName } from '../../../lib/record-names.js';
import { saidReadings } from '../reading-words.js';
import { t } from '../text.js';
import '../records.css';

const judgementsIn = (record: RecordView): readonly TestJudgement[] => (Array.isArray(record.result['judgements']) ? (record.result['judgements'] as TestJudgement[]) : []);
export const nameOfInstruments = (record: RecordView) => (id: string) => record.instruments.find((i) => i.id === id)?.tag ?? id;

/** A record as it is kept: what was read, what it came to, by which limits, with which instruments. */
export function KeptRecord({ job, record }: { readonly job: JobSheet; readonly record: RecordView }) {
  const navigate = useNavigate();
  const mayWrite = useMay('records.write');
  const judgements = judgementsIn(record);
  return (
    <div className="stack">
      <PageHeader
        title={`${recordName(record.kind)} · ${job.number}`}
        below={t('kept', { n: record.ordinal, revision: record.revision, by: record.by, when: momentOf(record.at) })}
        actions={
          mayWrite && (
            <>
              <Button className="lb-record-big" text={t('correct')} onClick={() => void navigate(`?amend=${record.id}`)} />
              {!ONCE_A_JOB.includes(record.kind) && <Button className="lb-record-big" text={t('onceMore')} onClick={() => void navigate('?again=1')} />}
            </>
          )
        }
      />
      {isVerdict(record.verdict) && (
        <Panel title={t('judged')}>
          <div className="stack">
            <VerdictTag verdict={record.verdict} large />
            {judgements.map((j) => (
              <p key={j.test} className="lb-judged">
                <VerdictTag verdict={j.verdict} />
                <span>
                  {j.words} <span className="muted">{`${j.source} (${j.standing})`}</span>
                </span>
              </p>
            ))}
            <StripWords record={record} />
            <p className="muted">{t('limitsVersion', { n: record.limitsVersion })}</p>
          </div>
        </Panel>
      )}
      <ReadingsPanel record={record} />
      <div className="row">
        <Link className="lb-record-link" to={`/jobs/${job.id}`}>
          {t('toJob', { number: job.number })}
        </Link>
        <Link to={`/records/${record.id}/revisions`}>{t('revisions', { n: record.revision })}</Link>
      </div>
    </div>
  );
}

/** What was read, in words, and with which instruments. */
export function ReadingsPanel({ record }: { readonly record: RecordView }) {
  const system = useUnits();
  return (
    <>
      <Panel title={t('readings')}>
        <Facts rows={saidReadings(record.readings, system, nameOfInstruments(record)).map((r) => [r.label, r.value] as const)} />
      </Panel>
      {record.instruments.length > 0 && (
        <Panel title={t('instruments')}>
          <ul className="lb-plain">
            {record.instruments.map((i) => (
              <li key={i.id}>
                {t('instrumentLine', { tag: i.tag, description: i.description, serial: i.serial, calibrated: calendarDay(i.calibratedOn), due: calendarDay(i.dueOn) })}
                {i.overdueOnTheDay && <b className="lb-problem"> {t('instrumentOverdue')}</b>}
              </li>
            ))}
          </ul>
        </Panel>
      )}
    </>
  );
}

/** A strip is judged by one figure: its limit, why that, and how far the part went. */
function StripWords({ record }: { readonly record: RecordView }) {
  const { limitC, limitReason, source, standing } = record.result;
  if (record.kind !== 'strip' || typeof limitC !== 'number') return null;
  return (
    <p>
      {t('limit', { limit: `${limitC} °C` })}: {String(limitReason)}. <span className="muted">{`${String(source)} (${String(standing)})`}</span>
    </p>
  );
}
