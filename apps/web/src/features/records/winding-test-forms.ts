import { beforeVarnishProblems, incomingTestProblems } from '@libs/machine-tests';
import type { ReadingsOf } from '@shared/records';
import { FormReader, typedFrom, untyped, type Typed } from '../../lib/typed.js';
import { earlierTests, type MachineTestKind } from './earlier-tests.js';
import {
  blankInsulation,
  insulationFrom,
  metersFrom,
  namedMeters,
  readInsulation,
  readResistance,
  resistanceFrom,
  startResistance,
  type InsulationValues,
  type Meters,
  type ResistanceValues,
} from './electrical-form.js';
import { isYes, yesNo, type RecordContext, type RecordDefinition, type YesNo } from './record-definition.js';

type Incoming = ReadingsOf<'incoming-test'>;
type BeforeVarnish = ReadingsOf<'before-varnish-test'>;

export const INCOMING_METERS = ['insulationTesterId', 'microOhmmeterId'] as const;
export const BEFORE_VARNISH_METERS = ['insulationTesterId', 'microOhmmeterId', 'surgeTesterId'] as const;

export interface IncomingValues {
  insulation: InsulationValues;
  /** whether the part was measured; what was not stays out of the record */
  done: { windingResistance: boolean };
  windingResistance: ResistanceValues;
  instruments: Meters;
  remark: string;
}

function startIncoming({ job, records, system }: RecordContext, kinds: readonly MachineTestKind[]): IncomingValues {
  const earlier = earlierTests(records, kinds);
  return {
    insulation: blankInsulation(job.machine, system, earlier),
    done: { windingResistance: true },
    windingResistance: startResistance(job.machine, system, earlier),
    instruments: metersFrom(INCOMING_METERS, {}),
    remark: '',
  };
}

export const incomingTestForm: RecordDefinition<'incoming-test', IncomingValues> = {
  kind: 'incoming-test',
  start: (context) => startIncoming(context, ['incoming-test']),
  from: (r, system) => ({
    insulation: insulationFrom(r.insulation, system),
    done: { windingResistance: r.windingResistance !== null },
    windingResistance: resistanceFrom(r.windingResistance, system),
    instruments: metersFrom(INCOMING_METERS, r.instruments),
    remark: r.remark,
  }),
  read: (values) => {
    const reader = new FormReader();
    const readings: Incoming = {
      insulation: readInsulation(reader, values.insulation),
      windingResistance: values.done.windingResistance ? readResistance(reader, values.windingResistance) : null,
      instruments: namedMeters(values.instruments),
      remark: values.remark,
    };
    return { readings, entered: reader.entered, problems: reader.problems };
  },
  check: ({ insulation, windingResistance }) => incomingTestProblems({ insulation, windingResistance }),
};

export interface BeforeVarnishValues extends IncomingValues {
  surgeDifferenceFraction: Typed;
  surgePeakV: Typed;
  polarityRight: YesNo;
}

export const beforeVarnishForm: RecordDefinition<'before-varnish-test', BeforeVarnishValues> = {
  kind: 'before-varnish-test',
  start: (context) => ({
    ...startIncoming(context, ['before-varnish-test', 'incoming-test']),
    instruments: metersFrom(BEFORE_VARNISH_METERS, {}),
    surgeDifferenceFraction: untyped(context.system),
    surgePeakV: untyped(context.system),
    polarityRight: null,
  }),
  from: (r, system) => ({
    insulation: insulationFrom(r.insulation, system),
    done: { windingResistance: r.windingResistance !== null },
    windingResistance: resistanceFrom(r.windingResistance, system),
    surgeDifferenceFraction: typedFrom(r.surgeDifferenceFraction, 'percent', system),
    surgePeakV: typedFrom(r.surgePeakV, 'voltage', system),
    polarityRight: yesNo(r.polarityRight),
    instruments: metersFrom(BEFORE_VARNISH_METERS, r.instruments),
    remark: r.remark,
  }),
  read: (values) => {
    const reader = new FormReader();
    const readings: BeforeVarnish = {
      insulation: readInsulation(reader, values.insulation),
      windingResistance: values.done.windingResistance ? readResistance(reader, values.windingResistance) : null,
      surgeDifferenceFraction: reader.may('surgeDifferenceFraction', values.surgeDifferenceFraction, 'percent') ?? null,
      surgePeakV: reader.may('surgePeakV', values.surgePeakV, 'voltage') ?? null,
      polarityRight: isYes(values.polarityRight),
      instruments: namedMeters(values.instruments),
      remark: values.remark,
    };
    return { readings, entered: reader.entered, problems: reader.problems };
  },
  check: ({ instruments: _instruments, remark: _remark, ...readings }) => beforeVarnishProblems(readings),
};
