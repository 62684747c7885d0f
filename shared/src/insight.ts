import { z } from 'zod';
import { dateField, finite, idField, lineField, requiredLine } from './fields.js';

/** How one oven treats the cores: the change of core loss, job by job, as a chart of individuals and moving ranges. */
export const CHART_RULES = ['one-beyond-3-sigma', 'two-of-three-beyond-2-sigma', 'four-of-five-beyond-1-sigma', 'eight-on-one-side', 'six-rising', 'six-falling'] as const;
export type ChartRule = (typeof CHART_RULES)[number];

export const ovenListSchema = z.array(z.strictObject({ id: z.string(), name: z.string(), remark: z.string() }));
export type OvenList = z.infer<typeof ovenListSchema>;

/** The jobs the limits are made from, by position from 1; the first twenty unless told. */
export const ovenChartQuerySchema = z
  .strictObject({ baseFirst: z.coerce.number().int().min(1).optional(), baseLast: z.coerce.number().int().min(1).optional() })
  .refine((q) => (q.baseFirst === undefined) === (q.baseLast === undefined), { message: 'Name both ends of the base period, or none.', path: ['baseLast'] });
export type OvenChartQuery = z.infer<typeof ovenChartQuerySchema>;

export const ovenPointSchema = z.strictObject({
  position: z.number().int(),
  day: dateField,
  /** of the core loss at one flux, as a fraction of the test before */
  change: z.number(),
  /** null where it was entered from an older book */
  job: z.strictObject({ id: idField, number: z.string(), machine: z.string() }).nullable(),
  entry: z.strictObject({ id: idField, remark: z.string(), by: z.string() }).nullable(),
  overLimit: z.boolean(),
  inBase: z.boolean(),
  sigmas: z.number().nullable(),
  movingRange: z.number().nullable(),
  hits: z.array(z.strictObject({ rule: z.enum(CHART_RULES), words: z.string() })),
  rangeBeyondLimit: z.boolean(),
});
export type OvenPoint = z.infer<typeof ovenPointSchema>;

export const ovenChartSchema = z.discriminatedUnion('outcome', [
  z.strictObject({
    outcome: z.literal('chart'),
    centre: z.number(),
    sigma: z.number(),
    lowerLimit: z.number(),
    upperLimit: z.number(),
    meanMovingRange: z.number(),
    movingRangeLimit: z.number(),
    base: z.strictObject({ first: z.number().int(), last: z.number().int() }),
    provisional: z.boolean(),
  }),
  z.strictObject({ outcome: z.enum(['too-few-points', 'no-variation']), message: z.string(), basePoints: z.number().int() }),
]);

export const LEFT_OUT_REASONS = ['not-tested-yet', 'not-valid', 'increase-not-established', 'repaired-first'] as const;
export type LeftOutReason = (typeof LEFT_OUT_REASONS)[number];

export const ovenInsightSchema = z.strictObject({
  oven: z.strictObject({ id: z.string(), name: z.string(), remark: z.string() }),
  /** a core fails above this; of the limits in force */
  increaseLimit: z.number(),
  chart: ovenChartSchema,
  points: z.array(ovenPointSchema),
  /** position of the first point after the base period at which the chart speaks */
  spokeAt: z.number().int().nullable(),
  /** position of the first core over the limit */
  failedAt: z.number().int().nullable(),
  leftOut: z.array(z.strictObject({ job: z.strictObject({ id: idField, number: z.string(), machine: z.string() }), day: dateField, reason: z.enum(LEFT_OUT_REASONS) })),
  rules: z.array(z.strictObject({ rule: z.enum(CHART_RULES), words: z.string(), source: z.string(), standing: z.string() })),
});
export type OvenInsight = z.infer<typeof ovenInsightSchema>;

/** What an older book says of an oven: plain numbers, in order. */
export const addOvenHistorySchema = z.strictObject({
  rows: z
    .array(
      z.strictObject({
        day: dateField,
        change: finite('The change as a fraction: 0.012 is 1.2 %.').refine((v) => v > -1 && v <= 10, 'Between -100 and 1000 %.'),
        remark: lineField(120).default(''),
      }),
    )
    .min(1, 'Enter at least one figure.')
    .max(200, 'At most 200 figures at a time.'),
});
export type AddOvenHistory = z.infer<typeof addOvenHistorySchema>;

export const withdrawOvenHistorySchema = z.strictObject({ reason: requiredLine(400, 'Why is it taken back?') });
export type WithdrawOvenHistory = z.infer<typeof withdrawOvenHistorySchema>;
