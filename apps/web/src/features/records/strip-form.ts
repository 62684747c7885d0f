import type { BurnoutLimits } from '@shared/limits';
import type { ReadingsOf } from '@shared/records';
import { lastOfKind, readingsOf } from '../../lib/job-records.js';
import { FormReader, typedFrom, untyped, type FormProblem, type Typed } from '../../lib/typed.js';
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
  check: (readings, context) => ovenProblems(readings, dismantlingIn(context)),
};

/** The lowest limit of the part, as the server will judge it: core plate and frame; unknown counts as organic. */
export function stripLimit(context: RecordContext): { limitC: number; because: 'inorganic' | 'organic' | 'unknown' | 'aluminium'; limits: BurnoutLimits; dismantled: boolean } {
  const limits = context.limits.burnout;
  const dismantling = dismantlingIn(context);
  const plate = dismantling?.corePlate ?? 'unknown';
  const plateLimit = { limitC: plate === 'inorganic' ? limits.inorganicC : limits.organicOrUnknownC, because: plate };
  const frameLimit = { limitC: limits.aluminiumFrameC, because: 'aluminium' as const };
  const lowest = dismantling?.frameMaterial === 'aluminium' && frameLimit.limitC < plateLimit.limitC ? frameLimit : plateLimit;
  return { ...lowest, limits, dismantled: dismantling !== undefined };
}

/** What must be right before anything goes into an oven; the server refuses the same. */
export function ovenProblems(strip: Strip, dismantling: Dismantling | undefined): FormProblem[] {
  if (strip.method !== 'oven-burnout') return [];
  const problems: FormProblem[] = [];
  const say = (path: string, message: string) => void problems.push({ path, message });
  if (strip.commutatorOrSlipRingsOn) say('commutatorOrSlipRingsOn', 'A part with its commutator or slip rings on is not put into an oven. Take them off, or strip another way.');
  if (!dismantling) say('method', 'Record the dismantling first: core plate and frame set the limit of the load.');
  if (strip.wiresCountedAtCut === null) say('wiresCountedAtCut', 'Count the wires at the cut before burnout; afterwards they are gone.');
  if (!strip.sampleCoilKept) say('sampleCoilKept', 'Keep a sample coil before burnout.');
  if (!strip.ovenId) say('ovenId', 'Choose the oven.');
  return problems;
}
