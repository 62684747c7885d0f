import { formatUsual } from '@libs/quantities';
import { z } from 'zod';
import { finite, requiredLine } from './fields.js';
import { limitDifferenceSchema } from './limit-differences.js';
import { outOfOrder } from './limit-order.js';
import { CORE_SOURCE_KEYS, LIMIT_ROWS, type LimitRow } from './limit-rows.js';
import type { BurnoutLimits, BurnoutSource, LimitsSet } from './limit-set.js';
import { at } from './limit-values.js';

export type { BurnoutLimits, BurnoutSource, LimitsSet };

export const STANDINGS = ['S', 'P', 'C'] as const;

const CORE_PLATE = 'ANSI/EASA AR100-2015 clause 3.3';
export const DEFAULT_BURNOUT_LIMITS: BurnoutLimits = {
  organicOrUnknownC: 370,
  inorganicC: 400,
  aluminiumFrameC: 300,
  source: 'ANSI/EASA AR100-2015 clause 3.3 (core plate); common practice (frame)',
  standing: 'S core plate, P frame; to be confirmed by the shop’s engineer',
  sources: {
    organicOrUnknownC: { source: CORE_PLATE, standing: 'S' },
    inorganicC: { source: CORE_PLATE, standing: 'S' },
    aluminiumFrameC: { source: 'Common practice: an aluminium frame is kept below its own softening', standing: 'P' },
  },
};

const figure = (row: LimitRow) => {
  const words = (value: number) => formatUsual(value / row.perShown, row.kind, 'si');
  return finite('A figure is needed.').refine((v) => v >= row.least && v <= row.most, `Between ${words(row.least)} and ${words(row.most)}.`);
};
const figuresOf = (group: LimitRow['group']) => LIMIT_ROWS.filter((row) => row.group === group);
const shape = <T>(rows: readonly LimitRow[], of: (row: LimitRow) => T): Record<string, T> => Object.fromEntries(rows.map((row) => [row.key, of(row)]));

const sourceText = requiredLine(300, 'Say where this limit comes from: standard and clause, or the shop’s practice.');
const standing = z.enum(STANDINGS, { error: 'Standard, common practice, or the customer’s contract.' });
const sourceSchema = z.strictObject({ source: sourceText, standing });

const setSchema = z.strictObject({
  core: z.strictObject({
    ...shape(figuresOf('core'), figure),
    decisionRule: z.enum(['ask', 'accept', 'refuse'], { error: 'Ask, let it pass, or hold it back.' }),
    sources: z.strictObject(Object.fromEntries(CORE_SOURCE_KEYS.map((key) => [key, sourceSchema]))),
  }),
  machine: z.strictObject(shape(figuresOf('machine'), (row) => z.strictObject({ value: figure(row), unit: z.literal(row.unit), source: sourceText, standing }))),
  burnout: z.strictObject({
    ...shape(figuresOf('burnout'), figure),
    // the line of all three together is written from these when the set is published
    sources: z.strictObject(shape(figuresOf('burnout'), () => sourceSchema)),
  }),
});

/** A whole set of limits as a person sets it: every figure there, possible at all, and none contradicting another. */
export const limitsSetSchema = setSchema.superRefine((set, context) => {
  for (const { path, message } of outOfOrder((path) => at(set, path))) context.addIssue({ code: 'custom', path: path.split('.'), message });
});

/** A new version: on which one it is built, why, and the set. */
export const publishLimitsSchema = z.strictObject({
  /** the version in force that was read; another one meanwhile is a conflict */
  baseVersion: z.number().int().min(1),
  note: requiredLine(400, 'Say why the limits change, and who decided it.'),
  set: limitsSetSchema,
  /** paths of sources that still stand although a figure under them changed */
  confirmedSources: z.array(z.string().max(80)).max(120).default([]),
});
export type PublishLimits = z.infer<typeof publishLimitsSchema>;
export type LimitsToPublish = PublishLimits['set'];

export const limitsVersionViewSchema = z.strictObject({
  version: z.number().int(),
  publishedAt: z.string(),
  publishedBy: z.string(),
  note: z.string(),
  set: z.record(z.string(), z.unknown()),
});
export type LimitsVersionView = z.infer<typeof limitsVersionViewSchema>;

export const limitsComparisonSchema = z.strictObject({ from: z.number().int(), to: z.number().int(), differences: z.array(limitDifferenceSchema) });
export type LimitsComparison = z.infer<typeof limitsComparisonSchema>;

type BurnoutSources = NonNullable<BurnoutLimits['sources']>;

/** The set as it is kept: what was set, and the sources of a strip's three limits in one line, as its record prints them. */
export function asKept(set: LimitsToPublish): LimitsSet {
  const burnout = set.burnout as Record<string, unknown> & { sources: BurnoutSources };
  return { ...set, burnout: { ...burnout, ...burnoutInOneLine(burnout.sources) } } as unknown as LimitsSet;
}

function burnoutInOneLine(sources: BurnoutSources): BurnoutSource {
  const plate = [...new Set([sources.organicOrUnknownC.source, sources.inorganicC.source])].join('; ');
  const standings = [...new Set([sources.organicOrUnknownC.standing, sources.inorganicC.standing])].join('/');
  return { source: `${plate} (core plate); ${sources.aluminiumFrameC.source} (frame)`.slice(0, 300), standing: `${standings} core plate, ${sources.aluminiumFrameC.standing} frame` };
}

