import { z } from 'zod';
import { dateField, finite, idField, lineField, requiredLine, versionField } from './fields.js';

export const INSTRUMENT_KINDS = ['voltmeter', 'ammeter', 'wattmeter', 'thermometer', 'insulation-tester', 'micro-ohmmeter', 'high-potential-tester', 'surge-tester', 'vibration-meter', 'tachometer', 'clamp-meter'] as const;
const instrumentFields = {
  tag: requiredLine(20, 'The tag on the instrument.'),
  kind: z.enum(INSTRUMENT_KINDS),
  description: lineField(120).default(''),
  serial: lineField(60).default(''),
  /** limits of error as the maker states them */
  percentOfReading: finite('Percent.').refine((v) => v >= 0 && v <= 100, '0 to 100.'),
  percentOfRange: finite('Percent.').refine((v) => v >= 0 && v <= 100, '0 to 100.'),
  rangeText: lineField(60).default(''),
  calibratedOn: dateField,
  dueOn: dateField,
  certificateNumber: lineField(60).default(''),
};
export const createInstrumentSchema = z.strictObject(instrumentFields);
export type CreateInstrument = z.infer<typeof createInstrumentSchema>;
export const updateInstrumentSchema = z.strictObject({ ...instrumentFields, version: versionField });
export type UpdateInstrument = z.infer<typeof updateInstrumentSchema>;
export const instrumentViewSchema = z.strictObject({ ...instrumentFields, id: idField, version: versionField, standing: z.enum(['in-calibration', 'due-soon', 'overdue']) });
export type InstrumentView = z.infer<typeof instrumentViewSchema>;

export const bayViewSchema = z.strictObject({
  supplies: z.array(z.strictObject({ id: z.string(), name: z.string(), kind: z.enum(['variable', 'taps']), minVoltsV: z.number(), maxVoltsV: z.number(), maxAmpsA: z.number(), frequencyHz: z.number(), tapsV: z.array(z.number()).optional() })),
  cables: z.array(z.strictObject({ id: z.string(), name: z.string(), crossSectionM2: z.number(), lengthM: z.number(), maxAmpsA: z.number() })),
  ovens: z.array(z.strictObject({ id: z.string(), name: z.string(), remark: z.string() })),
  instruments: z.array(instrumentViewSchema),
});
export type BayView = z.infer<typeof bayViewSchema>;
