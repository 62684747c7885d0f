import { z } from 'zod';
import { dateField, finite, idField, instantField, lineField, pageOf, pageQuery, requiredLine, textField, versionField } from './fields.js';

/** A logger that writes every second fills some twenty megabytes in a night and a day. */
export const LOGGER_FILE_LIMIT_BYTES = 60 * 1024 * 1024;
/** More never stand in one oven. */
export const MOST_JOBS_OF_A_LOAD = 12;

const ovenField = requiredLine(40, 'Choose the oven.');
const jobOfLoad = z.strictObject({
  jobId: idField,
  /** only asked where the dismantling found them */
  ringsOff: z.boolean().default(false),
});
const loadFields = {
  ovenId: ovenField,
  day: dateField,
  jobs: z
    .array(jobOfLoad)
    .min(1, 'Choose the jobs that stand in the oven.')
    .max(MOST_JOBS_OF_A_LOAD, `At most ${MOST_JOBS_OF_A_LOAD} jobs stand in one load.`)
    .refine((jobs) => new Set(jobs.map((j) => j.jobId)).size === jobs.length, 'A job stands in the load once.'),
  remark: textField(600).default(''),
};

/** What goes into the oven together, said before it is lit. */
export const createLoadSchema = z.strictObject({
  ...loadFields,
  countedAndSampled: z.literal(true, { error: 'Count the wires at the cut and keep a sample coil of every job first; afterwards they are gone.' }),
});
export type CreateLoad = z.infer<typeof createLoadSchema>;

/** A correction keeps its reason; the kept file is read again and the load judged anew. */
export const correctLoadSchema = z.strictObject({
  version: versionField,
  reason: requiredLine(400, 'Why is it corrected?'),
  ...loadFields,
  /** names of the thermocouples that sat on the parts; null while there is no file */
  partChannels: z.array(lineField(200)).max(64).nullable(),
  /** added to every reading, for thermocouples that were found to read wrong */
  offsetK: finite('A difference in kelvin.').refine((v) => v >= -50 && v <= 50, 'Between -50 and 50 K. A thermocouple that is further off has measured nothing.'),
});
export type CorrectLoad = z.infer<typeof correctLoadSchema>;

/** What a logger's file leaves open may be said with it. */
export const loggerFileQuerySchema = z.strictObject({
  version: z.coerce.number().int().min(1),
  /** asked where the load has a file already: the new one takes its place */
  reason: lineField(400).default(''),
  elapsedUnit: z.enum(['s', 'min', 'h']).optional(),
  dateOrder: z.enum(['ymd', 'dmy', 'mdy']).optional(),
  unit: z.enum(['C', 'F', 'K']).optional(),
});
export type LoggerFileQuery = z.infer<typeof loggerFileQuerySchema>;

export const loadListQuerySchema = z.strictObject({ ...pageQuery, ovenId: lineField(40).optional() });
export type LoadListQuery = z.infer<typeof loadListQuerySchema>;

export const LOAD_VERDICTS = ['conforms', 'does-not-conform', 'inconclusive', 'not-valid'] as const;
export type LoadVerdict = (typeof LOAD_VERDICTS)[number];

/** Why the load is judged as it is; the screen makes words of it. */
export const loadReasonSchema = z.discriminatedUnion('code', [
  z.strictObject({ code: z.literal('over-limit'), channel: z.string(), peakC: z.number(), overK: z.number() }),
  z.strictObject({ code: z.literal('gap-may-hide-it'), channel: z.string(), fromMinute: z.number(), toMinute: z.number(), reachC: z.number().nullable() }),
  z.strictObject({ code: z.literal('too-few-rows'), channel: z.string() }),
  z.strictObject({ code: z.literal('never-hot'), channel: z.string(), peakC: z.number() }),
  z.strictObject({ code: z.literal('nothing-on-the-part') }),
]);
export type LoadReason = z.infer<typeof loadReasonSchema>;

export const PART_LIMIT_REASONS = ['inorganic', 'organic', 'unknown', 'aluminium'] as const;
export type PartLimitReason = (typeof PART_LIMIT_REASONS)[number];

const ownLimit = { limitC: z.number(), limitReason: z.enum(PART_LIMIT_REASONS) };
const jobName = { jobId: idField, number: z.string(), machine: z.string() };

