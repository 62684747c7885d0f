import type { RecordKind, RecordView } from '@shared/records';
import { ONCE_A_JOB } from '@shared/records';
import { Link } from 'react-router-dom';
import { isVerdict, VerdictTag } from '../../../components/verdict-tag.js';
import { momentOf } from '../../../lib/format.js';
import { recordName } from '../../../lib/record-names.js';
import { t, testName } from '../work-text.js';
import { judgementsOf, keyFigures, missingPartsOf } from './key-figures.js';
import './record-summary.css';

/** One record in a few lines: verdict, the figures that matter, who and when. */
export function RecordSummary({ record, numbered }: { readonly record: RecordView; readonly numbered: boolean }) {
  const figures = keyFigures(record);
  const judgements = judgementsOf(record);
  const missing = missingPartsOf(record);
  return (
    <article className="lb-record">
      <header>
        <h3>{numbered ? t('ordinal', { name: recordName(record.kind), n: record.ordinal }) : recordName(record.kind)}</h3>
        {isVerdict(record.verdict) && <VerdictTag verdict={record.verdict} />}
      </header>
      {figures.length > 0 && (
        <dl>
          {figures.map(([name, value]) => (
            <div key={name}>
              <dt>{name}</dt>
              <dd>{value}</dd>
            </div>
          ))}
        </dl>
      )}
      {judgements.length > 0 && (
        <ul className="lb-judgements">
          {judgements.map((j, i) => (
            <li key={`${j.test}${i}`}>
              <span>
                {testName(j.test)}
                {j.verdict !== 'conforms' && <small>{j.words}</small>}
              </span>
              {isVerdict(j.verdict) && <VerdictTag verdict={j.verdict} />}
            </li>
          ))}
        </ul>
      )}
      {missing.length > 0 && (
        <p>
          <b>{t('missing')}:</b> {missing.map(testName).join(', ')}
        </p>
      )}
      <footer className="muted">
        {t('byAt', { who: record.by, when: momentOf(record.at) })}
        {record.revision > 1 && `, ${t('revision', { n: record.revision })}`}
      </footer>
    </article>
  );
}

interface KindPanelProps {
  readonly jobId: string;
  readonly kind: RecordKind;
  readonly records: readonly RecordView[];
  readonly mayRecord: boolean;
  readonly reached: boolean;
  /** on a job that has ended a record is corrected, and none is made */
  readonly ended: boolean;
}

/** All records of one kind, and the way to the place where they are made. */
export function RecordsOfKind({ jobId, kind, records, mayRecord, reached, ended }: KindPanelProps) {
  const made = records.filter((r) => r.kind === kind).sort((a, b) => a.ordinal - b.ordinal);
  const isCoreTest = kind === 'core-test-before' || kind === 'core-test-after';
  const once = ONCE_A_JOB.includes(kind);
  const words = isCoreTest && !ended ? t('bench') : made.length === 0 ? t('record', { name: recordName(kind) }) : once || ended ? t('correct') : t('again', { name: recordName(kind) });
  return (
    <section className="lb-records">
      {made.map((record) => (
        <RecordSummary key={record.id} record={record} numbered={made.length > 1} />
      ))}
      {made.length === 0 && (!mayRecord || ended) && kind !== 'core-repair' && (
        <p className="muted">
          {recordName(kind)}: {t('noOne')}
        </p>
      )}
      {mayRecord && reached && (made.length > 0 || !ended) && (
        <Link className={`lb-open-work${made.length === 0 && kind !== 'core-repair' ? ' lb-open-work-first' : ''}`} to={`/jobs/${jobId}/work/${kind}`}>
          {words}
        </Link>
      )}
    </section>
  );
}
