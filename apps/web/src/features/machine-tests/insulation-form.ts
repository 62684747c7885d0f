import { insulationTestVolts, type InsulationReading } from '@libs/machine-tests';
import type { UnitSystem } from '@libs/quantities';
import type { Nameplate } from '@shared/machines';
import { readTyped, typedFrom, untyped, type FormReader, type Typed } from '../../lib/typed.js';

export interface InsulationValues {
  windingKind: InsulationReading['windingKind'];
  ratedVoltageV: Typed;
  testVoltsV: Typed;
  resistanceOhm: Typed;
  windingTemperatureC: Typed;
  correctionRule: InsulationReading['correctionRule'];
  tenMinuteResistanceOhm: Typed;
}

/** From a thousand volts on a winding is made of formed coils as a rule. */
const FORM_WOUND_FROM_V = 1000;

function windingKindOf({ kind, ratedVoltageV }: Nameplate): InsulationReading['windingKind'] {
  if (kind === 'dc') return 'dc-armature';
  if (kind === 'ac-magnet') return 'field';
  return ratedVoltageV !== null && ratedVoltageV >= FORM_WOUND_FROM_V ? 'form-wound' : 'random-wound';
}

/** Starts from the nameplate, or from what an earlier test of this job says of the winding; never from a reading. */
export function startInsulation(nameplate: Nameplate, earlier: InsulationReading | null, system: UnitSystem): InsulationValues {
  const volts = earlier?.ratedVoltageV ?? nameplate.ratedVoltageV;
  return {
    windingKind: earlier?.windingKind ?? windingKindOf(nameplate),
    ratedVoltageV: typedFrom(volts, 'voltage', system),
    testVoltsV: typedFrom(volts === null ? null : insulationTestVolts(volts).leastV, 'voltage', system),
    resistanceOhm: untyped(system),
    windingTemperatureC: untyped(system),
    correctionRule: earlier?.correctionRule ?? 'halving',
    tenMinuteResistanceOhm: untyped(system),
  };
}

export const insulationFrom = (r: InsulationReading, system: UnitSystem): InsulationValues => ({
  windingKind: r.windingKind,
  ratedVoltageV: typedFrom(r.ratedVoltageV, 'voltage', system),
  testVoltsV: typedFrom(r.testVoltsV, 'voltage', system),
  resistanceOhm: typedFrom(r.resistanceOhm, 'resistance-mega', system),
  windingTemperatureC: typedFrom(r.windingTemperatureC, 'temperature', system),
  correctionRule: r.correctionRule,
  tenMinuteResistanceOhm: typedFrom(r.tenMinuteResistanceOhm, 'resistance-mega', system),
});

/** Ten minutes are waited for on a form-wound winding only: elsewhere the index says nothing. */
export const asksTenMinutes = ({ windingKind }: Pick<InsulationValues, 'windingKind'>): boolean => windingKind === 'form-wound';

export function readInsulation(reader: FormReader, values: InsulationValues): InsulationReading {
  const tenMinutes = asksTenMinutes(values) ? reader.may('insulation.tenMinuteResistanceOhm', values.tenMinuteResistanceOhm, 'resistance-mega') : undefined;
  return {
    windingKind: values.windingKind,
    ratedVoltageV: reader.need('insulation.ratedVoltageV', values.ratedVoltageV, 'voltage'),
    testVoltsV: reader.need('insulation.testVoltsV', values.testVoltsV, 'voltage'),
    resistanceOhm: reader.need('insulation.resistanceOhm', values.resistanceOhm, 'resistance-mega'),
    windingTemperatureC: reader.need('insulation.windingTemperatureC', values.windingTemperatureC, 'temperature'),
    correctionRule: values.correctionRule,
    ...(tenMinutes === undefined ? {} : { tenMinuteResistanceOhm: tenMinutes }),
  };
}

/** The volts the standard tests such a winding with; null while the rated volts are not there. */
export function testVoltsFor(ratedVoltageV: Typed): { leastV: number; mostV: number } | null {
  const reading = readTyped(ratedVoltageV, 'voltage');
  return reading.state === 'read' && reading.si > 0 ? insulationTestVolts(reading.si) : null;
}