const loadFigures = {
  id: idField,
  number: z.number().int(),
  ovenId: z.string(),
  ovenName: z.string(),
  day: dateField,
  ...ownLimit,
  fileName: z.string().nullable(),
  peakC: z.number().nullable(),
  hottest: z.string().nullable(),
  minutesAboveLimit: z.number().nullable(),
  minutesAbove345C: z.number().nullable(),
  /** null while there is no file */
  verdict: z.enum(LOAD_VERDICTS).nullable(),
  reasons: z.array(loadReasonSchema),
  by: z.string(),
  createdAt: instantField,
  version: versionField,
};
export const loadRowSchema = z.strictObject({ ...loadFigures, jobs: z.array(z.strictObject(jobName)) });
export type LoadRow = z.infer<typeof loadRowSchema>;
export const loadPageSchema = pageOf(loadRowSchema);
export type LoadPage = z.infer<typeof loadPageSchema>;

/** A load as one of its jobs sees it: judged by the load's limit, with its own beside it. */
export const jobLoadSchema = z.strictObject({ ...loadFigures, own: z.strictObject({ ...ownLimit, overK: z.number().nullable() }), others: z.number().int() });
export type JobLoad = z.infer<typeof jobLoadSchema>;
export const jobLoadsSchema = z.array(jobLoadSchema);

/** A job that stands before the oven. */
export const waitingJobSchema = z.strictObject({
  ...jobName,
  customer: z.string(),
  step: z.string(),
  onHold: z.boolean(),
  /** null: not dismantled yet, so that no limit is known */
  own: z.strictObject(ownLimit).nullable(),
  rings: z.boolean(),
  /** numbers of the loads it stood in already */
  loads: z.array(z.number().int()),
});
export type WaitingJob = z.infer<typeof waitingJobSchema>;
export const waitingJobsSchema = z.array(waitingJobSchema);

const channelHead = { name: z.string(), unit: z.enum(['C', 'F', 'K']), samples: z.number().int(), emptyCells: z.number().int(), onPart: z.boolean() };
export const loadChannelSchema = z.discriminatedUnion('outcome', [
  z.strictObject({
    outcome: z.literal('read'),
    ...channelHead,
    peakC: z.number(),
    peakAt: z.strictObject({ minute: z.number(), clock: z.string(), line: z.number().int() }),
    minutesAbove: z.array(z.strictObject({ limitC: z.number(), minutes: z.number(), unknownMinutes: z.number() })),
    rampKPerH: z.number().nullable(),
    coolKPerH: z.number().nullable(),
    gaps: z.array(z.strictObject({ fromMinute: z.number(), toMinute: z.number() })).nullable(),
    gapCount: z.number().int(),
    gapMinutes: z.number(),
    /** minute and °C, in order of time */
    curve: z.array(z.tuple([z.number(), z.number()])),
  }),
  z.strictObject({ outcome: z.literal('no-readings'), ...channelHead }),
]);
export type LoadChannel = z.infer<typeof loadChannelSchema>;

export const fileProblemSchema = z.strictObject({ code: z.string(), line: z.number().int(), channel: z.string().optional(), message: z.string() });
export type FileProblem = z.infer<typeof fileProblemSchema>;

export const loggerFileSchema = z.strictObject({
  name: z.string(),
  sizeBytes: z.number().int(),
  sha256: z.string(),
  readAt: instantField,
  rows: z.number().int(),
  minutes: z.number(),
  startClock: z.string(),
  endClock: z.string(),
  stepS: z.number().nullable(),
  separator: z.string(),
  decimalMark: z.string().nullable(),
  channels: z.array(loadChannelSchema),
  problems: z.array(fileProblemSchema),
  problemCount: z.number().int(),
});
export type LoggerFileView = z.infer<typeof loggerFileSchema>;

export const loadViewSchema = z.strictObject({
  ...loadFigures,
  remark: z.string(),
  offsetK: z.number(),
  limitSource: z.string(),
  limitStanding: z.string(),
  jobs: z.array(
    z.strictObject({
      ...jobName,
      customer: z.string(),
      ringsOff: z.boolean(),
      ...ownLimit,
      /** of the load's peak over the job's own limit; null while there is no file */
      overK: z.number().nullable(),
      /** its dismantling or its limits were changed since: judge the load again */
      limitChanged: z.boolean(),
    }),
  ),
  file: loggerFileSchema.nullable(),
});
export type LoadView = z.infer<typeof loadViewSchema>;
