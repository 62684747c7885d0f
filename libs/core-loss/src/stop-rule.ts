import type { CoreLimits } from './core-limits.js';
import type { Reason } from './core-test.js';

/** What the person at the switch sees while the core warms. */
export interface WatchedTemperatures {
  meanC?: number;
  hottestC?: number;
  /** The exciting current rises although volts and frequency stand still. */
  ampsRising?: boolean;
}

/**
 * Reasons to switch off at once. The record is kept: a test that was stopped is a finding, too.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `watched` | °C | what is known so far; what is missing stops nothing |
 * | – | `limits` | °C, K | the shop's |
 *
 * @returns an empty list while the test may go on
 *
 * Source: stop rules of the bay. Standing: common practice.
 * @example
 * stopReasons({ meanC: 45, hottestC: 71 }, DEFAULT_CORE_LIMITS).map((r) => r.code)
 * // → ['stop-spot-over-mean']
 */
export function stopReasons(watched: WatchedTemperatures, limits: Pick<CoreLimits, 'stopMeanC' | 'stopSpotOverMeanK' | 'stopSpotC'>): Reason[] {
  const reasons: Reason[] = [];
  const { meanC, hottestC, ampsRising } = watched;
  if (meanC !== undefined && meanC > limits.stopMeanC) {
    reasons.push({ code: 'stop-mean', words: `Switch off: the core's mean is over ${limits.stopMeanC} °C.` });
  }
  if (hottestC !== undefined && hottestC > limits.stopSpotC) {
    reasons.push({ code: 'stop-spot', words: `Switch off: a spot is over ${limits.stopSpotC} °C.` });
  }
  if (hottestC !== undefined && meanC !== undefined && hottestC - meanC > limits.stopSpotOverMeanK) {
    reasons.push({ code: 'stop-spot-over-mean', words: `Switch off: a spot is more than ${limits.stopSpotOverMeanK} K over the mean.` });
  }
  if (ampsRising) reasons.push({ code: 'stop-amps', words: 'Switch off: the current rises at the same volts.' });
  return reasons;
}

/**
 * Whether a ring test is demanded: from a power or an outside diameter up, or because the customer asks.
 *
 * `P ≥ P_min or D_o ≥ D_min or asked`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | P | `machine.ratedPowerW` | W | or unknown |
 * | D_o | `machine.outerDiameterM` | m | or unknown |
 * | – | `machine.customerAsks` | – | |
 *
 * @returns 'demanded', 'not-demanded', or 'unknown' when neither power nor diameter is known and nobody asked
 *
 * Source: size rule of the bay. Standing: common practice.
 * @example
 * ringTestDemand({ ratedPowerW: 750, outerDiameterM: 0.125 }, DEFAULT_CORE_LIMITS)
 * // → 'not-demanded'
 */
export function ringTestDemand(
  machine: { ratedPowerW?: number; outerDiameterM?: number; customerAsks?: boolean },
  limits: Pick<CoreLimits, 'demandedFromPowerW' | 'demandedFromDiameterM'>,
): 'demanded' | 'not-demanded' | 'unknown' {
  const { ratedPowerW, outerDiameterM, customerAsks } = machine;
  if (customerAsks) return 'demanded';
  if (ratedPowerW !== undefined && ratedPowerW >= limits.demandedFromPowerW) return 'demanded';
  if (outerDiameterM !== undefined && outerDiameterM >= limits.demandedFromDiameterM) return 'demanded';
  return ratedPowerW === undefined && outerDiameterM === undefined ? 'unknown' : 'not-demanded';
}
