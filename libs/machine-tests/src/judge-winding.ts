import { judgeLowerLimit, judgeRange, judgeUpperLimit, type Verdict } from '@libs/measurement';
import { figureWords, megohmWords, percentWords } from './figure-words.js';
import { insulationCorrectionTo40C, insulationMinimum, polarizationIndex } from './insulation.js';
import type { MachineTest, TestJudgement } from './judgement.js';
import { DEFAULT_MACHINE_TEST_LIMITS, type MachineTestLimit, type MachineTestLimits } from './limits.js';
import type { InsulationReading, WindingResistanceReading } from './readings.js';
import { meanOf, resistanceAt, unbalanceFraction } from './winding-resistance.js';

export const judgement = (test: MachineTest, row: MachineTestLimit, measured: number | null, verdict: Verdict, words: string): TestJudgement => ({
  test,
  measured,
  unit: measured === null ? '' : row.unit,
  limit: measured === null ? null : row.value,
  verdict,
  source: row.source,
  standing: row.standing,
  words,
});

/** A yes or a no: there is no limit to print. */
export const yesOrNo = (test: MachineTest, right: boolean, source: string, words: { right: string; wrong: string }): TestJudgement => ({
  test,
  measured: null,
  unit: '',
  limit: null,
  verdict: right ? 'conforms' : 'does-not-conform',
  source,
  standing: 'P',
  words: right ? words.right : words.wrong,
});

export interface InsulationDerived {
  correctionFactor: number;
  correctedTo40Ohm: number;
  minimumOhm: number;
  polarizationIndex: number | null;
}

export function deriveInsulation(r: InsulationReading, limits: MachineTestLimits): InsulationDerived {
  const correctionFactor = insulationCorrectionTo40C(r.windingTemperatureC, r.correctionRule);
  return {
    correctionFactor,
    correctedTo40Ohm: correctionFactor * r.resistanceOhm,
    minimumOhm: insulationMinimum(r, limits).value,
    polarizationIndex: r.tenMinuteResistanceOhm === undefined ? null : polarizationIndex(r.resistanceOhm, r.tenMinuteResistanceOhm),
  };
}

const RULE_WORDS = { halving: 'halving rule', thermosetting: 'thermosetting rule of 2013' };

function judgeAt40(test: MachineTest, r: InsulationReading, d: InsulationDerived, row: MachineTestLimit): TestJudgement {
  const verdict = judgeLowerLimit(d.correctedTo40Ohm, 0, row.value);
  const found = `${megohmWords(d.correctedTo40Ohm)} at 40 °C by the ${RULE_WORDS[r.correctionRule]}`;
  const words = verdict === 'conforms' ? `${found}, at least ${megohmWords(row.value)} asked.` : `${found}, ${megohmWords(row.value)} asked. Clean and dry the winding, then test again.`;
  return judgement(test, row, d.correctedTo40Ohm, verdict, words);
}

/** The minimum of the standard, and the index of a form-wound winding when ten minutes were waited. */
export function judgeInsulation(r: InsulationReading, d: InsulationDerived, limits: MachineTestLimits): TestJudgement[] {
  const judgements = [judgeAt40('insulation-resistance', r, d, insulationMinimum(r, limits))];
  const row = limits.polarizationIndex;
  if (r.windingKind === 'form-wound' && d.polarizationIndex !== null && d.correctedTo40Ohm <= limits.polarizationIndexNotAboveOhm.value) {
    const verdict = judgeLowerLimit(d.polarizationIndex, 0, row.value);
    const found = `Ten minutes over one minute is ${figureWords(d.polarizationIndex)}, at least ${row.value} asked.`;
    judgements.push(judgement('polarization-index', row, d.polarizationIndex, verdict, verdict === 'conforms' ? found : `${found} The winding is damp or dirty: dry it, then test again.`));
  }
  return judgements;
}

/** A new winding of wire or coils is asked for more than the standard's minimum. Armatures and fields are not. */
export function judgeNewWinding(r: InsulationReading, d: InsulationDerived, limits: MachineTestLimits): TestJudgement[] {
  if (r.windingKind !== 'random-wound' && r.windingKind !== 'form-wound') return [];
  return [judgeAt40('insulation-new-winding', r, d, limits.insulationNewWindingOhm)];
}

export interface WindingResistanceDerived {
  meanOhm: number;
  meanAt20COhm: number;
  unbalanceFraction: number;
}

