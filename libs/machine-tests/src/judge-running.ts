import { judgeUpperLimit } from '@libs/measurement';
import { OutOfRangeError } from '@libs/quantities';
import { figureWords, percentWords } from './figure-words.js';
import type { HighPotentialLevel } from './high-potential.js';
import type { MachineTestProblem, TestJudgement } from './judgement.js';
import { judgement } from './judge-winding.js';
import { DEFAULT_MACHINE_TEST_LIMITS, type MachineTestLimits } from './limits.js';
import { LOW_VOLTS_SHARE, nearestToRated, noLoadLosses, noLoadSeparation, type NoLoadLosses, type NoLoadSeparation } from './no-load.js';
import type { BearingReading, HighPotentialReading, NoLoadReading, VibrationReading } from './readings.js';
import { vibrationLimit } from './vibration.js';
import { unbalanceFraction } from './winding-resistance.js';

/** A dial cannot be set finer than this beside a level of a thousand volts. */
const VOLTS_TOLERANCE = 0.5;

/** Breaking down fails at any volts; holding counts only at full level and for the full time. */
export function judgeHighPotential(r: HighPotentialReading, level: HighPotentialLevel, limits: MachineTestLimits): TestJudgement {
  const row = { value: level.voltsV, unit: 'V', source: level.source, standing: level.standing };
  const asked = `${figureWords(level.voltsV)} V ${r.supply === 'ac' ? 'AC' : 'DC'} (${level.words})`;
  const least = limits.highPotentialSeconds.value;
  if (!r.held) return judgement('high-potential', row, r.appliedVoltsV, 'does-not-conform', `It broke down at ${r.appliedVoltsV} V, ${asked} asked. Find the place before anything else.`);
  if (r.appliedVoltsV < level.voltsV - VOLTS_TOLERANCE) {
    return judgement('high-potential', row, r.appliedVoltsV, 'not-valid', `It held ${r.appliedVoltsV} V, but ${asked} is asked: this is no high-potential test.`);
  }
  if (r.seconds < least) return judgement('high-potential', row, r.appliedVoltsV, 'not-valid', `It held for ${r.seconds} s, ${least} s asked.`);
  return judgement('high-potential', row, r.appliedVoltsV, 'conforms', `It held ${r.appliedVoltsV} V for ${r.seconds} s, ${asked} asked.`);
}

/** More than this over the level strains good insulation, or is a digit too many. */
const OVER_LEVEL = 1.1;

export function highPotentialWarnings(r: HighPotentialReading, level: HighPotentialLevel): MachineTestProblem[] {
  if (r.appliedVoltsV <= OVER_LEVEL * level.voltsV) return [];
  return [{ path: 'highPotential.appliedVoltsV', code: 'over-level', message: `${r.appliedVoltsV} V is far over the ${figureWords(level.voltsV)} V asked. Check the figure; if it was so, say why.` }];
}

export interface NoLoadDerived {
  /** The volts the run is judged at. */
  ratedVoltageV: number;
  /** At the point that stands for the rated volts; null when there is none. */
  atRated: (NoLoadLosses & { voltsUnbalanceFraction: number; ampsUnbalanceFraction: number }) | null;
  /** Null when there are too few low points, or when they do not belong together. */
  separation: NoLoadSeparation | null;
}

export function deriveNoLoad(r: NoLoadReading, insulationRatedV: number): NoLoadDerived {
  const ratedVoltageV = r.ratedVoltageV ?? insulationRatedV;
  const settings = r.points.map((point) => ({
    ...noLoadLosses(point, r.lineResistanceOhm),
    voltsUnbalanceFraction: unbalanceFraction(point.voltsV),
    ampsUnbalanceFraction: unbalanceFraction(point.ampsA),
  }));
  return { ratedVoltageV, atRated: nearestToRated(settings, ratedVoltageV) ?? null, separation: separationOrNull(r, ratedVoltageV) };
}

/** A negative loss is no loss: points that give one do not belong to one line. */
function separationOrNull(r: NoLoadReading, ratedVoltageV: number): NoLoadSeparation | null {
  try {
    const s = noLoadSeparation(r.points, r.lineResistanceOhm, ratedVoltageV);
    return s.frictionAndWindageW < 0 || s.slopeWPerV2 < 0 || (s.coreLossW !== null && s.coreLossW < 0) ? null : s;
  } catch (error) {
    if (error instanceof OutOfRangeError) return null;
    throw error;
  }
}

export function noLoadWarnings(r: NoLoadReading, d: NoLoadDerived): MachineTestProblem[] {
  const low = r.points.filter((p) => p.voltsV.reduce((sum, v) => sum + v, 0) / 3 <= LOW_VOLTS_SHARE * d.ratedVoltageV).length;
  if (low < 3 || d.separation) return [];
  return [{ path: 'noLoad.points', code: 'separation', message: 'The low points give no sensible friction and core loss: they need three different volts and one line. Check the watts.' }];
}

