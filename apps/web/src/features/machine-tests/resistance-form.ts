import type { WindingResistanceReading } from '@libs/machine-tests';
import type { Kind, UnitSystem } from '@libs/quantities';
import type { Nameplate } from '@shared/machines';
import { readTyped, typedFrom, untyped, type FormReader, type Typed } from '../../lib/typed.js';

export type Three = [Typed, Typed, Typed];
export const three = (make: () => Typed): Three => [make(), make(), make()];

/** What the meter shows: ohms of a small machine, milliohms of a large one. The figure that is kept is the same. */
export type OhmUnit = 'ohm' | 'milliohm';
export const kindOfOhms = (unit: OhmUnit): Kind => (unit === 'milliohm' ? 'resistance-milli' : 'resistance');

export interface ResistanceValues {
  unit: OhmUnit;
  resistancesOhm: Three;
  windingTemperatureC: Typed;
  construction: WindingResistanceReading['construction'];
}

/** Over this rated power a low-voltage winding has fewer ohms than a person likes to count zeros of. */
const MILLIOHM_FROM_W = 15e3;
const MILLIOHM_UNDER_OHM = 0.1;
export const usualOhmUnit = ({ ratedPowerW, ratedVoltageV }: Pick<Nameplate, 'ratedPowerW' | 'ratedVoltageV'>): OhmUnit =>
  ratedPowerW !== null && ratedPowerW >= MILLIOHM_FROM_W && (ratedVoltageV ?? 0) <= 1000 ? 'milliohm' : 'ohm';
export const ohmUnitOf = (ohm: number): OhmUnit => (ohm < MILLIOHM_UNDER_OHM ? 'milliohm' : 'ohm');

export const startResistance = (nameplate: Nameplate, earlier: WindingResistanceReading | null, system: UnitSystem): ResistanceValues => ({
  unit: earlier ? ohmUnitOf(earlier.resistancesOhm[0]) : usualOhmUnit(nameplate),
  resistancesOhm: three(() => untyped(system)),
  windingTemperatureC: untyped(system),
  construction: earlier?.construction ?? ((nameplate.ratedVoltageV ?? 0) >= 1000 ? 'form-wound' : 'random-wound'),
});

export function resistanceFrom(r: WindingResistanceReading | null, system: UnitSystem): ResistanceValues {
  if (r === null) return { unit: 'ohm', resistancesOhm: three(() => untyped(system)), windingTemperatureC: untyped(system), construction: 'random-wound' };
  const unit = ohmUnitOf(r.resistancesOhm[0]);
  return {
    unit,
    resistancesOhm: r.resistancesOhm.map((ohm) => typedFrom(ohm, kindOfOhms(unit), system)) as Three,
    windingTemperatureC: typedFrom(r.windingTemperatureC, 'temperature', system),
    construction: r.construction,
  };
}

export const readResistance = (reader: FormReader, values: ResistanceValues): WindingResistanceReading => ({
  resistancesOhm: values.resistancesOhm.map((typed, i) => reader.need(`windingResistance.resistancesOhm.${i}`, typed, kindOfOhms(values.unit))) as [number, number, number],
  windingTemperatureC: reader.need('windingResistance.windingTemperatureC', values.windingTemperatureC, 'temperature'),
  construction: values.construction,
});

/** The mean of the three as they are typed; null until all three are there. */
export function meanOhms({ resistancesOhm, unit }: ResistanceValues): number | null {
  const read = resistancesOhm.map((typed) => readTyped(typed, kindOfOhms(unit)));
  const ohms = read.flatMap((r) => (r.state === 'read' && r.si > 0 ? [r.si] : []));
  return ohms.length === 3 ? ohms.reduce((sum, ohm) => sum + ohm, 0) / 3 : null;
}
