import { z } from 'zod';
import { dateField, finite, instantField, lineField, requiredLine } from './fields.js';

/** What the bay has besides its instruments: supplies for the loop cable, the cables themselves, ovens. */
export const EQUIPMENT_LISTS = ['supplies', 'cables', 'ovens'] as const;
export type EquipmentList = (typeof EQUIPMENT_LISTS)[number];
const MOST_OF_A_LIST = 40;

/** Null for something new: the server names it. Records refer to it by this name ever after. */
const ownId = z.string().regex(/^[0-9A-Za-z-]{1,40}$/, 'Not something of this bay.').nullable();
const name = requiredLine(80, 'Give it the name that stands on it.');
const between = (least: number, most: number, words: string) => finite(words).refine((v) => v >= least && v <= most, words);

const supplySchema = z
  .strictObject({
    id: ownId,
    name,
    kind: z.enum(['variable', 'taps'], { error: 'Variable, or with taps.' }),
    minVoltsV: between(0, 1000, 'Between 0 and 1000 V.'),
    maxVoltsV: between(1, 1000, 'Between 1 and 1000 V.'),
    maxAmpsA: between(0.1, 5000, 'Between 0.1 and 5000 A.'),
    frequencyHz: between(10, 400, 'Between 10 and 400 Hz.'),
    /** each tap in volts, the lowest first; only of a supply with taps */
    tapsV: z.array(between(1, 1000, 'Between 1 and 1000 V.')).max(60, 'At most 60 taps.').optional(),
  })
  .superRefine((s, context) => {
    const say = (path: string, message: string) => context.addIssue({ code: 'custom', path: [path], message });
    if (s.kind === 'variable') {
      if (s.tapsV) say('tapsV', 'A variable supply has no taps.');
      if (s.minVoltsV >= s.maxVoltsV) say('minVoltsV', 'Below the highest voltage.');
      return;
    }
    if (!s.tapsV || s.tapsV.length === 0) return say('tapsV', 'List the taps, in volts.');
    if (s.tapsV.some((v, i) => i > 0 && v <= s.tapsV![i - 1]!)) return say('tapsV', 'Each tap once, the lowest first.');
    if (s.minVoltsV !== s.tapsV[0]) say('minVoltsV', 'The lowest tap.');
    if (s.maxVoltsV !== s.tapsV.at(-1)) say('maxVoltsV', 'The highest tap.');
  });

const cableSchema = z.strictObject({
  id: ownId,
  name,
  crossSectionM2: between(0.5e-6, 1000e-6, 'Between 0.5 and 1000 mm².'),
  lengthM: between(0.5, 500, 'Between 0.5 and 500 m.'),
  maxAmpsA: between(1, 3000, 'Between 1 and 3000 A.'),
});

const ovenSchema = z
  .strictObject({
    id: ownId,
    name,
    /** what this oven may and may not do, in the shop's words */
    remark: lineField(300).default(''),
    /** when its control thermocouple was last held against a calibrated one */
    thermocoupleCheckedOn: dateField.nullable().default(null),
    /** reads this much too high (+) or too low (−) */
    thermocoupleOffsetK: between(-50, 50, 'Between −50 and 50 K. A thermocouple that is further off is replaced.').nullable().default(null),
  })
  .superRefine((oven, context) => {
    if (oven.thermocoupleOffsetK !== null && oven.thermocoupleCheckedOn === null) context.addIssue({ code: 'custom', path: ['thermocoupleCheckedOn'], message: 'On which day was it found?' });
  });

const fold = (words: string): string => words.toLowerCase().replace(/\s+/g, ' ');

/** A list in which two things of one name would be taken for one another on a record. */
function listOf<T extends z.ZodType<{ id: string | null; name: string }>>(item: T) {
  return z
    .array(item)
    .max(MOST_OF_A_LIST, `At most ${MOST_OF_A_LIST}.`)
    .superRefine((list, context) => {
      const twice = (key: 'id' | 'name', message: string) =>
        list.forEach((one, i) => {
          const value = one[key];
          if (value !== null && list.some((other, j) => j < i && other[key] !== null && fold(other[key]!) === fold(value))) context.addIssue({ code: 'custom', path: [i, key], message });
        });
      twice('name', 'Another one has this name already.');
      twice('id', 'This stands in the list twice.');
    });
}

/** The whole lists as they shall be; what is left out goes. */
export const saveEquipmentSchema = z.strictObject({
  /** as read; 0 while nothing was ever saved */
  version: z.number().int().min(0),
  supplies: listOf(supplySchema),
  cables: listOf(cableSchema),
  ovens: listOf(ovenSchema),
});
export type SaveEquipment = z.infer<typeof saveEquipmentSchema>;

const known = { id: z.string() };
const supplyViewSchema = z.strictObject({ ...known, name: z.string(), kind: z.enum(['variable', 'taps']), minVoltsV: z.number(), maxVoltsV: z.number(), maxAmpsA: z.number(), frequencyHz: z.number(), tapsV: z.array(z.number()).optional() });
const cableViewSchema = z.strictObject({ ...known, name: z.string(), crossSectionM2: z.number(), lengthM: z.number(), maxAmpsA: z.number() });
const ovenViewSchema = z.strictObject({ ...known, name: z.string(), remark: z.string(), thermocoupleCheckedOn: dateField.nullable(), thermocoupleOffsetK: z.number().nullable() });

export const equipmentViewSchema = z.strictObject({
  version: z.number().int(),
  supplies: z.array(supplyViewSchema),
  cables: z.array(cableViewSchema),
  ovens: z.array(ovenViewSchema),
  /** what older records may still name */
  removed: z.array(z.strictObject({ ...known, list: z.enum(EQUIPMENT_LISTS), name: z.string(), removedOn: dateField })),
  /** the last changes, the newest first */
  changes: z.array(z.strictObject({ at: instantField, who: z.string(), words: z.string() })),
});
export type EquipmentView = z.infer<typeof equipmentViewSchema>;
export type SupplyView = z.infer<typeof supplyViewSchema>;
export type CableView = z.infer<typeof cableViewSchema>;
export type OvenView = z.infer<typeof ovenViewSchema>;
