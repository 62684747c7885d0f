import { z } from 'zod';
import { finite, idField, lineField } from './fields.js';
import { coreGeometrySchema } from './machines.js';

/** The readings of one ring-flux core test, as evaluateCoreTest of `@libs/core-loss` takes them (SI). */
export const ringReadingSchema = z.strictObject({
  excitingTurns: finite('A count of turns.'),
  searchTurns: finite('A count of turns.'),
  searchVoltsV: finite('A voltage.'),
  voltmeter: z.enum(['average', 'true-rms']),
  formFactor: finite('A number near 1.11.').optional(),
  excitingA: finite('A current.'),
  wattsW: finite('Watts as read.'),
  wattmeterLead: z.enum(['search', 'exciting']),
  cableResistanceOhm: finite('A resistance.').optional(),
  searchBurdenOhm: finite('A resistance.').optional(),
  frequencyHz: finite('A frequency.'),
});

export const coreTestTemperaturesSchema = z.strictObject({
  ambientC: finite('A temperature.'),
  startC: finite('A temperature.'),
  meanC: finite('A temperature.').optional(),
  coolestC: finite('A temperature.').optional(),
  hottestC: finite('A temperature.').optional(),
  hottestSlot: finite('A slot number.').optional(),
  minutes: finite('Minutes at full flux.'),
});

export const CORE_CHECKS = ['rotorOut', 'leadsOpen', 'parallelsOpened', 'onePointEarthed', 'throughBoltsMeasured', 'boreClear', 'barrierUp'] as const;

export const coreTestReadingsSchema = z.strictObject({
  geometry: coreGeometrySchema,
  target: z.strictObject({ basis: z.enum(['standard', 'winding', 'supply']), fluxDensityT: finite('A flux density.') }),
  frame: z.strictObject({ state: z.enum(['bare', 'in-frame']), material: z.enum(['cast-iron', 'steel', 'aluminium', 'none']) }),
  cablePath: z.enum(['bore-and-outside', 'over-frame', 'under-ribs', 'through-spider', 'through-shaft', 'through-vents']),
  massBasis: z.literal('back-iron'),
  reading: ringReadingSchema,
  temperatures: coreTestTemperaturesSchema,
  instruments: z.strictObject({
    voltmeterId: idField.optional(),
    ammeterId: idField.optional(),
    wattmeterId: idField.optional(),
    thermometerId: idField.optional(),
    wattmeterRange: lineField(40).optional(),
    clampMeter: z.boolean(),
  }),
  checks: z.strictObject(Object.fromEntries(CORE_CHECKS.map((c) => [c, z.boolean()])) as Record<(typeof CORE_CHECKS)[number], z.ZodBoolean>),
  /** the set-up that was chosen, kept for the next test and the certificate */
  setup: z.strictObject({ supplyId: lineField(40).optional(), cableId: lineField(40).optional(), parallelCables: z.number().int().min(1).max(12).optional() }).default({}),
  remark: lineField(400).default(''),
});
export type CoreTestReadings = z.infer<typeof coreTestReadingsSchema>;
