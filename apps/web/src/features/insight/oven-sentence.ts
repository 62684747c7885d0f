import type { OvenInsight, OvenPoint } from '@shared/insight';
import { calendarDay, daysBetween } from '../../lib/format.js';
import { limitWords, percentWords } from './percent.js';
import { t } from './text.js';

export const pointName = (point: OvenPoint): string => point.job?.number ?? `${t('no')} ${point.position}`;

/** Everything a point says, in words; empty where it says nothing. */
export const saidBy = (point: OvenPoint): string[] => [...point.hits.map((h) => h.words), ...(point.rangeBeyondLimit ? [t('wider')] : [])];

const span = (from: string, to: string): string => {
  const days = daysBetween(from, to);
  return days === 0 ? t('sameDay') : days === 1 ? t('oneDay') : t('days', { n: days });
};

/** What the chart of one oven says, in one sentence: did it speak, and was that before a core was lost? */
export function ovenSentence(insight: OvenInsight): string {
  const { chart, points, spokeAt, failedAt, increaseLimit } = insight;
  if (chart.outcome !== 'chart') return chart.message;
  const oven = insight.oven.name;
  const limit = limitWords(increaseLimit);
  const at = (position: number | null) => points.find((p) => p.position === position);
  const [spoke, failed] = [at(spokeAt), at(failedAt)];
  const lost = failed && { limit, failed: pointName(failed), change: percentWords(failed.change), failedDay: calendarDay(failed.day) };
  if (!spoke) {
    if (lost) return t('failedSilent', { oven, ...lost });
    const since = points.filter((p) => p.position > chart.base.last).length;
    return since === 0 ? t('steadyBase', { oven, n: points.length }) : t('steady', { oven, n: since });
  }
  const said = { oven, day: calendarDay(spoke.day), what: `${pointName(spoke)} (${percentWords(spoke.change)})`, words: saidBy(spoke).join('; ') };
  if (!lost) return t('spokeNoFail', { ...said, limit });
  if (failed.position === spoke.position) return t('spokeWith', { oven, day: said.day, limit, failed: lost.failed, change: lost.change });
  return failed.position > spoke.position ? t('spokeBefore', { ...said, ...lost, days: span(spoke.day, failed.day) }) : t('spokeAfter', { ...said, ...lost });
}
