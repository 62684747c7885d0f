import type { UnitSystem } from '@libs/quantities';
import type { JobLoad } from '@shared/burnouts';
import type { Entered } from '@shared/fields';
import type { BayView } from '@shared/instruments';
import type { JobSheet } from '@shared/jobs';
import type { LimitsSet } from '@shared/limits';
import { recordInputSchema, type ReadingsOf, type RecordKind, type RecordView } from '@shared/records';
import { problemsOf } from '../../lib/form-problems.js';
import type { FormProblem } from '../../lib/typed.js';

/** Every kind but the two core tests, which have the bench. */
export type FormKind = Exclude<RecordKind, 'core-test-before' | 'core-test-after'>;

/** What a form is filled in beside. */
export interface RecordContext {
  readonly job: JobSheet;
  readonly records: readonly RecordView[];
  readonly limits: LimitsSet;
  readonly bay: BayView;
  readonly system: UnitSystem;
  /** burnout loads the job stood in, where the strip is recorded */
  readonly loads?: readonly JobLoad[];
}

/** A form read: NaN stands where a figure is missing or cannot be read. */
export interface FilledForm<Readings> {
  readonly readings: Readings;
  readonly entered: Entered;
  readonly problems: readonly FormProblem[];
}

/** How one kind of record is filled in, brought back and read. */
export interface RecordDefinition<K extends FormKind, Values> {
  readonly kind: K;
  start(context: RecordContext): Values;
  from(readings: ReadingsOf<K>, system: UnitSystem): Values;
  read(values: Values): FilledForm<ReadingsOf<K>>;
  /** what the libraries find wrong with readings that are there */
  check?(readings: ReadingsOf<K>, context: RecordContext): readonly FormProblem[];
}

/** Everything in the way of saving: what cannot be read, what the contract asks for, what the libraries name. First words count. */
export function problemsIn<K extends FormKind, V>(definition: RecordDefinition<K, V>, filled: FilledForm<ReadingsOf<K>>, context: RecordContext): FormProblem[] {
  const contract = recordInputSchema.safeParse({ kind: definition.kind, readings: filled.readings, entered: filled.entered });
  const asked = contract.success ? [] : problemsOf(contract.error).map(({ path, message }) => ({ path: path.replace(/^readings\./, ''), message }));
  const seen = new Set<string>();
  return [...filled.problems, ...asked, ...(definition.check?.(filled.readings, context) ?? [])].filter(({ path }) => !seen.has(path) && seen.add(path));
}

/** An answer that was given can be taken back: 'not-done' counts as no answer. */
export type YesNo = 'yes' | 'no' | 'not-done' | null;
export const isYes = (answer: YesNo): boolean | null => (answer === 'yes' ? true : answer === 'no' ? false : null);
export const yesNo = (value: boolean | null): YesNo => (value === null ? null : value ? 'yes' : 'no');
