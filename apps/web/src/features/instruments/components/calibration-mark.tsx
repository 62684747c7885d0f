import type { InstrumentView } from '@shared/instruments';
import { StateMark, type StateTone } from '../../../components/state-mark.js';
import { t } from '../text.js';

const TONES: Record<InstrumentView['standing'], StateTone> = { 'in-calibration': 'good', 'due-soon': 'waiting', overdue: 'bad' };

/** How an instrument stands on the day: word and shape. */
export const CalibrationMark = ({ standing }: { readonly standing: InstrumentView['standing'] }) => <StateMark tone={TONES[standing]} words={t(standing)} />;
