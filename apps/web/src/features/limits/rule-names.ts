import { t } from './text.js';

/** What an inconclusive result does at a gate. */
export const RULES = ['ask', 'accept', 'refuse'] as const;
export type Rule = (typeof RULES)[number];
const isRule = (rule: string): rule is Rule => (RULES as readonly string[]).includes(rule);
export const ruleName = (rule: string): string => (isRule(rule) ? t(rule) : rule);
export const ruleHelp = (rule: string): string => (isRule(rule) ? t(`help-${rule}`) : '');
export const RULE_OPTIONS = RULES.map((value) => ({ value, label: t(value) }));
export const STANDING_OPTIONS = (['S', 'P', 'C'] as const).map((value) => ({ value, label: t(value) }));
