import { z } from 'zod';
import { finite, lineField, textField } from './fields.js';

const positive = (words: string) => finite(words).refine((v) => v > 0, 'More than 0.');

/** A winding as found or as wound (thin): what is needed to copy it. */
export const windingReadingsSchema = z.strictObject({
  slots: z.number().int().min(6).max(400),
  poles: z.number().int().min(2).max(120),
  layers: z.union([z.literal(1), z.literal(2)]),
  coils: z.number().int().min(1).max(400),
  turnsPerCoil: positive('Turns of a coil.'),
  /** first slot to slot, as the trade says it: 1-13 is a span of 12 */
  spanFrom: z.literal(1),
  spanTo: z.number().int().min(2).max(200),
  grouping: lineField(80),
  connection: z.enum(['star', 'delta', 'single', 'dc']),
  circuits: z.number().int().min(1).max(60),
  wires: z
    .array(z.strictObject({ strands: z.number().int().min(1).max(200), bareDiameterM: positive('Bare diameter.') }))
    .min(1, 'At least one wire size.')
    .max(3),
  coilExtensionM: positive('Extension beyond the core.').nullable(),
  meanTurnM: positive('Mean turn.').nullable(),
  leads: lineField(80).default(''),
  remark: textField(600).default(''),
});
export type WindingReadings = z.infer<typeof windingReadingsSchema>;