export function judgeNoLoad(d: NoLoadDerived, limits: MachineTestLimits): TestJudgement {
  const row = limits.noLoadCurrentBalance;
  if (!d.atRated) return judgement('no-load-current-balance', row, null, 'not-valid', `No point stands within 2 % of ${figureWords(d.ratedVoltageV)} V. Read one there.`);
  const { voltsUnbalanceFraction: volts, ampsUnbalanceFraction: amps } = d.atRated;
  const found = `The amperes differ from their mean by up to ${percentWords(amps)}, ${percentWords(row.value)} allowed.`;
  if (volts > limits.noLoadVoltsBalance.value) {
    return judgement('no-load-current-balance', row, amps, 'not-valid', `The volts differ by ${percentWords(volts)}, ${percentWords(limits.noLoadVoltsBalance.value)} allowed. Level the supply, then run again.`);
  }
  const verdict = judgeUpperLimit(amps, 0, row.value);
  return judgement('no-load-current-balance', row, amps, verdict, verdict === 'conforms' ? found : `${found} Swap the leads round: if the uneven phase stays with the motor, check its winding.`);
}

/**
 * No-load current against an earlier value of the same machine: as found, or an earlier visit. Outside the band it asks.
 *
 * `d = I_0 / I_earlier − 1`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | I_0 | `noLoadA` | A | more than 0, mean of the three lines at rated volts |
 * | I_earlier | `earlierA` | A | more than 0, at the same volts and frequency |
 * | – | `limits` | 1 | the shop's: 10 % either way |
 *
 * @returns a judgement: conforms or inconclusive (ask)
 * @throws OutOfRangeError when a current is not more than 0
 *
 * Source: comparison of the bay. Standing: common practice.
 * @example
 * judgeNoLoadLevel(117.9, 112).verdict
 * // → 'conforms'
 */
export function judgeNoLoadLevel(noLoadA: number, earlierA: number, limits: MachineTestLimits = DEFAULT_MACHINE_TEST_LIMITS): TestJudgement {
  if (!(Number.isFinite(noLoadA) && noLoadA > 0)) throw new OutOfRangeError('noLoadA', 'Read the no-load current: more than 0.');
  if (!(Number.isFinite(earlierA) && earlierA > 0)) throw new OutOfRangeError('earlierA', 'Enter the earlier no-load current: more than 0.');
  const row = limits.noLoadCurrentLevel;
  const difference = noLoadA / earlierA - 1;
  const found = `${percentWords(Math.abs(difference))} ${difference < 0 ? 'under' : 'over'} the earlier no-load current, ${percentWords(row.value)} allowed.`;
  if (judgeUpperLimit(Math.abs(difference), 0, row.value) === 'conforms') return judgement('no-load-current-level', row, difference, 'conforms', found);
  return judgement('no-load-current-level', row, difference, 'inconclusive', `${found} Check turns, connection and air gap, then ask the engineer.`);
}

export interface VibrationDerived {
  worstMPerS: number;
  limitMPerS: number;
  kind: 'rms' | 'peak';
}

export const deriveVibration = (r: VibrationReading, limits: MachineTestLimits): VibrationDerived => ({
  worstMPerS: Math.max(...r.velocitiesMPerS),
  limitMPerS: vibrationLimit(r, limits).value,
  kind: r.standard === 'nema-mg1' ? 'peak' : 'rms',
});

export function judgeVibration(r: VibrationReading, d: VibrationDerived, limits: MachineTestLimits): TestJudgement {
  const verdict = judgeUpperLimit(d.worstMPerS, 0, d.limitMPerS);
  const found = `The worst point shows ${figureWords(d.worstMPerS * 1000)} mm/s ${d.kind}, ${figureWords(d.limitMPerS * 1000)} mm/s allowed.`;
  const next = verdict === 'conforms' ? '' : ' Check half key, balance, fits and feet, then measure again.';
  return judgement('vibration', vibrationLimit(r, limits), d.worstMPerS, verdict, `${found}${next}`);
}

export interface BearingDerived {
  riseK: number;
  warmer: 'drive-end' | 'non-drive-end';
  stable: boolean;
}

export const deriveBearings = (r: BearingReading, limits: MachineTestLimits): BearingDerived => ({
  riseK: Math.max(r.driveEndC, r.nonDriveEndC) - r.ambientC,
  warmer: r.driveEndC >= r.nonDriveEndC ? 'drive-end' : 'non-drive-end',
  stable: Math.abs(r.changeInHalfHourK) <= limits.bearingStableK.value,
});

/** Too warm is too warm at once; cool enough counts only when the temperature stands. */
export function judgeBearings(r: BearingReading, d: BearingDerived, limits: MachineTestLimits): TestJudgement {
  const row = r.poles === 2 ? limits.bearingRiseTwoPoleK : limits.bearingRiseK;
  const verdict = judgeUpperLimit(d.riseK, 0, row.value);
  const found = `The ${d.warmer === 'drive-end' ? 'drive end' : 'non-drive end'} is ${figureWords(d.riseK)} K over ambient, ${row.value} K allowed.`;
  if (verdict !== 'conforms') return judgement('bearing-rise', row, d.riseK, verdict, `${found} Check grease, fits and alignment.`);
  if (!d.stable) {
    return judgement('bearing-rise', row, d.riseK, 'not-valid', `${found} It still changes by ${figureWords(Math.abs(r.changeInHalfHourK))} K in half an hour, ${limits.bearingStableK.value} K allowed: run on.`);
  }
  return judgement('bearing-rise', row, d.riseK, 'conforms', found);
}
