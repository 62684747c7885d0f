import { z } from 'zod';
import { createCustomerSchema, customerViewSchema } from './customers.js';
import { gateConditionSchema } from './errors.js';
import { dateField, idField, lineField, pageOf, pageQuery, requiredLine, textField, versionField } from './fields.js';
import { createMachineSchema, machineViewSchema } from './machines.js';
import { GATES, JOB_STATES, ROUTES, STEPS } from './route.js';
import { signOffSchema } from './waivers.js';

export const CONTAMINATIONS = ['none', 'oil-or-grease', 'coolant', 'chemicals', 'food', 'sewage', 'asbestos-suspected', 'other'] as const;

/** Booking in: customer new or found, machine new or found, what came with it, what is wrong, promise and route. */
export const bookInSchema = z.strictObject({
  customer: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('known'), customerId: idField }),
    z.strictObject({ kind: z.literal('new'), details: createCustomerSchema }),
  ]),
  machine: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('known'), machineId: idField }),
    z.strictObject({ kind: z.literal('new'), details: createMachineSchema }),
  ]),
  route: z.enum(ROUTES),
  complaint: requiredLine(600, 'What is wrong with it, in the customer’s words?'),
  accessories: lineField(400).default(''),
  contamination: z.enum(CONTAMINATIONS, { error: 'Ask, and say what it is: “none” is an answer.' }),
  contaminationWords: lineField(200).default(''),
  promisedOn: dateField.nullable(),
  customerReference: lineField(80).default(''),
  warrantyOfJobId: idField.nullable().default(null),
});
export type BookIn = z.infer<typeof bookInSchema>;
export type BookInForm = z.input<typeof bookInSchema>;

export const updateJobSchema = z.strictObject({
  version: versionField,
  complaint: requiredLine(600),
  accessories: lineField(400),
  contamination: z.enum(CONTAMINATIONS),
  contaminationWords: lineField(200),
  promisedOn: dateField.nullable(),
  customerReference: lineField(80),
});
export type UpdateJob = z.infer<typeof updateJobSchema>;

export const moveJobSchema = z.strictObject({ version: versionField, to: z.enum(STEPS), why: lineField(400).default('') });
export type MoveJob = z.infer<typeof moveJobSchema>;
export const holdJobSchema = z.strictObject({ version: versionField, reason: requiredLine(200, 'Why does it wait?'), waitingFor: z.enum(['customer', 'part', 'outside-work', 'manager', 'other']) });
export type HoldJob = z.infer<typeof holdJobSchema>;
export const resumeJobSchema = z.strictObject({ version: versionField, why: lineField(400).default('') });
export type ResumeJob = z.infer<typeof resumeJobSchema>;
export const endJobSchema = z.strictObject({
  version: versionField,
  end: z.enum(['returned-unrepaired', 'replaced', 'scrapped']),
  consentBy: requiredLine(80, 'Who agreed?'),
  consentHow: z.enum(['phone', 'e-mail', 'in-person', 'portal']),
  words: textField(600).default(''),
});
export type EndJob = z.infer<typeof endJobSchema>;

/** A manager moves a job to the newest acceptance limits, with the reason. */
export const moveLimitsSchema = z.strictObject({ version: versionField, reason: requiredLine(400, 'Why is it judged by the newer limits?') });
export type MoveLimits = z.infer<typeof moveLimitsSchema>;

/** The machine goes out: who took it, and what was said. */
export const recordDeliverySchema = z.strictObject({ version: versionField, receivedBy: requiredLine(80, 'Who takes it?'), words: textField(600).default('') });
export type RecordDelivery = z.infer<typeof recordDeliverySchema>;
export const deliverySchema = z.strictObject({ signOff: signOffSchema, paperId: idField, number: z.string() });
export type Delivery = z.infer<typeof deliverySchema>;

/** The tag of a job as it was last printed. */
export const tagSchema = z.strictObject({ paperId: idField, number: z.string(), issuedAt: z.string() });
export type Tag = z.infer<typeof tagSchema>;

export const gateViewSchema = z.strictObject({ gate: z.enum(GATES), open: z.boolean(), before: z.enum(STEPS).nullable(), conditions: z.array(gateConditionSchema) });
export type GateView = z.infer<typeof gateViewSchema>;