export const deriveWindingResistance = (r: WindingResistanceReading): WindingResistanceDerived => ({
  meanOhm: meanOf(r.resistancesOhm),
  meanAt20COhm: resistanceAt(meanOf(r.resistancesOhm), r.windingTemperatureC, 20),
  unbalanceFraction: unbalanceFraction(r.resistancesOhm),
});

/** Concentric coils differ by nature: beyond the limit the engineer is asked, the winding is not refused. */
export function judgeWindingResistance(r: WindingResistanceReading, d: WindingResistanceDerived, limits: MachineTestLimits): TestJudgement {
  const row = r.construction === 'form-wound' ? limits.unbalanceForm : limits.unbalanceRandom;
  const plain = judgeUpperLimit(d.unbalanceFraction, 0, row.value);
  const verdict = plain === 'does-not-conform' && r.construction === 'concentric' ? 'inconclusive' : plain;
  const found = `The three differ from their mean by up to ${percentWords(d.unbalanceFraction)}, ${percentWords(row.value)} allowed.`;
  const next = {
    conforms: '',
    inconclusive: ' Concentric coils may differ more: ask the engineer.',
    'does-not-conform': ' Check joints, turns and connection.',
    'not-valid': ' Measure again.',
  }[verdict];
  return judgement('winding-resistance-balance', row, d.unbalanceFraction, verdict, `${found}${next}`);
}

/**
 * The new winding's resistance against the one found, both carried to 20 °C. Outside the band it asks; it refuses nothing.
 *
 * `d = R_new,20 / R_found,20 − 1`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | R_new | `asWound` | Ω, °C | three readings, each more than 0 |
 * | R_found | `asFound` | Ω, °C | three readings, each more than 0 |
 * | – | `limits` | 1 | the shop's: −5 % to +3 % |
 *
 * @returns a judgement: conforms or inconclusive (ask); `measured` is the difference, `limit` the side it is near
 * @throws OutOfRangeError when a resistance is not more than 0
 *
 * Source: rewind target of the trade. Standing: common practice.
 * @example
 * judgeAgainstAsFound({ resistancesOhm: [1, 1, 1], windingTemperatureC: 20, construction: 'random-wound' }, { resistancesOhm: [0.9, 0.9, 0.9], windingTemperatureC: 20, construction: 'random-wound' }).verdict
 * // → 'inconclusive'
 */
export function judgeAgainstAsFound(asWound: WindingResistanceReading, asFound: WindingResistanceReading, limits: MachineTestLimits = DEFAULT_MACHINE_TEST_LIMITS): TestJudgement {
  const difference = deriveWindingResistance(asWound).meanAt20COhm / deriveWindingResistance(asFound).meanAt20COhm - 1;
  const row = difference < 0 ? { ...limits.asFoundBelow, value: -limits.asFoundBelow.value } : limits.asFoundAbove;
  const within = judgeRange(difference, 0, -limits.asFoundBelow.value, limits.asFoundAbove.value);
  const found = `${percentWords(Math.abs(difference))} ${difference < 0 ? 'under' : 'over'} the as-found resistance at the same temperature.`;
  if (within === 'conforms') return judgement('winding-resistance-as-found', row, difference, 'conforms', found);
  return judgement('winding-resistance-as-found', row, difference, within === 'not-valid' ? within : 'inconclusive', `${found} Check turns, wire size and mean turn, then ask the engineer.`);
}

export function judgeSurge(difference: number, peak: { appliedV: number | null; leastV: number | null }, limits: MachineTestLimits): TestJudgement {
  const row = limits.surgeDifference;
  const plain = judgeUpperLimit(difference, 0, row.value);
  const found = `The waves differ by ${percentWords(difference)}, ${percentWords(row.value)} allowed.`;
  if (plain === 'does-not-conform') return judgement('surge-difference', row, difference, plain, `${found} Redo the connection and look for a short between turns before varnish.`);
  if (peak.appliedV !== null && peak.leastV !== null && peak.appliedV < peak.leastV) {
    return judgement('surge-difference', row, difference, 'inconclusive', `${found} The peak was ${figureWords(peak.appliedV)} V, ${figureWords(peak.leastV)} V is usual: repeat it at that level, or ask.`);
  }
  return judgement('surge-difference', row, difference, plain, found);
}
