import { CORRECTION_RANGE_C, insulationCorrectionTo40C, insulationTestVolts, type CorrectionRule, type InsulationReading } from '@libs/machine-tests';
import { formatUsual, type UnitSystem } from '@libs/quantities';
import { megohms } from './judged-words.js';
import { t } from './text.js';

/** One reading by both rules, so that nobody is surprised by the other; null until there is a reading. */
export function bothRulesWords(r: Pick<InsulationReading, 'resistanceOhm' | 'windingTemperatureC'>, system: UnitSystem): string | null {
  if (!(r.resistanceOhm > 0) || !Number.isFinite(r.windingTemperatureC)) return null;
  const by = (rule: CorrectionRule) => {
    const [least, most] = CORRECTION_RANGE_C[rule];
    const holds = r.windingTemperatureC >= least && r.windingTemperatureC <= most;
    return holds ? megohms(r.resistanceOhm * insulationCorrectionTo40C(r.windingTemperatureC, rule), system) : t('ruleNotHere');
  };
  return t('bothRules', { halving: by('halving'), thermosetting: by('thermosetting') });
}

export interface AskedTestVolts {
  readonly leastV: number;
  readonly words: string;
}
/** The DC volts such a winding is tested with, in words; null while the rated volts are not there. */
export function testVoltsAsked(ratedVoltageV: number, system: UnitSystem): AskedTestVolts | null {
  if (!(ratedVoltageV > 0) || !Number.isFinite(ratedVoltageV)) return null;
  const { leastV, mostV } = insulationTestVolts(ratedVoltageV);
  const volts = (v: number) => formatUsual(v, 'voltage', system);
  return { leastV, words: t('testVoltsHelp', { volts: leastV === mostV ? volts(leastV) : t('testVoltsRange', { least: volts(leastV), most: volts(mostV) }) }) };
}

const SURGE_BELOW_V = 1000;
/** Usual peak of a surge test of a random-wound winding below a thousand volts (common practice); null where it is not known. */
export const usualSurgePeakV = ({ windingKind, ratedVoltageV }: Pick<InsulationReading, 'windingKind' | 'ratedVoltageV'>): number | null =>
  windingKind === 'random-wound' && ratedVoltageV > 0 && ratedVoltageV < SURGE_BELOW_V ? 2 * ratedVoltageV + 1000 : null;
