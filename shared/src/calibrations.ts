import { z } from 'zod';
import { dateField, finite, idField, instantField, lineField, pageOf, pageQuery, textField, versionField } from './fields.js';
import { instrumentViewSchema } from './instruments.js';
import { RECORD_KINDS } from './records.js';
import { JOB_STATES } from './route.js';

/** How a laboratory found an instrument before it touched anything. */
export const AS_FOUND = ['within', 'outside', 'not-stated'] as const;
export type AsFound = (typeof AS_FOUND)[number];

const percent = finite('Percent.').refine((v) => v >= 0 && v <= 100, '0 to 100.');
const calibrationFields = {
  calibratedOn: dateField,
  dueOn: dateField,
  certificateNumber: lineField(60).default(''),
  laboratory: lineField(120).default(''),
  asFound: z.enum(AS_FOUND, { error: 'Choose what the certificate says.' }),
  /** what was off, and by how much */
  asFoundWords: textField(600).default(''),
  percentOfReading: percent,
  percentOfRange: percent,
};

/** A calibration is written down once; a mistake in it is put right by the next entry. */
export const addCalibrationSchema = z
  .strictObject({ /** of the instrument as it was read */ version: versionField, ...calibrationFields })
  .superRefine((c, context) => {
    if (c.dueOn <= c.calibratedOn) context.addIssue({ code: 'custom', path: ['dueOn'], message: 'After the day of the calibration.' });
    if (c.asFound === 'outside' && c.asFoundWords === '') context.addIssue({ code: 'custom', path: ['asFoundWords'], message: 'Say what was off, and by how much: the records are judged by it.' });
  });
export type AddCalibration = z.infer<typeof addCalibrationSchema>;

const certificateSchema = z.strictObject({ id: idField, name: z.string(), sizeBytes: z.number().int(), by: z.string(), at: instantField });
export type CertificateFileView = z.infer<typeof certificateSchema>;

export const calibrationViewSchema = z.strictObject({
  id: idField,
  ...calibrationFields,
  /** what was measured from here on is in doubt when it was found outside; null when nothing is known before */
  doubtFrom: dateField.nullable(),
  /** a later entry of the same day took its place */
  superseded: z.boolean(),
  by: z.string(),
  at: instantField,
  certificate: certificateSchema.nullable(),
});
export type CalibrationView = z.infer<typeof calibrationViewSchema>;

export const instrumentDueSchema = z.strictObject({
  ...instrumentViewSchema.shape,
  /** days until it is due; negative when it is past */
  daysLeft: z.number().int(),
  /** past the days of grace: what is measured with it does not count */
  notCounted: z.boolean(),
});
export type InstrumentDue = z.infer<typeof instrumentDueSchema>;
export const instrumentDueListSchema = z.array(instrumentDueSchema);

export const instrumentDetailSchema = z.strictObject({ instrument: instrumentDueSchema, calibrations: z.array(calibrationViewSchema) });
export type InstrumentDetail = z.infer<typeof instrumentDetailSchema>;

/** Records by an instrument, in a period of calendar days of the shop, both included. */
export const measuredQuerySchema = z
  .strictObject({ ...pageQuery, from: dateField.optional(), to: dateField.optional() })
  .refine((q) => q.from === undefined || q.to === undefined || q.from <= q.to, { path: ['to'], message: 'Not before the first day.' });
export type MeasuredQuery = z.infer<typeof measuredQuerySchema>;

export const measuredRowSchema = z.strictObject({
  recordId: idField,
  kind: z.enum(RECORD_KINDS),
  ordinal: z.number().int(),
  revision: z.number().int(),
  /** a later revision without this instrument took its place */
  superseded: z.boolean(),
  verdict: z.string().nullable(),
  at: instantField,
  by: z.string(),
  jobId: idField,
  jobNumber: z.string(),
  jobState: z.enum(JOB_STATES),
  customerName: z.string(),
  machine: z.string(),
  /** number of the certificate the customer holds, when one was issued */
  certificateNumber: z.string().nullable(),
  dueOnThen: dateField,
  overdueThen: z.boolean(),
});
export type MeasuredRow = z.infer<typeof measuredRowSchema>;
export const measuredPageSchema = pageOf(measuredRowSchema);
export type MeasuredPage = z.infer<typeof measuredPageSchema>;
