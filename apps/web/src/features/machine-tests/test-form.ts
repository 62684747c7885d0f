import type { UnitSystem } from '@libs/quantities';
import type { Entered } from '@shared/fields';
import type { JobSheet } from '@shared/jobs';
import type { LimitsSet } from '@shared/limits';
import type { ReadingsOf, RecordKind, RecordView } from '@shared/records';
import type { FormProblem, Typed } from '../../lib/typed.js';

/** The three tests of a machine that have a form here. */
export const MACHINE_TEST_KINDS = ['incoming-test', 'before-varnish-test', 'final-test'] as const satisfies readonly RecordKind[];
export type MachineTestKind = (typeof MACHINE_TEST_KINDS)[number];

/** What a form is filled in beside. */
export interface TestContext {
  readonly job: JobSheet;
  readonly records: readonly RecordView[];
  readonly limits: LimitsSet;
  readonly system: UnitSystem;
}

/** A form read: NaN stands where a figure is missing or cannot be read. */
export interface FilledForm<Readings> {
  readonly readings: Readings;
  readonly entered: Entered;
  readonly problems: readonly FormProblem[];
}

/** How one test is filled in, brought back and read. */
export interface TestForm<K extends MachineTestKind, Values> {
  readonly kind: K;
  start(context: TestContext): Values;
  from(readings: ReadingsOf<K>, system: UnitSystem): Values;
  read(values: Values): FilledForm<ReadingsOf<K>>;
}

/** What was not looked at is an answer too: the paper says so. */
export type YesNo = 'yes' | 'no' | 'not-done';
export const isYes = (answer: YesNo): boolean | null => (answer === 'not-done' ? null : answer === 'yes');
export const yesNo = (value: boolean | null): YesNo => (value === null ? 'not-done' : value ? 'yes' : 'no');

export const isTyped = (typed: Typed | undefined): boolean => (typed?.text ?? '').trim() !== '';

/** Instruments by what they measured; what is not named is left out. */
export type Meters = Record<string, string | null>;
export const namedMeters = (meters: Meters): Record<string, string> => Object.fromEntries(Object.entries(meters).filter((entry): entry is [string, string] => entry[1] !== null && entry[1] !== ''));
export const metersFrom = (names: readonly string[], kept: Record<string, string | undefined>): Meters => Object.fromEntries(names.map((name) => [name, kept[name] ?? null]));
