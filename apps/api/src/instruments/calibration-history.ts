import type { CalibrationView } from '@shared/calibrations';

interface Entry {
  readonly id: string;
  readonly calibratedOn: string;
  readonly at: string;
}

/** Entries of one instrument, the newest calibration first, and of one day the newest entry first. */
export const inOrder = <E extends Entry>(entries: readonly E[]): E[] =>
  [...entries].sort((a, b) => (a.calibratedOn === b.calibratedOn ? compare(b.at, a.at) || compare(b.id, a.id) : compare(b.calibratedOn, a.calibratedOn)));
const compare = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);

/** A later entry of the same day counts instead. */
export const isSuperseded = (entry: Entry, ordered: readonly Entry[]): boolean => ordered.find((other) => other.calibratedOn === entry.calibratedOn)?.id !== entry.id;

/** The calibration before it: what was measured since then is in doubt when this one found the instrument outside. */
export const doubtFrom = (entry: Entry, ordered: readonly Entry[]): CalibrationView['doubtFrom'] => ordered.find((other) => other.calibratedOn < entry.calibratedOn)?.calibratedOn ?? null;
