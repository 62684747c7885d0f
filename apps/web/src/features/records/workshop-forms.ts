import type { ReadingsOf } from '@shared/records';
import { FormReader, typedFrom, untyped, type Typed } from '../../lib/typed.js';
import type { RecordDefinition } from './record-definition.js';

type Dismantling = ReadingsOf<'dismantling'>;
export interface DismantlingValues {
  rotorOut: boolean;
  corePlate: Dismantling['corePlate'] | null;
  frameMaterial: Dismantling['frameMaterial'] | null;
  commutatorOrSlipRings: boolean;
  inspection: string;
  fits: string;
}
export const dismantlingForm: RecordDefinition<'dismantling', DismantlingValues> = {
  kind: 'dismantling',
  start: () => ({ rotorOut: false, corePlate: null, frameMaterial: null, commutatorOrSlipRings: false, inspection: '', fits: '' }),
  from: (readings) => ({ ...readings }),
  read: (values) => ({ readings: { ...values } as Dismantling, entered: {}, problems: [] }),
  check: (readings) => (readings.rotorOut ? [] : [{ path: 'rotorOut', message: 'The rotor comes out before the core is looked at.' }]),
};

type Repair = ReadingsOf<'core-repair'>;
export interface RepairValues {
  methods: Repair['methods'];
  slotFrom: Typed;
  slotTo: Typed;
  words: string;
}
export const coreRepairForm: RecordDefinition<'core-repair', RepairValues> = {
  kind: 'core-repair',
  start: ({ system }) => ({ methods: [], slotFrom: untyped(system), slotTo: untyped(system), words: '' }),
  from: (readings, system) => ({ ...readings, slotFrom: typedFrom(readings.slotFrom, 'count', system), slotTo: typedFrom(readings.slotTo, 'count', system) }),
  read: (values) => {
    const reader = new FormReader();
    const readings: Repair = {
      methods: values.methods,
      slotFrom: reader.may('slotFrom', values.slotFrom, 'count') ?? null,
      slotTo: reader.may('slotTo', values.slotTo, 'count') ?? null,
      words: values.words,
    };
    return { readings, entered: reader.entered, problems: reader.problems };
  },
};

type Treatment = ReadingsOf<'treatment'>;
export interface TreatmentValues {
  process: Treatment['process'] | null;
  material: string;
  batch: string;
  bakeTemperatureC: Typed;
  bakeMinutes: Typed;
  cycles: Typed;
}
export const treatmentForm: RecordDefinition<'treatment', TreatmentValues> = {
  kind: 'treatment',
  start: ({ system }) => ({ process: null, material: '', batch: '', bakeTemperatureC: untyped(system), bakeMinutes: untyped(system), cycles: typedFrom(1, 'count', system) }),
  from: (readings, system) => ({
    ...readings,
    bakeTemperatureC: typedFrom(readings.bakeTemperatureC, 'temperature', system),
    bakeMinutes: typedFrom(readings.bakeMinutes, 'duration', system),
    cycles: typedFrom(readings.cycles, 'count', system),
  }),
  read: (values) => {
    const reader = new FormReader();
    const readings = {
      process: values.process,
      material: values.material,
      batch: values.batch,
      bakeTemperatureC: reader.need('bakeTemperatureC', values.bakeTemperatureC, 'temperature'),
      bakeMinutes: reader.need('bakeMinutes', values.bakeMinutes, 'duration'),
      cycles: reader.need('cycles', values.cycles, 'count'),
    } as Treatment;
    return { readings, entered: reader.entered, problems: reader.problems };
  },
};

type Assembly = ReadingsOf<'assembly'>;
export type AssemblyValues = Assembly;
export const assemblyForm: RecordDefinition<'assembly', AssemblyValues> = {
  kind: 'assembly',
  start: ({ job }) => ({ bearingDriveEnd: job.machine.nameplate.bearingDriveEnd, bearingNonDriveEnd: job.machine.nameplate.bearingNonDriveEnd, grease: '', turnsFreely: false, words: '' }),
  from: (readings) => ({ ...readings }),
  read: (values) => ({ readings: { ...values }, entered: {}, problems: [] }),
};
