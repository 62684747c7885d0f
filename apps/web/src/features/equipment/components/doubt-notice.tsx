import type { CalibrationView } from '@shared/calibrations';
import { Link, useSearchParams } from 'react-router-dom';
import { Notice } from '../../../components/notice.js';
import { calendarDay } from '../../../lib/format.js';
import { t } from '../instrument-text.js';

/** The period whose records are in doubt since a calibration found the instrument outside. */
export const doubtPeriod = ({ doubtFrom, calibratedOn }: CalibrationView): string => new URLSearchParams({ ...(doubtFrom ? { from: doubtFrom } : {}), to: calibratedOn }).toString();

/** An instrument that was found outside: which records to look at, and what to do with them. */
export function DoubtNotice({ calibrations }: { readonly calibrations: readonly CalibrationView[] }) {
  const [params] = useSearchParams();
  const found = calibrations.filter((c) => c.asFound === 'outside' && !c.superseded);
  return found.map((c) => {
    const period = doubtPeriod(c);
    const shown = new URLSearchParams([...params].filter(([key]) => key === 'from' || key === 'to')).toString() === period;
    return (
      <Notice key={c.id} intent="warning" title={t('doubtTitle', { day: calendarDay(c.calibratedOn) })}>
        <div className="stack">
          <p>{c.doubtFrom ? t('doubtFrom', { from: calendarDay(c.doubtFrom), to: calendarDay(c.calibratedOn), words: c.asFoundWords }) : t('doubtAlways', { to: calendarDay(c.calibratedOn), words: c.asFoundWords })}</p>
          <p>{t('doubtDo')}</p>
          {shown ? <p className="muted">{t('doubtShown')}</p> : <Link to={`?${period}`}>{t('doubtShow')}</Link>}
        </div>
      </Notice>
    );
  });
}
