import { highPotentialLevel, type HighPotentialLevel, type HighPotentialReading, type MachineTestLimits } from '@libs/machine-tests';
import type { UnitSystem } from '@libs/quantities';
import type { JobSheet } from '@shared/jobs';
import type { ReadingsOf } from '@shared/records';
import { FormReader, typedFrom, untyped, type Typed } from '../../lib/typed.js';

type HighPotential = NonNullable<ReadingsOf<'final-test'>['highPotential']>;

export interface HighPotentialValues {
  case: HighPotentialReading['case'];
  ratedVoltageV: Typed;
  secondaryVoltsV: Typed;
  ratedPowerW: Typed;
  supply: 'ac' | 'dc';
  appliedVoltsV: Typed;
  seconds: Typed;
  held: 'yes' | 'no' | null;
}

const ONE_MINUTE_S = 60;

const usualCase = (job: JobSheet, fullTestHeld: boolean): HighPotentialReading['case'] => (job.route === 'recondition' ? 'reconditioned' : fullTestHeld ? 'repeat' : 'new-winding');

export const startHighPotential = (job: JobSheet, { fullTestHeld }: { readonly fullTestHeld: boolean }, system: UnitSystem): HighPotentialValues => ({
  case: usualCase(job, fullTestHeld),
  ratedVoltageV: typedFrom(job.machine.nameplate.ratedVoltageV, 'voltage', system),
  secondaryVoltsV: untyped(system),
  ratedPowerW: typedFrom(job.machine.nameplate.ratedPowerW, 'rated-power', system),
  supply: 'ac',
  appliedVoltsV: untyped(system),
  seconds: typedFrom(ONE_MINUTE_S, 'number', system),
  held: null,
});

export const highPotentialFrom = (h: HighPotential | null, ratedVoltageV: number, system: UnitSystem): HighPotentialValues => ({
  case: h?.case ?? 'new-winding',
  ratedVoltageV: typedFrom(h?.ratedVoltageV ?? ratedVoltageV, 'voltage', system),
  secondaryVoltsV: typedFrom(h?.secondaryVoltsV, 'voltage', system),
  ratedPowerW: typedFrom(h?.ratedPowerW, 'rated-power', system),
  supply: h?.supply ?? 'ac',
  appliedVoltsV: typedFrom(h?.appliedVoltsV, 'voltage', system),
  seconds: typedFrom(h?.seconds ?? ONE_MINUTE_S, 'number', system),
  held: h ? (h.held ? 'yes' : 'no') : null,
});

/** A wound rotor is tested by the volts between its slip rings. */
export const asksSecondaryVolts = (of: HighPotentialReading['case']): boolean => of === 'wound-rotor' || of === 'wound-rotor-reversing';

export function readHighPotential(reader: FormReader, h: HighPotentialValues): HighPotential {
  const secondaryVoltsV = asksSecondaryVolts(h.case) ? reader.need('highPotential.secondaryVoltsV', h.secondaryVoltsV, 'voltage') : undefined;
  const reading = {
    case: h.case,
    ratedVoltageV: reader.need('highPotential.ratedVoltageV', h.ratedVoltageV, 'voltage'),
    ...(secondaryVoltsV === undefined ? {} : { secondaryVoltsV }),
    ratedPowerW: reader.may('highPotential.ratedPowerW', h.ratedPowerW, 'rated-power') ?? null,
    supply: h.supply,
    appliedVoltsV: reader.need('highPotential.appliedVoltsV', h.appliedVoltsV, 'voltage'),
    seconds: reader.need('highPotential.seconds', h.seconds, 'number'),
    held: h.held === 'yes',
  };
  if (h.held === null) reader.note('highPotential.held', 'Say whether it held.');
  return reading;
}

/** The level that is asked, as soon as what it depends on is there; null before. */
export function levelFor(values: HighPotentialValues, limits: MachineTestLimits): HighPotentialLevel | null {
  const read = readHighPotential(new FormReader(), values);
  const known = (v: number | null | undefined) => v === null || v === undefined || v > 0;
  if (!(read.ratedVoltageV > 0) || !known(read.ratedPowerW) || (asksSecondaryVolts(read.case) && !((read.secondaryVoltsV ?? 0) > 0))) return null;
  return highPotentialLevel(read, limits);
}
