import type { LoadView } from '@shared/burnouts';
import { Link } from 'react-router-dom';
import { Facts } from '../../../components/panel.js';
import { Quantity } from '../../../components/quantity.js';
import { useUnits } from '../../../components/units.js';
import { VerdictTag } from '../../../components/verdict-tag.js';
import { celsiusWords, kelvinWords, limitReasonWords, verdictLines } from '../load-words.js';
import { t } from '../text.js';

/** How the load went, in one verdict, its reasons, and what it means for each job. */
export function LoadVerdict({ load }: { readonly load: LoadView }) {
  const system = useUnits();
  const whole = (minutes: number | null) => (minutes === null ? null : Math.round(minutes));
  return (
    <div className="stack">
      {load.verdict ? (
        <>
          <VerdictTag verdict={load.verdict} large />
          {verdictLines(load, system).map((line) => (
            <p key={line}>{line}</p>
          ))}
        </>
      ) : (
        <>
          <p className="lb-load-waits">{t('noFile')}</p>
          <p className="muted">{t('noFileWords')}</p>
        </>
      )}
      {load.offsetK !== 0 && <p>{t('offset', { k: kelvinWords(load.offsetK, system) })}</p>}
      <Facts
        rows={[
          [t('limit'), <Quantity key="limit" si={load.limitC} kind="temperature" />],
          [t('peak'), <Quantity key="peak" si={load.peakC} kind="temperature" />],
          [t('aboveLimit'), <Quantity key="over" si={whole(load.minutesAboveLimit)} kind="duration" />],
          [t('above345', { celsius: celsiusWords(345, system) }), <Quantity key="345" si={whole(load.minutesAbove345C)} kind="duration" />],
        ]}
      />
      <p className="muted lb-load-small">
        {t('limitFrom', { limit: celsiusWords(load.limitC, system), reason: limitReasonWords(load.limitReason), source: load.limitSource, standing: load.limitStanding })}
      </p>
      <h3>{t('jobsTitle')}</h3>
      <ul className="lb-load-joblist">
        {load.jobs.map((job) => {
          const limit = `${celsiusWords(job.limitC, system)}, ${limitReasonWords(job.limitReason)}`;
          return (
            <li key={job.jobId}>
              <Link to={`/jobs/${job.jobId}`}>{job.number}</Link> {job.machine} · {job.customer}
              <div className={load.verdict === 'does-not-conform' ? 'lb-load-marked' : 'muted'}>
                {load.verdict === 'does-not-conform' && `${t('marked')} · `}
                {job.overK === null ? t('ownLimit', { limit }) : job.overK > 0 ? t('ownOver', { over: kelvinWords(job.overK, system), limit }) : t('ownWithin', { limit })}
              </div>
              {job.limitChanged && <div className="lb-load-warn">{t('limitChanged')}</div>}
            </li>
          );
        })}
      </ul>
    </div>
  );
}
