import { Button } from '@blueprintjs/core';
import type { LeftOutReason, OvenInsight } from '@shared/insight';
import { useState } from 'react';
import { Link } from 'react-router-dom';
import { Panel } from '../../../components/panel.js';
import { StateMark } from '../../../components/state-mark.js';
import { calendarDay } from '../../../lib/format.js';
import { useMay } from '../../../lib/me.js';
import { ovenSentence } from '../oven-sentence.js';
import { limitWords } from '../percent.js';
import { t } from '../text.js';
import { AddHistory } from './add-history.js';
import { OvenChart } from './oven-chart.js';
import { OvenTable } from './oven-table.js';
import '../insight.css';

const REASONS: Record<LeftOutReason, string> = {
  'not-tested-yet': t('reason_not_tested'),
  'not-valid': t('reason_not_valid'),
  'increase-not-established': t('reason_no_before'),
  'repaired-first': t('reason_repaired'),
};

/** One oven: what its chart says, the chart, and its figures. */
export function OvenPanel({ insight }: { readonly insight: OvenInsight }) {
  const mayWrite = useMay('insight.write');
  const [shown, setShown] = useState<number | null>(null);
  const [open, setOpen] = useState(false);
  const [adding, setAdding] = useState(false);
  const { oven, chart, points, leftOut } = insight;
  const tone = chart.outcome !== 'chart' ? 'quiet' : insight.spokeAt === null && insight.failedAt === null ? 'good' : 'bad';
  const onPoint = (position: number) => {
    setShown(position);
    setOpen(true);
    // after the table is there
    setTimeout(() => document.getElementById(`${oven.id}-${position}`)?.scrollIntoView({ block: 'center' }), 0);
  };
  return (
    <Panel title={t('chartTitle', { name: oven.name })} actions={mayWrite && <Button text={t('addHistory')} onClick={() => setAdding(true)} />}>
      <div className="stack">
        {oven.remark !== '' && <p className="muted">{oven.remark}</p>}
        <p className="lb-oven-sentence">
          <StateMark tone={tone} words={ovenSentence(insight)} />
        </p>
        {chart.outcome === 'chart' && chart.provisional && <p className="muted">{t('provisional', { n: chart.base.last - chart.base.first + 1 })}</p>}
        <OvenChart insight={insight} onPoint={onPoint} />
        {leftOut.length > 0 && (
          <div>
            <h3>{t('leftOut')}</h3>
            <ul className="lb-oven-left">
              {leftOut.map((row) => (
                <li key={`${row.job.id}-${row.day}`}>
                  <Link to={`/jobs/${row.job.id}`}>{row.job.number}</Link> {row.job.machine}, {calendarDay(row.day)}: {REASONS[row.reason]}
                </li>
              ))}
            </ul>
          </div>
        )}
        {points.length > 0 && (
          <details className="lb-oven-more" open={open} onToggle={(e) => setOpen(e.currentTarget.open)}>
            <summary>
              {t('table')} ({points.length === 1 ? t('oneJob') : t('jobs', { n: points.length })})
            </summary>
            <OvenTable insight={insight} shown={shown} />
          </details>
        )}
        <details className="lb-oven-more">
          <summary>{t('rules')}</summary>
          <div className="stack lb-oven-small">
            <p>{t('meaning')}</p>
            <p>{t('limitLine', { limit: limitWords(insight.increaseLimit) })}</p>
            <ul>
              {insight.rules.map((rule) => (
                <li key={rule.rule}>{t('ruleLine', { words: rule.words, source: rule.source, standing: rule.standing })}</li>
              ))}
            </ul>
          </div>
        </details>
      </div>
      {adding && <AddHistory oven={oven} onClose={() => setAdding(false)} />}
    </Panel>
  );
}