export const attachmentViewSchema = z.strictObject({ id: idField, name: z.string(), mime: z.string(), sizeBytes: z.number().int(), addedBy: z.string(), addedAt: z.string(), recordId: idField.nullable() });
export type AttachmentView = z.infer<typeof attachmentViewSchema>;

export const jobSheetSchema = z.strictObject({
  id: idField,
  number: z.string(),
  route: z.enum(ROUTES),
  step: z.enum(STEPS),
  state: z.enum(JOB_STATES),
  holdReason: z.string().nullable(),
  waitingFor: z.string().nullable(),
  complaint: z.string(),
  accessories: z.string(),
  contamination: z.enum(CONTAMINATIONS),
  contaminationWords: z.string(),
  customerReference: z.string(),
  promisedOn: z.string().nullable(),
  receivedAt: z.string(),
  warrantyOf: z.strictObject({ jobId: idField, jobNumber: z.string() }).nullable(),
  limitsVersion: z.number().int(),
  version: versionField,
  customer: customerViewSchema,
  machine: machineViewSchema,
  gates: z.array(gateViewSchema),
  /** the next step, and what stands in front of it: the step's own work, and the gate where there is one */
  next: z.strictObject({ step: z.enum(STEPS), open: z.boolean(), conditions: z.array(gateConditionSchema) }).nullable(),
  signOffs: z.array(signOffSchema),
  attachments: z.array(attachmentViewSchema),
  papers: z.array(z.strictObject({ id: idField, kind: z.string(), number: z.string(), issuedAt: z.string(), supersededBy: z.string().nullable() })),
});
export type JobSheet = z.infer<typeof jobSheetSchema>;

export const FLOOR_SORTS = ['number', 'promisedOn', 'step', 'customer', 'receivedAt'] as const;
export const floorQuerySchema = z.strictObject({
  ...pageQuery,
  sort: z.enum(FLOOR_SORTS).default('promisedOn'),
  order: z.enum(['asc', 'desc']).default('asc'),
  step: z.enum(STEPS).optional(),
  state: z.enum([...JOB_STATES, 'not-ended', 'all']).default('not-ended'),
  late: z.enum(['yes']).optional(),
  q: lineField(80).optional(),
});
export type FloorQuery = z.infer<typeof floorQuerySchema>;

export const floorRowSchema = z.strictObject({
  id: idField,
  number: z.string(),
  customerName: z.string(),
  machine: z.string(),
  route: z.enum(ROUTES),
  step: z.enum(STEPS),
  state: z.enum(JOB_STATES),
  holdReason: z.string().nullable(),
  waitingFor: z.string().nullable(),
  promisedOn: z.string().nullable(),
  receivedAt: z.string(),
  late: z.boolean(),
  coreVerdict: z.string().nullable(),
});
export type FloorRow = z.infer<typeof floorRowSchema>;
export const floorPageSchema = pageOf(floorRowSchema);
export type FloorPage = z.infer<typeof floorPageSchema>;
export const floorStepsSchema = z.array(z.strictObject({ step: z.enum(STEPS), open: z.number().int(), onHold: z.number().int(), late: z.number().int() }));
export type FloorSteps = z.infer<typeof floorStepsSchema>;

export const createdJobSchema = z.strictObject({ id: idField, number: z.string() });
export type CreatedJob = z.infer<typeof createdJobSchema>;

export const searchHitSchema = z.strictObject({ kind: z.enum(['job', 'customer', 'machine', 'invoice']), id: idField, title: z.string(), detail: z.string(), path: z.string() });
export const searchQuerySchema = z.strictObject({ q: requiredLine(300, 'Type what you look for.') });
export type SearchQuery = z.infer<typeof searchQuerySchema>;
export const searchResultSchema = z.strictObject({ hits: z.array(searchHitSchema) });
export type SearchResult = z.infer<typeof searchResultSchema>;
export type SearchHit = z.infer<typeof searchHitSchema>;

export const historyEntrySchema = z.strictObject({
  id: idField,
  at: z.string(),
  who: z.string(),
  event: z.string(),
  words: z.string(),
  data: z.record(z.string(), z.unknown()),
});
export type HistoryEntryView = z.infer<typeof historyEntrySchema>;
export const historySchema = z.array(historyEntrySchema);
