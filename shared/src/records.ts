import { z } from 'zod';
import { coreTestReadingsSchema } from './core-tests.js';
import { enteredField, finite, idField, lineField, requiredLine, textField, versionField } from './fields.js';
import { beforeVarnishReadingsSchema, finalTestReadingsSchema, incomingTestReadingsSchema } from './machine-tests.js';
import type { Step } from './route.js';
import { windingReadingsSchema } from './windings.js';

/** The records a job collects. Each has readings (facts, as entered) and a result (derived by the server). */
export const RECORD_KINDS = [
  'incoming-test',
  'dismantling',
  'winding-as-found',
  'core-test-before',
  'strip',
  'core-test-after',
  'core-repair',
  'winding-as-wound',
  'before-varnish-test',
  'treatment',
  'assembly',
  'final-test',
] as const;
export type RecordKind = (typeof RECORD_KINDS)[number];

/** From which step on a record may be made; what lies ahead of the job cannot be recorded yet. */
export const RECORD_FROM_STEP: Record<RecordKind, Step> = {
  'incoming-test': 'incoming-test',
  dismantling: 'dismantled',
  'winding-as-found': 'dismantled',
  'core-test-before': 'core-test-before',
  strip: 'strip-and-burnout',
  'core-test-after': 'core-test-after',
  'core-repair': 'core-test-before',
  'winding-as-wound': 'rewind',
  'before-varnish-test': 'before-varnish-test',
  treatment: 'treatment',
  assembly: 'assembly',
  'final-test': 'final-test',
};

/** Records a job has one of (corrected by revision); of the others there may be several. */
export const ONCE_A_JOB: readonly RecordKind[] = ['dismantling', 'winding-as-found', 'winding-as-wound', 'assembly'];

export const CORE_PLATES = ['organic', 'inorganic', 'unknown'] as const;
export const FRAMES = ['cast-iron', 'steel', 'aluminium'] as const;
export const STRIP_METHODS = ['oven-burnout', 'warm-pull', 'cold-pull', 'water-jet', 'chemical'] as const;

export const dismantlingReadingsSchema = z.strictObject({
  rotorOut: z.boolean(),
  corePlate: z.enum(CORE_PLATES, { error: 'Unknown is an answer: it counts as organic.' }),
  frameMaterial: z.enum(FRAMES),
  commutatorOrSlipRings: z.boolean(),
  inspection: requiredLine(600, 'What was seen?'),
  fits: textField(400).default(''),
});

export const stripReadingsSchema = z.strictObject({
  method: z.enum(STRIP_METHODS),
  ovenId: lineField(40).nullable(),
  commutatorOrSlipRingsOn: z.boolean(),
  wiresCountedAtCut: z.number().int().min(0).max(100_000).nullable(),
  sampleCoilKept: z.boolean(),
  partPeakC: finite('The highest temperature of the part itself.').refine((v) => v > -40 && v < 900, 'Between -40 and 900 °C.').nullable(),
  minutesAbove345C: finite('Minutes.').refine((v) => v >= 0 && v < 10_000, 'Not negative.').nullable(),
  sensorPosition: lineField(120).default(''),
  explanation: textField(600).default(''),
});

export const coreRepairReadingsSchema = z.strictObject({
  methods: z.array(z.enum(['separate', 'grind', 'etch', 'restack', 're-insulate', 'new-laminations'])).min(1, 'Choose what was done.'),
  slotFrom: z.number().int().min(1).max(400).nullable(),
  slotTo: z.number().int().min(1).max(400).nullable(),
  words: requiredLine(600, 'Say what was done, and where.'),
});

export const treatmentReadingsSchema = z.strictObject({
  process: z.enum(['dip-and-bake', 'vacuum-pressure', 'trickle', 'roll-dip']),
  material: requiredLine(80, 'Which varnish or resin?'),
  batch: lineField(60).default(''),
  bakeTemperatureC: finite('A temperature.').refine((v) => v > 0 && v < 400, 'Between 0 and 400 °C.'),
  bakeMinutes: finite('Minutes.').refine((v) => v > 0 && v < 10_000, 'More than 0.'),
  cycles: z.number().int().min(1).max(10),
});

export const assemblyReadingsSchema = z.strictObject({
  bearingDriveEnd: requiredLine(60, 'Bearing fitted, drive end.'),
  bearingNonDriveEnd: requiredLine(60, 'Bearing fitted, non-drive end.'),
  grease: lineField(80).default(''),
  turnsFreely: z.boolean(),
  words: textField(600).default(''),
});

const of = <K extends RecordKind, S extends z.ZodType>(kind: K, readings: S) => ({ kind: z.literal(kind), readings, entered: enteredField });

/** What a technician records. */
export const recordInputSchema = z.discriminatedUnion('kind', [
  z.strictObject(of('incoming-test', incomingTestReadingsSchema)),
  z.strictObject(of('dismantling', dismantlingReadingsSchema)),
  z.strictObject(of('winding-as-found', windingReadingsSchema)),
  z.strictObject(of('core-test-before', coreTestReadingsSchema)),
  z.strictObject(of('strip', stripReadingsSchema)),
  z.strictObject(of('core-test-after', coreTestReadingsSchema)),
  z.strictObject(of('core-repair', coreRepairReadingsSchema)),
  z.strictObject(of('winding-as-wound', windingReadingsSchema)),
  z.strictObject(of('before-varnish-test', beforeVarnishReadingsSchema)),
  z.strictObject(of('treatment', treatmentReadingsSchema)),
  z.strictObject(of('assembly', assemblyReadingsSchema)),
  z.strictObject(of('final-test', finalTestReadingsSchema)),
]);
export type RecordInput = z.infer<typeof recordInputSchema>;
export type ReadingsOf<K extends RecordKind> = Extract<RecordInput, { kind: K }>['readings'];

export const makeRecordSchema = z.strictObject({ record: recordInputSchema });
export type MakeRecord = z.infer<typeof makeRecordSchema>;
/** A correction: the next revision, with its reason; the old one stays. */
export const amendRecordSchema = z.strictObject({ version: versionField, reason: requiredLine(400, 'Why is it corrected?'), record: recordInputSchema });
export type AmendRecord = z.infer<typeof amendRecordSchema>;
export const recordViewSchema = z.strictObject({
  id: idField,
  jobId: idField,
  kind: z.enum(RECORD_KINDS),
  ordinal: z.number().int(),
  revision: z.number().int(),
  verdict: z.string().nullable(),
  readings: z.record(z.string(), z.unknown()),
  entered: enteredField,
  result: z.record(z.string(), z.unknown()),
  calculation: z.string(),
  limitsVersion: z.number().int(),
  instruments: z.array(z.strictObject({ id: idField, tag: z.string(), description: z.string(), serial: z.string(), dueOn: z.string(), calibratedOn: z.string(), certificateNumber: z.string(), overdueOnTheDay: z.boolean() })),
  reason: z.string(),
  by: z.string(),
  at: z.string(),
  contentHash: z.string(),
  version: versionField,
});
export type RecordView = z.infer<typeof recordViewSchema>;
export const recordListSchema = z.array(recordViewSchema);
