import { Button } from '@blueprintjs/core';
import type { OvenInsight, OvenPoint } from '@shared/insight';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import '../../../components/data-table.css';
import { StateMark } from '../../../components/state-mark.js';
import { calendarDay } from '../../../lib/format.js';
import { useMay } from '../../../lib/me.js';
import { saidBy } from '../oven-sentence.js';
import { limitWords, percentWords } from '../percent.js';
import { t } from '../text.js';
import { TakeBack } from './take-back.js';

interface OvenTableProps {
  readonly insight: OvenInsight;
  /** the point that was asked for in the chart */
  readonly shown: number | null;
}
/** The figures behind the chart, the newest first, each with what the chart says of it. */
export function OvenTable({ insight, shown }: OvenTableProps) {
  const mayWrite = useMay('insight.write');
  const [taking, setTaking] = useState<OvenPoint | null>(null);
  return (
    <div className="lb-table-wrap lb-oven-scroll" role="region" aria-label={t('tableCaption', { name: insight.oven.name })} tabIndex={0}>
      <table className="lb-table lb-oven-table" role="table">
        <caption className="visually-hidden">{t('tableCaption', { name: insight.oven.name })}</caption>
        <thead role="rowgroup">
          <tr role="row">
            <th scope="col" role="columnheader">{t('no')}</th>
            <th scope="col" role="columnheader">{t('day')}</th>
            <th scope="col" role="columnheader">{t('job')}</th>
            <th scope="col" role="columnheader" className="number">{t('change')}</th>
            <th scope="col" role="columnheader" className="number">{t('step')}</th>
            <th scope="col" role="columnheader">{t('pattern')}</th>
          </tr>
        </thead>
        <tbody role="rowgroup">
          {[...insight.points].reverse().map((point) => (
            <tr key={point.position} role="row" id={`${insight.oven.id}-${point.position}`} className={point.position === shown ? 'lb-oven-shown' : ''}>
              <td role="cell" data-title={t('no')} className="num">{point.position}</td>
              <td role="cell" data-title={t('day')} className="num">{calendarDay(point.day)}</td>
              <td role="cell" data-title={t('job')}>
                <Source point={point} onTakeBack={mayWrite ? () => setTaking(point) : null} />
              </td>
              <td role="cell" data-title={t('change')} className="number num">{percentWords(point.change)}</td>
              <td role="cell" data-title={t('step')} className="number num">{point.movingRange === null ? '–' : limitWords(point.movingRange)}</td>
              <td role="cell" data-title={t('pattern')}>
                <Said point={point} limit={limitWords(insight.increaseLimit)} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      {taking?.entry && <TakeBack key={taking.entry.id} point={taking} onClose={() => setTaking(null)} />}
    </div>
  );
}

function Source({ point, onTakeBack }: { readonly point: OvenPoint; readonly onTakeBack: (() => void) | null }) {
  if (point.job) {
    return (
      <>
        <Link className="lb-oven-job" to={`/jobs/${point.job.id}`}>
          {point.job.number}
        </Link>{' '}
        <span className="muted">{point.job.machine}</span>
      </>
    );
  }
  return (
    <span className="row lb-oven-book">
      <span className="muted" title={point.entry ? t('bookBy', { by: point.entry.by }) : undefined}>
        {point.entry?.remark || t('book')}
      </span>
      {onTakeBack && <Button variant="minimal" text={t('takeBack')} onClick={onTakeBack} />}
    </span>
  );
}

function Said({ point, limit }: { readonly point: OvenPoint; readonly limit: string }) {
  const words = saidBy(point);
  if (words.length === 0 && !point.overLimit) return <span className="muted">{point.inBase ? t('base') : '–'}</span>;
  return (
    <span className="lb-oven-said">
      {words.length > 0 && <StateMark tone="waiting" words={words.join('; ')} />}
      {point.overLimit && <StateMark tone="bad" words={t('over', { limit })} />}
    </span>
  );
}
