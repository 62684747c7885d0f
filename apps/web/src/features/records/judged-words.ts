import type { MachineTest, TestJudgement } from '@libs/machine-tests';
import { formatQuantity, formatUsual, type UnitSystem } from '@libs/quantities';
import { t } from './text.js';

/** Insulation to three figures: 792 MΩ, 9.15 MΩ. */
export const megohms = (ohm: number, system: UnitSystem): string => formatQuantity(ohm, 'resistance-mega', system, { significant: 3 });

/** A judged figure in the person's units. */
export function figureOf({ test, unit }: Pick<TestJudgement, 'test' | 'unit'>, si: number, system: UnitSystem): string {
  if (test === 'polarization-index') return formatQuantity(si, 'number', system, { significant: 3 });
  switch (unit) {
    case 'Ω':
      return megohms(si, system);
    case 'V':
      return formatUsual(si, 'voltage', system);
    case 'A':
      return formatUsual(si, 'current', system);
    case 'K':
      return formatUsual(si, 'temperature-difference', system);
    case 'm/s':
      return formatUsual(si, 'vibration-velocity', system);
    case 'W/kg':
      return formatUsual(si, 'specific-loss', system);
    default:
      return formatUsual(si, 'percent', system);
  }
}

const AT_LEAST: readonly MachineTest[] = ['insulation-resistance', 'insulation-new-winding', 'polarization-index'];

/** The limit, and which side of it is the right one; empty for a yes or a no. */
export function limitWords(judgement: TestJudgement, system: UnitSystem): string {
  if (judgement.limit === null) return '';
  const limit = figureOf(judgement, judgement.limit, system);
  if (judgement.test === 'high-potential') return t('limitAsked', { limit });
  return t(AT_LEAST.includes(judgement.test) ? 'limitAtLeast' : 'limitAtMost', { limit });
}
