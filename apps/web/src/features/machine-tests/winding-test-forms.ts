import type { ReadingsOf } from '@shared/records';
import { FormReader, typedFrom, untyped, type Typed } from '../../lib/typed.js';
import { earlierTest } from './earlier-tests.js';
import { insulationFrom, readInsulation, startInsulation, type InsulationValues } from './insulation-form.js';
import { readResistance, resistanceFrom, startResistance, type ResistanceValues } from './resistance-form.js';
import { isYes, metersFrom, namedMeters, yesNo, type Meters, type TestForm, type YesNo } from './test-form.js';

export const INCOMING_METERS = ['insulationTesterId', 'microOhmmeterId'] as const;
export const BEFORE_VARNISH_METERS = ['insulationTesterId', 'microOhmmeterId', 'surgeTesterId'] as const;

export interface IncomingValues {
  insulation: InsulationValues;
  /** whether the part was measured; what was not stays out of the record, and what was typed stays in the form */
  done: { windingResistance: boolean };
  windingResistance: ResistanceValues;
  instruments: Meters;
  remark: string;
  /** only asked for when a kept test is corrected */
  why: string;
}

export const incomingTestForm: TestForm<'incoming-test', IncomingValues> = {
  kind: 'incoming-test',
  start: ({ job, records, system }) => {
    const earlier = earlierTest(records, ['incoming-test']);
    return {
      insulation: startInsulation(job.machine.nameplate, earlier.insulation, system),
      done: { windingResistance: job.machine.nameplate.kind !== 'ac-magnet' },
      windingResistance: startResistance(job.machine.nameplate, earlier.windingResistance, system),
      instruments: metersFrom(INCOMING_METERS, {}),
      remark: '',
      why: '',
    };
  },
  from: (r, system) => ({
    insulation: insulationFrom(r.insulation, system),
    done: { windingResistance: r.windingResistance !== null },
    windingResistance: resistanceFrom(r.windingResistance, system),
    instruments: metersFrom(INCOMING_METERS, r.instruments),
    remark: r.remark,
    why: '',
  }),
  read: (values) => {
    const reader = new FormReader();
    const readings: ReadingsOf<'incoming-test'> = {
      insulation: readInsulation(reader, values.insulation),
      windingResistance: values.done.windingResistance ? readResistance(reader, values.windingResistance) : null,
      instruments: namedMeters(values.instruments),
      remark: values.remark.trim(),
    };
    return { readings, entered: reader.entered, problems: reader.problems };
  },
};

export interface BeforeVarnishValues extends IncomingValues {
  surgeDifferenceFraction: Typed;
  surgePeakV: Typed;
  polarityRight: YesNo;
}

export const beforeVarnishForm: TestForm<'before-varnish-test', BeforeVarnishValues> = {
  kind: 'before-varnish-test',
  start: (context) => {
    const { nameplate } = context.job.machine;
    const earlier = earlierTest(context.records, ['before-varnish-test', 'incoming-test']);
    return {
      ...incomingTestForm.start(context),
      insulation: startInsulation(nameplate, earlier.insulation, context.system),
      windingResistance: startResistance(nameplate, earlier.windingResistance, context.system),
      surgeDifferenceFraction: untyped(context.system),
      surgePeakV: untyped(context.system),
      polarityRight: 'not-done',
      instruments: metersFrom(BEFORE_VARNISH_METERS, {}),
    };
  },
  from: (r, system) => ({
    insulation: insulationFrom(r.insulation, system),
    done: { windingResistance: r.windingResistance !== null },
    windingResistance: resistanceFrom(r.windingResistance, system),
    surgeDifferenceFraction: typedFrom(r.surgeDifferenceFraction, 'percent', system),
    surgePeakV: typedFrom(r.surgePeakV, 'voltage', system),
    polarityRight: yesNo(r.polarityRight),
    instruments: metersFrom(BEFORE_VARNISH_METERS, r.instruments),
    remark: r.remark,
    why: '',
  }),
  read: (values) => {
    const reader = new FormReader();
    const readings: ReadingsOf<'before-varnish-test'> = {
      insulation: readInsulation(reader, values.insulation),
      windingResistance: values.done.windingResistance ? readResistance(reader, values.windingResistance) : null,
      surgeDifferenceFraction: reader.may('surgeDifferenceFraction', values.surgeDifferenceFraction, 'percent') ?? null,
      surgePeakV: reader.may('surgePeakV', values.surgePeakV, 'voltage') ?? null,
      polarityRight: isYes(values.polarityRight),
      instruments: namedMeters(values.instruments),
      remark: values.remark.trim(),
    };
    return { readings, entered: reader.entered, problems: reader.problems };
  },
};
