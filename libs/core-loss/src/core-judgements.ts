import { judgeUpperLimit } from '@libs/measurement';
import type { CoreLimitKey, CoreLimits } from './core-limits.js';
import type { CoreComparison, CoreTestInput, Judgement, Reason } from './core-test.js';
import { beyond } from './core-test-validity.js';
import { referLoss } from './ring-reading.js';

const sourceOf = (limits: CoreLimits, key: CoreLimitKey) => ({ source: limits.sources[key].source, standing: limits.sources[key].standing });
const reason = (code: string, words: string): Reason => ({ code, words });

export const NOT_ESTABLISHED = reason('increase-not-established', 'No core test was made before: the increase is not established.');

/** After against before, with the uncertainty of the ratio. */
export function judgeIncrease(comparison: CoreComparison | undefined, waived: boolean, limits: CoreLimits): Judgement {
  const base = { test: 'increase' as const, unit: '1' as const, limit: limits.increaseLimit, ...sourceOf(limits, 'increase') };
  if (waived) return { ...base, verdict: 'shown-not-judged', reasons: [NOT_ESTABLISHED] };
  if (!comparison) {
    return { ...base, verdict: 'not-valid', reasons: [reason('no-before-test', 'There is no before test to compare with. Record it, or its waiver with the reason.')] };
  }
  const { increase, expandedUncertainty } = comparison;
  const figures = { measured: increase, expandedUncertainty };
  if (!comparison.valid) return { ...base, ...figures, verdict: 'not-valid', reasons: comparison.reasons };
  return { ...base, ...figures, verdict: judgeUpperLimit(increase, expandedUncertainty, limits.increaseLimit), reasons: [] };
}

/** A fall fails nothing. A large one asks whether the before test was right. */
export function judgeFall(comparison: CoreComparison, limits: CoreLimits): Judgement {
  const fall = -comparison.increase;
  const large = beyond(fall, limits.fallAsk);
  return {
    test: 'fall',
    verdict: large ? 'shown-not-judged' : 'conforms',
    measured: fall,
    limit: limits.fallAsk,
    expandedUncertainty: comparison.expandedUncertainty,
    unit: '1',
    reasons: large
      ? [reason('fall-beyond', 'The loss fell by more than burnout explains. Check for a warm core, another cable path, or currents between parallels in the before test.')]
      : [],
    ...sourceOf(limits, 'fall'),
  };
}

/**
 * The hot-spot limit at the flux of this test: heat goes with flux squared, so a test at less flux must keep to less.
 *
 * `L = L₀·(B/B₀)²`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | L₀ | `limitK` | K | as set by the shop |
 * | B | `fluxDensityT` | T | as measured |
 * | B₀ | `referenceFluxT` | T | the flux the limit is stated at, 1.32 |
 *
 * @returns K over the core's mean
 *
 * Standing: common practice.
 * @example
 * scaledHotSpotLimitK(10, 1, 1.32)
 * // → 5.7
 */
export const scaledHotSpotLimitK = (limitK: number, fluxDensityT: number, referenceFluxT: number): number => limitK * (fluxDensityT / referenceFluxT) ** 2;

/**
 * The hottest spot over the core's mean. A short run cannot clear a core, but it can condemn one: a spot that is over the
 * limit before the time is up will not be under it afterwards.
 */
