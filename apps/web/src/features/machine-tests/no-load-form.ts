import type { UnitSystem } from '@libs/quantities';
import type { Nameplate } from '@shared/machines';
import type { ReadingsOf } from '@shared/records';
import { typedFrom, untyped, type FormReader, type Typed } from '../../lib/typed.js';
import { kindOfOhms, ohmUnitOf, three, usualOhmUnit, type OhmUnit, type Three } from './resistance-form.js';

type NoLoad = NonNullable<ReadingsOf<'final-test'>['noLoad']>;
type Point = NoLoad['points'][number];

export interface PointValues {
  voltsV: Three;
  ampsA: Three;
  wattsW: Typed;
}
export interface NoLoadValues {
  points: PointValues[];
  unit: OhmUnit;
  lineResistanceOhm: Typed;
  frequencyHz: Typed;
  speedRpm: Typed;
  /** of the winding that is fed, where it is not the one whose insulation was measured: a wound rotor */
  ratedVoltageV: Typed;
}

export const MOST_POINTS = 40;
export const blankPoint = (system: UnitSystem): PointValues => ({ voltsV: three(() => untyped(system)), ampsA: three(() => untyped(system)), wattsW: untyped(system) });

export const startNoLoad = (nameplate: Nameplate, system: UnitSystem): NoLoadValues => ({
  points: [blankPoint(system)],
  unit: usualOhmUnit(nameplate),
  lineResistanceOhm: untyped(system),
  frequencyHz: typedFrom(nameplate.ratedFrequencyHz, 'frequency', system),
  speedRpm: untyped(system),
  ratedVoltageV: nameplate.kind === 'slip-ring' ? typedFrom(nameplate.ratedVoltageV, 'voltage', system) : untyped(system),
});

export function noLoadFrom(n: NoLoad | null, system: UnitSystem): NoLoadValues {
  const unit = n ? ohmUnitOf(n.lineResistanceOhm) : 'ohm';
  return {
    points: n
      ? n.points.map((p) => ({
          voltsV: p.voltsV.map((v) => typedFrom(v, 'voltage', system)) as Three,
          ampsA: p.ampsA.map((a) => typedFrom(a, 'current', system)) as Three,
          wattsW: typedFrom(p.wattsW, 'power', system),
        }))
      : [blankPoint(system)],
    unit,
    lineResistanceOhm: typedFrom(n?.lineResistanceOhm, kindOfOhms(unit), system),
    frequencyHz: typedFrom(n?.frequencyHz, 'frequency', system),
    speedRpm: typedFrom(n?.speedRpm, 'speed', system),
    ratedVoltageV: typedFrom(n?.ratedVoltageV, 'voltage', system),
  };
}

export function readNoLoad(reader: FormReader, n: NoLoadValues): NoLoad {
  const ratedVoltageV = reader.may('noLoad.ratedVoltageV', n.ratedVoltageV, 'voltage');
  return {
    points: n.points.map((p, i): Point => ({
      voltsV: p.voltsV.map((v, j) => reader.need(`noLoad.points.${i}.voltsV.${j}`, v, 'voltage')) as Point['voltsV'],
      ampsA: p.ampsA.map((a, j) => reader.need(`noLoad.points.${i}.ampsA.${j}`, a, 'current')) as Point['ampsA'],
      wattsW: reader.need(`noLoad.points.${i}.wattsW`, p.wattsW, 'power'),
    })),
    lineResistanceOhm: reader.need('noLoad.lineResistanceOhm', n.lineResistanceOhm, kindOfOhms(n.unit)),
    frequencyHz: reader.need('noLoad.frequencyHz', n.frequencyHz, 'frequency'),
    speedRpm: reader.may('noLoad.speedRpm', n.speedRpm, 'speed') ?? null,
    ...(ratedVoltageV === undefined ? {} : { ratedVoltageV }),
  };
}
