import { windingDifferences, windingProblems, type WindingData, type WindingDifference } from '@libs/winding';
import type { UnitSystem } from '@libs/quantities';
import type { WindingReadings } from '@shared/windings';
import { lastOfKind, readingsOf } from '../../lib/job-records.js';
import { FormReader, typedFrom, untyped, type Typed } from '../../lib/typed.js';
import type { RecordContext, RecordDefinition } from './record-definition.js';

export interface WindingValues {
  slots: Typed;
  poles: Typed;
  layers: '1' | '2';
  coils: Typed;
  turnsPerCoil: Typed;
  spanTo: Typed;
  grouping: string;
  connection: WindingReadings['connection'] | null;
  circuits: Typed;
  wires: { strands: Typed; bareDiameterM: Typed }[];
  coilExtensionM: Typed;
  meanTurnM: Typed;
  leads: string;
  remark: string;
}

export const blankWire = (system: UnitSystem) => ({ strands: untyped(system), bareDiameterM: untyped(system) });

function blank({ job, system }: RecordContext): WindingValues {
  const { poles, connection } = job.machine.nameplate;
  const empty = () => untyped(system);
  return {
    slots: typedFrom(job.machine.coreGeometry?.slots, 'count', system),
    poles: typedFrom(poles, 'count', system),
    layers: '2',
    coils: empty(),
    turnsPerCoil: empty(),
    spanTo: empty(),
    grouping: '',
    connection: connection === 'unknown' ? null : connection,
    circuits: empty(),
    wires: [blankWire(system)],
    coilExtensionM: empty(),
    meanTurnM: empty(),
    leads: '',
    remark: '',
  };
}

const from = (readings: WindingReadings, system: UnitSystem): WindingValues => ({
  slots: typedFrom(readings.slots, 'count', system),
  poles: typedFrom(readings.poles, 'count', system),
  layers: readings.layers === 1 ? '1' : '2',
  coils: typedFrom(readings.coils, 'count', system),
  turnsPerCoil: typedFrom(readings.turnsPerCoil, 'number', system),
  spanTo: typedFrom(readings.spanTo, 'count', system),
  grouping: readings.grouping,
  connection: readings.connection,
  circuits: typedFrom(readings.circuits, 'count', system),
  wires: readings.wires.map((w) => ({ strands: typedFrom(w.strands, 'count', system), bareDiameterM: typedFrom(w.bareDiameterM, 'wire-diameter', system) })),
  coilExtensionM: typedFrom(readings.coilExtensionM, 'length', system),
  meanTurnM: typedFrom(readings.meanTurnM, 'length', system),
  leads: readings.leads,
  remark: readings.remark,
});

function read(values: WindingValues) {
  const reader = new FormReader();
  const readings = {
    slots: reader.need('slots', values.slots, 'count'),
    poles: reader.need('poles', values.poles, 'count'),
    layers: values.layers === '1' ? 1 : 2,
    coils: reader.need('coils', values.coils, 'count'),
    turnsPerCoil: reader.need('turnsPerCoil', values.turnsPerCoil, 'number'),
    spanFrom: 1,
    spanTo: reader.need('spanTo', values.spanTo, 'count'),
    grouping: values.grouping,
    connection: values.connection,
    circuits: reader.need('circuits', values.circuits, 'count'),
    wires: values.wires.map((w, i) => ({
      strands: reader.need(`wires.${i}.strands`, w.strands, 'count'),
      bareDiameterM: reader.need(`wires.${i}.bareDiameterM`, w.bareDiameterM, 'wire-diameter'),
    })),
    coilExtensionM: reader.may('coilExtensionM', values.coilExtensionM, 'length') ?? null,
    meanTurnM: reader.may('meanTurnM', values.meanTurnM, 'length') ?? null,
    leads: values.leads,
    remark: values.remark,
  } as WindingReadings;
  return { readings, entered: reader.entered, problems: reader.problems };
}

const check = (readings: WindingReadings) => windingProblems(windingData(readings) as never).map(({ path, message }) => ({ path, message }));

export const windingData = ({ spanFrom: _from, grouping: _grouping, leads: _leads, remark: _remark, ...data }: WindingReadings): WindingData => data;

export const windingAsFoundForm: RecordDefinition<'winding-as-found', WindingValues> = { kind: 'winding-as-found', start: blank, from, read, check };

/** The winding as found, where it was recorded. */
export function asFoundIn({ records }: Pick<RecordContext, 'records'>): WindingReadings | null {
  const record = lastOfKind(records, 'winding-as-found');
  return record ? readingsOf(record, 'winding-as-found') : null;
}

/** The new winding starts as a copy of the old: what is left alone is meant to be the same. Lengths are measured anew. */
export const windingAsWoundForm: RecordDefinition<'winding-as-wound', WindingValues> = {
  kind: 'winding-as-wound',
  start: (context) => {
    const found = asFoundIn(context);
    return found ? { ...from(found, context.system), coilExtensionM: untyped(context.system), meanTurnM: untyped(context.system), remark: '' } : blank(context);
  },
  from,
  read,
  check,
};

/** Item by item; null while one of the two cannot be compared yet. */
export function differencesOf(found: WindingReadings | null, wound: WindingReadings): WindingDifference[] | null {
  if (!found || windingProblems(windingData(found) as never).length > 0 || windingProblems(windingData(wound) as never).length > 0) return null;
  return windingDifferences(windingData(found), windingData(wound));
}
