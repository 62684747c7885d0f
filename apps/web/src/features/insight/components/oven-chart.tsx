import { ovenChartDrawing } from '@libs/drawings';
import type { OvenInsight } from '@shared/insight';
import { Drawing } from '../../../components/drawing.js';
import { pointName } from '../oven-sentence.js';
import { t } from '../text.js';

/** More points than this stand too close for a finger; the limits are the same whatever is drawn. */
const MOST_DRAWN = 60;

interface OvenChartProps {
  readonly insight: OvenInsight;
  readonly onPoint?: (position: number) => void;
}

/** Individuals and moving ranges of one oven; a tap on a point finds its line in the table. */
export function OvenChart({ insight, onPoint }: OvenChartProps) {
  const { chart, points, oven } = insight;
  if (chart.outcome !== 'chart') return null;
  const shown = points.slice(-MOST_DRAWN);
  const skipped = points.length - shown.length;
  const percent = (fraction: number) => fraction * 100;
  const drawn = (narrow: boolean) =>
    ovenChartDrawing({
      narrow,
    title: t('chartTitle', { name: oven.name }),
    unit: '%',
    centre: percent(chart.centre),
    lowerLimit: percent(chart.lowerLimit),
    upperLimit: percent(chart.upperLimit),
    meanMovingRange: percent(chart.meanMovingRange),
    movingRangeLimit: percent(chart.movingRangeLimit),
    baseLast: Math.max(0, chart.base.last - skipped),
    points: shown.map((p) => ({ label: pointName(p), value: percent(p.change), movingRange: p.movingRange === null ? null : percent(p.movingRange), hits: p.hits.map((h) => h.words), rangeBeyondLimit: p.rangeBeyondLimit })),
  });
  const marks = onPoint ? { onMark: (mark: string) => onPoint(skipped + Number(mark.replace('job-', ''))) } : {};
  return (
    <>
      <div className="lb-oven-chart">
        <div className="lb-oven-wide">
          <Drawing drawing={drawn(false)} {...marks} />
        </div>
        <div className="lb-oven-narrow">
          <Drawing drawing={drawn(true)} {...marks} />
        </div>
      </div>
      {skipped > 0 && <p className="muted lb-oven-small">{t('lastOf', { shown: shown.length, all: points.length, first: chart.base.first, last: chart.base.last })}</p>}
    </>
  );
}
