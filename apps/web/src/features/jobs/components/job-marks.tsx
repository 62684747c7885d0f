import { calendarDay } from '../../../lib/format.js';
import { t, waitingWords } from '../floor-text.js';
import { promiseStanding } from '../promise.js';
import './job-marks.css';

/** The promise, and by word and shape how it stands. */
export function PromiseMark({ promisedOn, today, ended = false }: { readonly promisedOn: string | null; readonly today: string; readonly ended?: boolean }) {
  const standing = promiseStanding(promisedOn, today, ended);
  if (promisedOn === null) return <span className="muted">{t('noPromise')}</span>;
  return (
    <span className="lb-promise">
      <span className="num">{calendarDay(promisedOn)}</span>
      {standing.kind === 'late' && (
        <span className="lb-mark lb-mark-late">
          <Flag />
          <span>{standing.days === 1 ? t('lateByOne') : t('lateBy', { days: standing.days })}</span>
        </span>
      )}
      {standing.kind === 'today' && (
        <span className="lb-mark lb-mark-today">
          <Dot />
          <span>{t('dueToday')}</span>
        </span>
      )}
    </span>
  );
}

interface WaitingProps {
  readonly state: string;
  readonly step: string;
  readonly holdReason: string | null;
  readonly waitingFor: string | null;
}

/** Held, or waiting for the customer's answer: by word and shape. */
export function WaitingMark({ state, step, holdReason, waitingFor }: WaitingProps) {
  if (state === 'on-hold') {
    return (
      <>
        <span className="lb-mark lb-mark-held">
          <Bars />
          <span>{waitingFor ? `${t('onHold')}, ${t('waitsFor', { who: waitingWords(waitingFor) })}` : t('onHold')}</span>
        </span>
        {holdReason && <span className="lb-mark-why">{holdReason}</span>}
      </>
    );
  }
  if (state === 'open' && step === 'awaiting-approval') {
    return (
      <span className="lb-mark lb-mark-waiting">
        <Hourglass />
        <span>{t('waitsForCustomer')}</span>
      </span>
    );
  }
  return null;
}

const Shape = ({ d, fill = true }: { readonly d: string; readonly fill?: boolean }) => (
  <svg viewBox="0 0 16 16" width="14" height="14" aria-hidden="true">
    <path d={d} fill={fill ? 'currentColor' : 'none'} stroke="currentColor" strokeWidth={fill ? 0 : 2} />
  </svg>
);
export const Flag = () => <Shape d="M3 1H5V3L14 5.5 5 8.5V15H3Z" />;
const Dot = () => <Shape d="M8 3a5 5 0 1 1 0 10A5 5 0 1 1 8 3Z" fill={false} />;
export const Bars = () => <Shape d="M3 2H6.5V14H3ZM9.5 2H13V14H9.5Z" />;
const Hourglass = () => <Shape d="M3 1H13V3L9 8 13 13V15H3V13L7 8 3 3Z" />;
