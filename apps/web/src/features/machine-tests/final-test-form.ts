import type { FinalTestPart, FinalTestReadings } from '@libs/machine-tests';
import { demandedFinalTestParts } from '@shared/machine-tests';
import type { ReadingsOf, RecordView } from '@shared/records';
import { lastOfKind, readingsOf } from '../../lib/job-records.js';
import { FormReader, typedFrom, untyped, type Typed } from '../../lib/typed.js';
import { earlierTest } from './earlier-tests.js';
import { insulationFrom, readInsulation, startInsulation, type InsulationValues } from './insulation-form.js';
import { highPotentialFrom, readHighPotential, startHighPotential, type HighPotentialValues } from './high-potential-form.js';
import { noLoadFrom, readNoLoad, startNoLoad, type NoLoadValues } from './no-load-form.js';
import { readResistance, resistanceFrom, startResistance, type ResistanceValues } from './resistance-form.js';
import { bearingsFrom, readBearings, readVibration, startBearings, startVibration, vibrationFrom, type BearingValues, type VibrationValues } from './running-form.js';
import { isYes, metersFrom, namedMeters, yesNo, type Meters, type TestContext, type TestForm, type YesNo } from './test-form.js';

export type FinalReadings = ReadingsOf<'final-test'>;

export const FINAL_METERS = ['insulationTesterId', 'microOhmmeterId', 'highPotentialTesterId', 'surgeTesterId', 'voltmeterId', 'ammeterId', 'wattmeterId', 'vibrationMeterId', 'thermometerId'] as const;

/** The panels that may be left out, by the names the readings have and the names the library has. */
export const PARTS = { windingResistance: 'winding-resistance', highPotential: 'high-potential', noLoad: 'no-load', vibration: 'vibration', bearings: 'bearings' } as const satisfies Record<string, FinalTestPart>;
export type PartName = keyof typeof PARTS;
export const PART_NAMES = Object.keys(PARTS) as PartName[];

export interface FinalValues {
  insulation: InsulationValues;
  done: Record<PartName, boolean>;
  windingResistance: ResistanceValues;
  highPotential: HighPotentialValues;
  noLoad: NoLoadValues;
  vibration: VibrationValues;
  directionRight: YesNo;
  bearings: BearingValues;
  surgeDifferenceFraction: Typed;
  instruments: Meters;
  remark: string;
  /** only asked for when a kept test is corrected */
  why: string;
}

export const demandedParts = ({ job }: Pick<TestContext, 'job'>): FinalTestPart[] => demandedFinalTestParts(job.machine.nameplate.kind, job.route);

/** A full test that held is not made twice: the next one is a repeat at less. */
const fullTestHeld = (records: readonly RecordView[]): boolean => {
  const last = lastOfKind(records, 'final-test');
  const test = last && readingsOf(last, 'final-test').highPotential;
  return test?.held === true && (test.case === 'new-winding' || test.case === 'repeat');
};

export const finalTestForm: TestForm<'final-test', FinalValues> = {
  kind: 'final-test',
  start: (context) => {
    const { job, records, system } = context;
    const { nameplate } = job.machine;
    const demanded = demandedParts(context);
    const earlier = earlierTest(records, ['final-test', 'before-varnish-test', 'incoming-test']);
    return {
      insulation: startInsulation(nameplate, earlier.insulation, system),
      done: Object.fromEntries(PART_NAMES.map((name) => [name, demanded.includes(PARTS[name])])) as Record<PartName, boolean>,
      windingResistance: startResistance(nameplate, earlier.windingResistance, system),
      highPotential: startHighPotential(job, { fullTestHeld: fullTestHeld(records) }, system),
      noLoad: startNoLoad(nameplate, system),
      vibration: startVibration(nameplate, system),
      directionRight: 'not-done',
      bearings: startBearings(nameplate, system),
      surgeDifferenceFraction: untyped(system),
      instruments: metersFrom(FINAL_METERS, {}),
      remark: '',
      why: '',
    };
  },
  from: (r, system) => ({
    insulation: insulationFrom(r.insulation, system),
    done: Object.fromEntries(PART_NAMES.map((name) => [name, r[name] !== null])) as Record<PartName, boolean>,
    windingResistance: resistanceFrom(r.windingResistance, system),
    highPotential: highPotentialFrom(r.highPotential, r.insulation.ratedVoltageV, system),
    noLoad: noLoadFrom(r.noLoad, system),
    vibration: vibrationFrom(r.vibration, system),
    directionRight: yesNo(r.directionRight),
    bearings: bearingsFrom(r.bearings, system),
    surgeDifferenceFraction: typedFrom(r.surgeDifferenceFraction, 'percent', system),
    instruments: metersFrom(FINAL_METERS, r.instruments),
    remark: r.remark,
    why: '',
  }),
  read: (values) => {
    const reader = new FormReader();
    const { done } = values;
    const readings: FinalReadings = {
      insulation: readInsulation(reader, values.insulation),
      windingResistance: done.windingResistance ? readResistance(reader, values.windingResistance) : null,
      highPotential: done.highPotential ? readHighPotential(reader, values.highPotential) : null,
      noLoad: done.noLoad ? readNoLoad(reader, values.noLoad) : null,
      vibration: done.vibration ? readVibration(reader, values.vibration) : null,
      directionRight: isYes(values.directionRight),
      bearings: done.bearings ? readBearings(reader, values.bearings) : null,
      surgeDifferenceFraction: reader.may('surgeDifferenceFraction', values.surgeDifferenceFraction, 'percent') ?? null,
      instruments: namedMeters(values.instruments),
      remark: values.remark.trim(),
    };
    return { readings, entered: reader.entered, problems: reader.problems };
  },
};

/** The readings as the library takes them; the core is judged at its own gate, and only shown here. */
export function finalReadings({ instruments: _instruments, remark: _remark, ...readings }: FinalReadings): FinalTestReadings {
  return { ...readings, core: null };
}
