import { burnoutProblems, partLimit, type PartLimit } from '@shared/burnout-limit';
import type { JobLoad } from '@shared/burnouts';
import type { UnitSystem } from '@libs/quantities';
import type { BurnoutLimits } from '@shared/limits';
import type { ReadingsOf } from '@shared/records';
import { lastOfKind, readingsOf } from '../../lib/job-records.js';
import { FormReader, typedFrom, untyped, type Typed } from '../../lib/typed.js';
import type { RecordContext, RecordDefinition } from './record-definition.js';

type Strip = ReadingsOf<'strip'>;
type Dismantling = ReadingsOf<'dismantling'>;

export interface StripValues {
  method: Strip['method'] | null;
  ovenId: string | null;
  commutatorOrSlipRingsOn: boolean;
  wiresCountedAtCut: Typed;
  sampleCoilKept: boolean;
  partPeakC: Typed;
  minutesAbove345C: Typed;
  sensorPosition: string;
  explanation: string;
}

const dismantlingIn = ({ records }: RecordContext): Dismantling | undefined => {
  const record = lastOfKind(records, 'dismantling');
  return record && readingsOf(record, 'dismantling');
};

export const stripForm: RecordDefinition<'strip', StripValues> = {
  kind: 'strip',
  start: (context) => ({
    method: null,
    ovenId: null,
    commutatorOrSlipRingsOn: dismantlingIn(context)?.commutatorOrSlipRings ?? false,
    wiresCountedAtCut: untyped(context.system),
    sampleCoilKept: false,
    partPeakC: untyped(context.system),
    minutesAbove345C: untyped(context.system),
    sensorPosition: '',
    explanation: '',
  }),
  from: (readings, system) => ({
    ...readings,
    wiresCountedAtCut: typedFrom(readings.wiresCountedAtCut, 'count', system),
    partPeakC: typedFrom(readings.partPeakC, 'temperature', system),
    minutesAbove345C: typedFrom(readings.minutesAbove345C, 'duration', system),
  }),
  read: (values) => {
    const reader = new FormReader();
    const readings = {
      ...values,
      // an oven belongs to a burnout only, whatever was chosen on the way
      ovenId: values.method === 'oven-burnout' ? values.ovenId : null,
      wiresCountedAtCut: reader.may('wiresCountedAtCut', values.wiresCountedAtCut, 'count') ?? null,
      partPeakC: reader.may('partPeakC', values.partPeakC, 'temperature') ?? null,
      minutesAbove345C: reader.may('minutesAbove345C', values.minutesAbove345C, 'duration') ?? null,
    } as Strip;
    return { readings, entered: reader.entered, problems: reader.problems };
  },
  check: (readings, context) => burnoutProblems(readings, dismantlingIn(context)),
};

/** The limit of this job's part, as the server will judge it, and whether the dismantling that sets it is there. */
export function stripLimit(context: RecordContext): PartLimit & { limits: BurnoutLimits; dismantled: boolean } {
  const limits = context.limits.burnout;
  const dismantling = dismantlingIn(context);
  return { ...partLimit(dismantling, limits), limits, dismantled: dismantling !== undefined };
}

/** What a load says of this record; where the sensor sat is left as it was typed. */
export function takenFromLoad(load: Pick<JobLoad, 'ovenId' | 'peakC' | 'minutesAbove345C' | 'hottest'>, typed: Pick<StripValues, 'sensorPosition'>, system: UnitSystem): Partial<StripValues> {
  return {
    method: 'oven-burnout',
    ovenId: load.ovenId,
    partPeakC: typedFrom(load.peakC === null ? null : Math.round(load.peakC * 10) / 10, 'temperature', system),
    minutesAbove345C: typedFrom(load.minutesAbove345C === null ? null : Math.round(load.minutesAbove345C), 'duration', system),
    ...(typed.sensorPosition === '' && load.hottest ? { sensorPosition: load.hottest } : {}),
  };
}
