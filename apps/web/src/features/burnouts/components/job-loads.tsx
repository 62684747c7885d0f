import type { JobLoad } from '@shared/burnouts';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { Panel } from '../../../components/panel.js';
import { StateMark } from '../../../components/state-mark.js';
import { useUnits } from '../../../components/units.js';
import { VerdictTag } from '../../../components/verdict-tag.js';
import { jobLoadsQuery } from '../../../lib/burnout-queries.js';
import { calendarDay } from '../../../lib/format.js';
import { celsiusWords, kelvinWords, limitReasonWords, verdictLines } from '../load-words.js';
import { t } from '../text.js';
import '../burnouts.css';

/** The loads a job stood in, on its sheet; silent where there is none. */
export function JobLoads({ jobId }: { readonly jobId: string }) {
  const loads = useQuery(jobLoadsQuery(jobId));
  if (!loads.data || loads.data.length === 0) return null;
  return (
    <Panel title={t('jobPanel')}>
      <ul className="lb-load-joblist">
        {loads.data.map((load) => (
          <li key={load.id}>
            <OneLoad load={load} />
          </li>
        ))}
      </ul>
    </Panel>
  );
}

function OneLoad({ load }: { readonly load: JobLoad }) {
  const system = useUnits();
  const { own } = load;
  const limit = `${celsiusWords(own.limitC, system)}, ${limitReasonWords(own.limitReason)}`;
  const others = load.others === 0 ? t('jobAlone') : load.others === 1 ? t('jobOther') : t('jobOthers', { n: load.others });
  return (
    <>
      <div className="row spread">
        <span>
          <Link className="lb-load-sheet-link" to={`/bay/burnouts/${load.id}`}>
            {t('loadTitle', { number: load.number, oven: load.ovenName })}
          </Link>{' '}
          <span className="muted">
            {calendarDay(load.day)}, {others}
          </span>
        </span>
        {load.verdict ? <VerdictTag verdict={load.verdict} /> : <StateMark tone="waiting" words={t('fileMissing')} />}
      </div>
      {verdictLines(load, system).map((line) => (
        <div key={line}>{line}</div>
      ))}
      <div className="muted">{own.overK === null ? t('ownLimit', { limit }) : own.overK > 0 ? t('ownOver', { over: kelvinWords(own.overK, system), limit }) : t('ownWithin', { limit })}</div>
    </>
  );
}
