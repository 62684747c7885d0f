import type { NoLayoutCode } from './layout.js';
import type { DecimalMark } from './number-cell.js';
import type { Problem, ProblemCode } from './problem-list.js';
import type { Separator } from './row-cells.js';
import type { TemperatureUnit } from './temperature-unit.js';

/** Minutes count from the earliest row of the file. */
export interface LoggerGap {
  readonly fromMinute: number;
  readonly toMinute: number;
}
export interface TimeAbove {
  readonly limitC: number;
  readonly minutes: number;
  /** minutes of gaps that begin or end above the limit: what the core did there is not known */
  readonly unknownMinutes: number;
}
export interface LoggerPeak {
  readonly minute: number;
  /** the time as the file writes it */
  readonly clock: string;
  readonly line: number;
}

interface ChannelHead {
  readonly name: string;
  /** as the file states it, or as it was assumed */
  readonly unit: TemperatureUnit;
  readonly samples: number;
  readonly emptyCells: number;
}
export interface ChannelRead extends ChannelHead {
  readonly outcome: 'read';
  readonly peakC: number;
  readonly peakAt: LoggerPeak;
  readonly minutesAbove: readonly TimeAbove[];
  /** fastest heating, K/h; null where the readings end too soon to tell */
  readonly rampKPerH: number | null;
  /** fastest cooling, K/h, as a positive figure; null as `rampKPerH` */
  readonly coolKPerH: number | null;
  /** the first hundred; null where the pace of the logger is not known, so that gaps cannot be told */
  readonly gaps: readonly LoggerGap[] | null;
  readonly gapCount: number;
  readonly gapMinutes: number;
  /** 2000 points at most, with every peak in it */
  readonly curve: readonly { readonly minute: number; readonly celsius: number }[];
}
export interface ChannelWithoutReadings extends ChannelHead {
  readonly outcome: 'no-readings';
  readonly message: string;
}
export type ChannelSummary = ChannelRead | ChannelWithoutReadings;

interface WithProblems {
  /** the first twenty of each kind */
  readonly problems: readonly Problem[];
  readonly problemCounts: Partial<Record<ProblemCode, number>>;
}
export interface LoggerRead extends WithProblems {
  readonly outcome: 'read';
  readonly channels: readonly ChannelSummary[];
  readonly rows: number;
  readonly startClock: string;
  readonly endClock: string;
  readonly minutes: number;
  /** usual seconds between rows; null where the file does not show them */
  readonly stepS: number | null;
  readonly separator: Separator;
  /** null where every figure is whole */
  readonly decimalMark: DecimalMark | null;
  readonly newestFirst: boolean;
}
export type UnreadableCode = NoLayoutCode | 'date-order-contradicted' | 'too-many-channels';
export interface LoggerUnreadable extends WithProblems {
  readonly outcome: 'unreadable';
  readonly code: UnreadableCode;
  readonly message: string;
}
export type LoggerSummary = LoggerRead | LoggerUnreadable;
