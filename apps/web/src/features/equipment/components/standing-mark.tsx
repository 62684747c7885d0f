import type { InstrumentDue } from '@shared/calibrations';
import { StateMark, type StateTone } from '../../../components/state-mark.js';
import { t } from '../instrument-text.js';

const TONES: Record<InstrumentDue['standing'], StateTone> = { 'in-calibration': 'good', 'due-soon': 'waiting', overdue: 'bad' };

/** How an instrument stands on the day: word and shape. */
export const StandingMark = ({ standing }: { readonly standing: InstrumentDue['standing'] }) => <StateMark tone={TONES[standing]} words={t(standing)} />;

export function daysWords(daysLeft: number): string {
  if (daysLeft === 0) return t('dueToday');
  return daysLeft > 0 ? t('dueIn', { days: daysLeft }) : t('overdueBy', { days: -daysLeft });
}
