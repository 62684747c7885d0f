import { createInstrumentSchema, type CreateInstrument, type InstrumentView } from '@shared/instruments';
import type { UnitSystem } from '@libs/quantities';
import { problemsOf } from '../../lib/form-problems.js';
import { FormReader, typedFrom, untyped, type FormProblem, type Typed } from '../../lib/typed.js';

export interface InstrumentValues {
  tag: string;
  kind: CreateInstrument['kind'] | null;
  description: string;
  serial: string;
  percentOfReading: Typed;
  percentOfRange: Typed;
  rangeText: string;
  calibratedOn: string | null;
  dueOn: string | null;
  certificateNumber: string;
}

export const blankInstrument = (system: UnitSystem): InstrumentValues => ({
  tag: '',
  kind: null,
  description: '',
  serial: '',
  percentOfReading: untyped(system),
  percentOfRange: untyped(system),
  rangeText: '',
  calibratedOn: null,
  dueOn: null,
  certificateNumber: '',
});

export const instrumentFrom = ({ tag, kind, description, serial, percentOfReading, percentOfRange, rangeText, calibratedOn, dueOn, certificateNumber }: InstrumentView, system: UnitSystem): InstrumentValues => ({
  tag,
  kind,
  description,
  serial,
  percentOfReading: typedFrom(percentOfReading, 'number', system),
  percentOfRange: typedFrom(percentOfRange, 'number', system),
  rangeText,
  calibratedOn,
  dueOn,
  certificateNumber,
});

/** Percents stand here as the maker's sheet prints them: 0.5 is half a percent. `1 %` is read as well. */
const bare = (typed: Typed): Typed => ({ ...typed, text: typed.text.replace(/\s*%\s*$/, '') });

/** The form held against its contract; a calibration that ends before it began is named here. */
export function readInstrument(values: InstrumentValues): { input: CreateInstrument; problems: FormProblem[] } {
  const reader = new FormReader();
  const input = {
    ...values,
    percentOfReading: reader.need('percentOfReading', bare(values.percentOfReading), 'number', 'As the maker states it; 0 when there is none.'),
    percentOfRange: reader.need('percentOfRange', bare(values.percentOfRange), 'number', 'As the maker states it; 0 when there is none.'),
  } as CreateInstrument;
  const checked = createInstrumentSchema.safeParse(input);
  const { calibratedOn, dueOn } = values;
  if (calibratedOn && dueOn && dueOn <= calibratedOn) reader.note('dueOn', 'It is due after it was calibrated.');
  const seen = new Set<string>();
  const problems = [...reader.problems, ...(checked.success ? [] : problemsOf(checked.error))].filter(({ path }) => !seen.has(path) && seen.add(path));
  return { input: checked.success ? checked.data : input, problems };
}
