import { formatUsual, type UnitSystem } from '@libs/quantities';
import { RULE_PATH, type LimitRow } from './limit-rows.js';

export interface LimitSourceText {
  readonly source: string;
  readonly standing: string;
}

/** What stands at a path of a published set; sets of earlier days may lack what came later. */
export function at(set: unknown, path: string): unknown {
  return path.split('.').reduce<unknown>((value, key) => (typeof value === 'object' && value !== null ? (value as Record<string, unknown>)[key] : undefined), set);
}

export function valueOf(set: unknown, row: LimitRow): number | undefined {
  const value = at(set, row.valuePath);
  return typeof value === 'number' && Number.isFinite(value) ? value : undefined;
}

/** Where a figure comes from; undefined where the shop alone decides. */
export function sourceOf(set: unknown, row: LimitRow): LimitSourceText | undefined {
  if (row.sourcePath === null) return undefined;
  const found = (at(set, row.sourcePath) ?? (row.group === 'burnout' ? at(set, 'burnout') : undefined)) as Partial<LimitSourceText> | undefined;
  return typeof found?.source === 'string' ? { source: found.source, standing: found.standing ?? '' } : undefined;
}

export const ruleOf = (set: unknown): string => String(at(set, RULE_PATH) ?? 'ask');

/** A limit as it is read: `20.0 %`, `7.20 W/kg`. */
export const limitWords = (value: number, row: LimitRow, units: UnitSystem = 'si'): string => formatUsual(value / row.perShown, row.kind, units);

/** What an inconclusive result does at a gate, in words. */
export const RULE_WORDS: Record<string, string> = { ask: 'ask a person', accept: 'let it pass', refuse: 'hold it back' };
export const ruleWords = (rule: string): string => RULE_WORDS[rule] ?? rule;

/** What stands behind a limit, in words. */
const STANDING_WORDS: Record<string, string> = { S: 'standard', P: 'common practice', C: 'customer’s contract' };
export const standingWords = (standing: string): string => STANDING_WORDS[standing] ?? standing;
