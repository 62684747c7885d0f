import { addDays } from '../clock/shop-date.js';

/** Past its date an instrument is flagged for thirty days, then what it measures is not valid (shop practice). */
export const GRACE_DAYS = 30;

export type CalibrationStanding = 'in-calibration' | 'due-soon' | 'overdue';

export function calibrationStanding(dueOn: string, today: string): CalibrationStanding {
  if (today > dueOn) return 'overdue';
  return addDays(today, GRACE_DAYS) >= dueOn ? 'due-soon' : 'in-calibration';
}

/** Beyond the grace a measurement made with it does not count. */
export const pastGrace = (dueOn: string, today: string): boolean => addDays(today, -GRACE_DAYS) > dueOn;
