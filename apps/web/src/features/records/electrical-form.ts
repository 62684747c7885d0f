import { insulationTestVolts, type InsulationReading, type WindingResistanceReading } from '@libs/machine-tests';
import type { UnitSystem } from '@libs/quantities';
import type { JobSheet } from '@shared/jobs';
import type { EarlierTests } from './earlier-tests.js';
import { typedFrom, untyped, type FormReader, type Typed } from '../../lib/typed.js';

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

/** What an earlier test of this job or else the nameplate says of the winding; readings are taken anew. */
export function blankInsulation({ nameplate }: JobSheet['machine'], system: UnitSystem, earlier: EarlierTests): InsulationValues {
  const volts = earlier.insulation?.ratedVoltageV ?? nameplate.ratedVoltageV;
  const windingKind = nameplate.kind === 'dc' ? 'dc-armature' : nameplate.kind === 'ac-magnet' ? 'field' : volts !== null && volts >= FORM_WOUND_FROM_V ? 'form-wound' : 'random-wound';
  return {
    windingKind: earlier.insulation?.windingKind ?? windingKind,
    ratedVoltageV: typedFrom(volts, 'voltage', system),
    testVoltsV: typedFrom(volts === null ? null : insulationTestVolts(volts).leastV, 'voltage', system),
    resistanceOhm: untyped(system),
    windingTemperatureC: untyped(system),
    correctionRule: earlier.insulation?.correctionRule ?? 'halving',
    tenMinuteResistanceOhm: untyped(system),
  };
}

/** Ten minutes are waited for where the index says something; a figure that was typed is never hidden. */
export const asksTenMinutes = ({ windingKind, tenMinuteResistanceOhm }: Pick<InsulationValues, 'windingKind' | 'tenMinuteResistanceOhm'>): boolean =>
  windingKind !== 'random-wound' || tenMinuteResistanceOhm.text.trim() !== '';

export const insulationFrom = (r: InsulationReading, system: UnitSystem): InsulationValues => ({
  windingKind: r.windingKind,
  ratedVoltageV: typedFrom(r.ratedVoltageV, 'voltage', system),
  testVoltsV: typedFrom(r.testVoltsV, 'voltage', system),
  resistanceOhm: typedFrom(r.resistanceOhm, 'resistance-mega', system),
  windingTemperatureC: typedFrom(r.windingTemperatureC, 'temperature', system),
  correctionRule: r.correctionRule,
  tenMinuteResistanceOhm: typedFrom(r.tenMinuteResistanceOhm, 'resistance-mega', system),
});

export function readInsulation(reader: FormReader, values: InsulationValues): InsulationReading {
  const tenMinutes = reader.may('insulation.tenMinuteResistanceOhm', values.tenMinuteResistanceOhm, 'resistance-mega');
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

export type Three = [Typed, Typed, Typed];
export const three = (make: () => Typed): Three => [make(), make(), make()];

export interface ResistanceValues {
  resistancesOhm: Three;
  windingTemperatureC: Typed;
  construction: WindingResistanceReading['construction'];
}

export const blankResistance = (system: UnitSystem, construction: ResistanceValues['construction'] = 'random-wound'): ResistanceValues => ({
  resistancesOhm: three(() => untyped(system)),
  windingTemperatureC: untyped(system),
  construction,
});

/** The coils are as an earlier test of this job says, or else as usual for the rated volts. */
export const startResistance = ({ nameplate }: JobSheet['machine'], system: UnitSystem, earlier: EarlierTests): ResistanceValues =>
  blankResistance(system, earlier.windingResistance?.construction ?? ((earlier.insulation?.ratedVoltageV ?? nameplate.ratedVoltageV ?? 0) >= FORM_WOUND_FROM_V ? 'form-wound' : 'random-wound'));

export const resistanceFrom = (r: WindingResistanceReading | null, system: UnitSystem): ResistanceValues =>
  r === null
    ? blankResistance(system)
    : {
        resistancesOhm: r.resistancesOhm.map((ohm) => typedFrom(ohm, 'resistance', system)) as Three,
        windingTemperatureC: typedFrom(r.windingTemperatureC, 'temperature', system),
        construction: r.construction,
      };

export const readResistance = (reader: FormReader, values: ResistanceValues): WindingResistanceReading => ({
  resistancesOhm: values.resistancesOhm.map((typed, i) => reader.need(`windingResistance.resistancesOhm.${i}`, typed, 'resistance')) as [number, number, number],
  windingTemperatureC: reader.need('windingResistance.windingTemperatureC', values.windingTemperatureC, 'temperature'),
  construction: values.construction,
});

/** Instruments by what they measured; nothing chosen is left out. */
export type Meters = Record<string, string | null>;
export const namedMeters = (meters: Meters): Record<string, string> => Object.fromEntries(Object.entries(meters).filter((entry): entry is [string, string] => entry[1] !== null && entry[1] !== ''));
export const metersFrom = (names: readonly string[], kept: Record<string, string | undefined>): Meters => Object.fromEntries(names.map((name) => [name, kept[name] ?? null]));
