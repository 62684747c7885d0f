import type { UnitSystem } from '@libs/quantities';
import { addCalibrationSchema, type AddCalibration, type AsFound, type InstrumentDue } from '@shared/calibrations';
import { problemsOf } from '../../lib/form-problems.js';
import { FormReader, typedFrom, type FormProblem, type Typed } from '../../lib/typed.js';
import { t } from './instrument-text.js';

export interface CalibrationForm {
  calibratedOn: string | null;
  dueOn: string | null;
  certificateNumber: string;
  laboratory: string;
  asFound: AsFound | null;
  asFoundWords: string;
  percentOfReading: Typed;
  percentOfRange: Typed;
}

/** Limits of error seldom change, so they begin as they are. */
export const calibrationFormOf = ({ percentOfReading, percentOfRange }: Pick<InstrumentDue, 'percentOfReading' | 'percentOfRange'>, system: UnitSystem): CalibrationForm => ({
  calibratedOn: null,
  dueOn: null,
  certificateNumber: '',
  laboratory: '',
  asFound: null,
  asFoundWords: '',
  percentOfReading: typedFrom(percentOfReading, 'number', system),
  percentOfRange: typedFrom(percentOfRange, 'number', system),
});

/** Percents stand here as certificates print them: 0.5 is half a percent. `1 %` is read as well. */
const bare = (typed: Typed): Typed => ({ ...typed, text: typed.text.replace(/\s*%\s*$/, '') });

export interface ReadCalibration {
  readonly input: AddCalibration | null;
  readonly problems: readonly FormProblem[];
}

/** What will be entered, and what stands in its way, each at its field. */
export function readCalibration(form: CalibrationForm, version: number): ReadCalibration {
  const reader = new FormReader();
  const percentOfReading = reader.need('percentOfReading', bare(form.percentOfReading), 'number', t('needPercent'));
  const percentOfRange = reader.need('percentOfRange', bare(form.percentOfRange), 'number', t('needPercent'));
  for (const day of ['calibratedOn', 'dueOn'] as const) if (!form[day]) reader.note(day, t('needDay'));
  const parsed = addCalibrationSchema.safeParse({ ...form, version, calibratedOn: form.calibratedOn ?? '', dueOn: form.dueOn ?? '', percentOfReading, percentOfRange });
  const seen = new Set<string>();
  const problems = [...reader.problems, ...(parsed.success ? [] : problemsOf(parsed.error))].filter(({ path }) => !seen.has(path) && seen.add(path));
  return { input: problems.length === 0 && parsed.success ? parsed.data : null, problems };
}
