import type { LoggerRead } from '@libs/logger-files';
import type { FileProblem, LoggerFileView } from '@shared/burnouts';

type Channel = LoggerFileView['channels'][number];
type WithoutMark<T> = T extends unknown ? Omit<T, 'onPart'> : never;
export type KeptChannel = WithoutMark<Channel>;

/** What is kept of a logger's file beside the file itself. */
export interface KeptRead extends Pick<LoggerFileView, 'rows' | 'minutes' | 'startClock' | 'endClock' | 'stepS' | 'separator' | 'decimalMark' | 'problemCount'> {
  readonly channels: readonly KeptChannel[];
  readonly problems: readonly FileProblem[];
}

/** All curves of a load together: enough for a drawing, small enough for one answer. */
const MOST_POINTS = 16_000;
const FEWEST_POINTS = 200;
const tenth = (value: number) => Math.round(value * 10) / 10;

export function keptRead(read: LoggerRead): KeptRead {
  const most = Math.max(FEWEST_POINTS, Math.floor(MOST_POINTS / read.channels.length));
  return {
    rows: read.rows,
    minutes: read.minutes,
    startClock: read.startClock,
    endClock: read.endClock,
    stepS: read.stepS,
    separator: read.separator,
    decimalMark: read.decimalMark,
    channels: read.channels.map((channel): KeptChannel => {
      const { name, unit, samples, emptyCells } = channel;
      const head = { name, unit, samples, emptyCells };
      if (channel.outcome === 'no-readings') return { outcome: 'no-readings', ...head };
      const { peakC, peakAt, minutesAbove, rampKPerH, coolKPerH, gaps, gapCount, gapMinutes, curve } = channel;
      return {
        outcome: 'read',
        ...head,
        peakC,
        peakAt: { ...peakAt },
        minutesAbove: minutesAbove.map((a) => ({ ...a })),
        rampKPerH,
        coolKPerH,
        gaps: gaps?.map((g) => ({ ...g })) ?? null,
        gapCount,
        gapMinutes,
        curve: thinned(curve, most).map(({ minute, celsius }) => [tenth(minute), tenth(celsius)]),
      };
    }),
    problems: read.problems.map((p) => ({ ...p })),
    problemCount: Object.values(read.problemCounts).reduce((sum, n) => sum + n, 0),
  };
}

interface CurvePoint {
  readonly minute: number;
  readonly celsius: number;
}

/** Of each handful of points the coldest and the hottest stay, in their order: no peak is lost. */
export function thinned(curve: readonly CurvePoint[], most: number): readonly CurvePoint[] {
  if (curve.length <= most) return curve;
  const handful = Math.ceil(curve.length / Math.floor(most / 2));
  const kept: CurvePoint[] = [];
  for (let from = 0; from < curve.length; from += handful) {
    const points = curve.slice(from, from + handful);
    const low = points.reduce((a, b) => (b.celsius < a.celsius ? b : a));
    const high = points.reduce((a, b) => (b.celsius > a.celsius ? b : a));
    kept.push(...(low === high ? [low] : low.minute < high.minute ? [low, high] : [high, low]));
  }
  return kept;
}
