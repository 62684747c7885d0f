import { z } from 'zod';
import { CORE_LIMIT_NAMES } from './limit-names.js';
import { LIMIT_ROWS, RULE_PATH, type LimitRow } from './limit-rows.js';
import { limitWords, ruleOf, ruleWords, sourceOf, valueOf } from './limit-values.js';

const sideSchema = z.strictObject({
  /** as kept, in SI; null for a word, or where this version has none */
  value: z.number().nullable(),
  words: z.string(),
  source: z.string(),
  standing: z.string(),
});
export const limitDifferenceSchema = z.strictObject({
  path: z.string(),
  name: z.string(),
  group: z.enum(['core', 'burnout', 'machine']),
  from: sideSchema,
  to: sideSchema,
  valueChanged: z.boolean(),
  sourceChanged: z.boolean(),
});
export type LimitDifference = z.infer<typeof limitDifferenceSchema>;
type Side = z.infer<typeof sideSchema>;

function sideOf(set: unknown, row: LimitRow): Side {
  const value = valueOf(set, row);
  const source = sourceOf(set, row);
  return { value: value ?? null, words: value === undefined ? '–' : limitWords(value, row), source: source?.source ?? '', standing: source?.standing ?? '' };
}

const sameSource = (a: Side, b: Side): boolean => a.source === b.source && a.standing === b.standing;

/** What two sets of limits do not have in common, figure by figure, in the order they are read. */
export function limitDifferences(from: unknown, to: unknown): LimitDifference[] {
  const figures = LIMIT_ROWS.flatMap((row) => {
    const [a, b] = [sideOf(from, row), sideOf(to, row)];
    const [valueChanged, sourceChanged] = [a.value !== b.value, !sameSource(a, b)];
    return valueChanged || sourceChanged ? [{ path: row.valuePath, name: row.name, group: row.group, from: a, to: b, valueChanged, sourceChanged }] : [];
  });
  const [before, after] = [ruleOf(from), ruleOf(to)];
  if (before === after) return figures;
  const word = (rule: string): Side => ({ value: null, words: ruleWords(rule), source: '', standing: '' });
  return [...figures, { path: RULE_PATH, name: CORE_LIMIT_NAMES.decisionRule, group: 'core', from: word(before), to: word(after), valueChanged: true, sourceChanged: false }];
}

/** One difference in a line: `Hot spot over the core mean, at most: 10.0 K → 8.0 K`. */
export const differenceWords = ({ name, from, to, valueChanged }: LimitDifference): string => (valueChanged ? `${name}: ${from.words} → ${to.words}` : `${name}: source noted anew`);

/**
 * Paths of the sources that must be looked at: a figure under them changed, and neither was the text written anew nor
 * did anybody say that it still stands.
 */
export function sourcesToLookAt(from: unknown, to: unknown, confirmed: readonly string[]): string[] {
  const open = limitDifferences(from, to).flatMap((d) => {
    const sourcePath = LIMIT_ROWS.find((row) => row.valuePath === d.path)?.sourcePath;
    return d.valueChanged && d.to.value !== null && !d.sourceChanged && sourcePath && !confirmed.includes(sourcePath) ? [sourcePath] : [];
  });
  return [...new Set(open)];
}
