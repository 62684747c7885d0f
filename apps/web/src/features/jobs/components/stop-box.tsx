import type { JobSheet } from '@shared/jobs';
import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { stateName, stepName } from '../../../lib/step-names.js';
import { waitingWords } from '../floor-text.js';
import { t } from '../text.js';
import { JobActions } from './job-actions.js';
import { Bars } from './job-marks.js';
import { NextStep } from './next-step.js';
import './stop-box.css';

interface StopBoxProps {
  readonly job: JobSheet;
  readonly hrefOf: (place: string) => string;
}

/** The first thing on the sheet: what stops this job, and what to do about it. */
export function StopBox({ job, hrefOf }: StopBoxProps) {
  const linkOf = (place: string, words: string): ReactNode => <Link to={hrefOf(place)}>{words}</Link>;
  const { title, kind } = headOf(job);
  return (
    <section className={`lb-stop lb-stop-${kind}`} aria-labelledby="lb-stop-title">
      <h2 id="lb-stop-title">
        {kind === 'held' && <Bars />}
        {kind === 'shut' && <Notch open={false} />}
        {kind === 'open' && <Notch open />}
        {title}
      </h2>
      {kind === 'held' && (
        <div>
          <p className="lb-stop-why">{job.holdReason}</p>
          <p className="muted">{t('heldHelp', { step: stepName(job.step) })}</p>
        </div>
      )}
      {kind === 'ended' && <p>{t('endedHelp')}</p>}
      {(kind === 'open' || kind === 'shut') && <NextStep job={job} linkOf={linkOf} />}
      {kind !== 'ended' && <JobActions job={job} />}
    </section>
  );
}

/** What the box says in one line. */
export function headOf({ state, waitingFor, next }: Pick<JobSheet, 'state' | 'waitingFor' | 'next'>): { readonly kind: 'held' | 'ended' | 'open' | 'shut'; readonly title: string } {
  if (state === 'on-hold') return { kind: 'held', title: t('held', { who: waitingWords(waitingFor) }) };
  if (state !== 'open' || !next) return { kind: 'ended', title: t('ended', { state: stateName(state) }) };
  if (next.open) return { kind: 'open', title: t('nothingStops') };
  const missing = next.conditions.filter((c) => !c.met).length;
  const step = stepName(next.step);
  return { kind: 'shut', title: missing === 1 ? t('stopCountOne', { step }) : t('stopCount', { missing, all: next.conditions.length, step }) };
}

/** A gate as the spine draws it: the gap between two sheets, open or bolted. */
const Notch = ({ open }: { readonly open: boolean }) => (
  <svg viewBox="0 0 20 20" width="20" height="20" aria-hidden="true">
    <path d="M1 3H19M1 17H19" stroke="currentColor" strokeWidth="3" />
    <path d={open ? 'M6 10H14M11 7L14 10 11 13' : 'M5 6V14M15 6V14M5 10H15'} stroke="currentColor" strokeWidth="2" fill="none" />
  </svg>
);