export function judgeHotSpot(input: CoreTestInput, fluxDensityT: number, expandedUncertaintyK: number, limits: CoreLimits): Judgement {
  const { meanC, hottestC, minutes, startC, ambientC } = input.temperatures;
  const limit = scaledHotSpotLimitK(limits.hotSpotLimitK, fluxDensityT, limits.referenceFluxT);
  const base = { test: 'hot-spot' as const, unit: 'K' as const, limit, expandedUncertainty: expandedUncertaintyK, ...sourceOf(limits, 'hot-spot') };
  if (meanC === undefined || hottestC === undefined) {
    return { ...base, verdict: 'not-valid', reasons: [reason('hot-spot-not-read', 'Read the hottest place and the mean of the core: a hot spot is judged over the mean.')] };
  }
  const measured = hottestC - meanC;
  const verdict = judgeUpperLimit(measured, expandedUncertaintyK, limit);
  const reasons: Reason[] = [];
  if (beyond(Math.abs(startC - ambientC), limits.hotSpotStartToleranceK)) {
    reasons.push(reason('start-not-ambient', `The core started ${Math.round(Math.abs(startC - ambientC) * 10) / 10} K away from ambient; ${limits.hotSpotStartToleranceK} K are allowed. Let it settle and test again.`));
  }
  if (beyond(limits.hotSpotMinFluxShare, fluxDensityT / input.target.fluxDensityT)) {
    reasons.push(reason('hot-spot-flux', `Hot spots are judged at ${Math.round(limits.hotSpotMinFluxShare * 100)} % of the target flux or more. Raise the volts.`));
  }
  if (beyond(limits.hotSpotMinMinutes, minutes)) {
    const short = `The core ran ${minutes} minutes; hot spots are judged after ${limits.hotSpotMinMinutes}.`;
    if (reasons.length === 0 && verdict === 'does-not-conform') {
      return { ...base, measured, verdict, reasons: [reason('over-before-time', `${short} The spot was over its limit already.`)] };
    }
    reasons.push(reason('too-short', `${short} Run it longer.`));
  }
  return { ...base, measured, verdict: reasons.length > 0 ? 'not-valid' : verdict, reasons };
}

/** Fits the shipped figures: a supply of 50 or 60 Hz within 1 Hz. */
const near = (frequencyHz: number, nominal: number) => Math.abs(frequencyHz - nominal) <= 1;

/** Why W/kg is shown but not held against the absolute limit. */
function absoluteObstacles(input: CoreTestInput, fluxDensityT: number, formFactorAssumedSine: boolean, limits: CoreLimits): Reason[] {
  const reasons: Reason[] = [];
  const { frequencyHz } = input.reading;
  if (input.geometry.kind === 'armature') reasons.push(reason('armature', 'An armature or wound rotor: its deep yoke works at a higher flux inside.'));
  if (input.frame.state === 'in-frame') reasons.push(reason('in-frame', 'Tested in the frame, which takes flux and watts of its own.'));
  if (input.instruments.clampMeter) reasons.push(reason('clamp-meter', 'Read with a clamp meter.'));
  if (formFactorAssumedSine) reasons.push(reason('form-factor-assumed', 'Form factor assumed sine.'));
  if (beyond(Math.abs(fluxDensityT / limits.referenceFluxT - 1), limits.fluxTolerance)) {
    reasons.push(reason('flux-away', `The limit is stated at ${limits.referenceFluxT} T, this test was made at ${fluxDensityT.toFixed(3)} T.`));
  }
  if (!near(frequencyHz, 50) && !near(frequencyHz, 60)) reasons.push(reason('frequency-away', 'The limit is stated for 50 and 60 Hz.'));
  return reasons;
}

/** W/kg against the absolute limit: the last resort where there is no before test, and only on a bare stator core. */
export function judgeAbsolute(
  input: CoreTestInput,
  test: { fluxDensityT: number; wattsPerKg: number; expandedUncertaintyRel: number; formFactorAssumedSine: boolean; waived: boolean },
  limits: CoreLimits,
): Judgement {
  const { fluxDensityT } = test;
  const reasons = absoluteObstacles(input, fluxDensityT, test.formFactorAssumedSine, limits);
  if (!test.waived) {
    reasons.push(reason('comparison-governs', 'An absolute limit is judged only where no before test could be made; else before against after counts.'));
  }
  const away = reasons.some((r) => r.code === 'flux-away');
  const measured = away ? test.wattsPerKg : referLoss(test.wattsPerKg, fluxDensityT, limits.referenceFluxT);
  const { frequencyHz } = input.reading;
  const limit = near(frequencyHz, 60) ? limits.absoluteWPerKg60 : near(frequencyHz, 50) ? limits.absoluteWPerKg50 : undefined;
  const expandedUncertainty = measured * test.expandedUncertaintyRel;
  return {
    test: 'absolute',
    unit: 'W/kg',
    measured,
    expandedUncertainty,
    ...(limit === undefined || away ? {} : { limit }),
    verdict: reasons.length > 0 || limit === undefined ? 'shown-not-judged' : judgeUpperLimit(measured, expandedUncertainty, limit),
    reasons,
    ...sourceOf(limits, 'absolute'),
  };
}
