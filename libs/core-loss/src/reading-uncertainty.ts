import { combineUncorrelated, type Contribution } from '@libs/measurement';
import { OutOfRangeError } from '@libs/quantities';
import type { ReducedReading, RingReading } from './ring-reading.js';

/** Standard (k = 1) uncertainties of what a core test is made of. `…Rel` are fractions of the value. */
export interface ReadingUncertainty {
  /** Gain of the voltmeter: the same in both tests, so it cancels between before and after. */
  voltsRel: number;
  /** Gain of the wattmeter: cancels likewise. */
  wattsRel: number;
  /** Phase error of the wattmeter: does not cancel, because the power factor changes with the core. */
  phaseErrorRad: number;
  /** Area from the measured size, stacking apart. */
  areaRel: number;
  stackingRel: number;
  /** What mass has beyond the area: density and mean path. */
  massRel: number;
  frequencyRel: number;
  /** Reading-to-reading spread of the volts: never cancels. */
  voltsRepeatRel: number;
  wattsRepeatRel: number;
  /** Resistance of the exciting cable, warming included; counts only when the wattmeter lead sat on it. */
  cableResistanceRel: number;
  /** Standard uncertainty of the flux exponent. */
  exponent: number;
  /** Hottest spot less mean, both from the same thermometer or picture. */
  hotSpotK: number;
  clampMeter: boolean;
}

/** n = 2.0, and ±0.3 as limits that hold surely: rectangular. */
export const FLUX_EXPONENT = 2;
export const FLUX_EXPONENT_HALF_WIDTH = 0.3;

const DEGREE = Math.PI / 180;

/**
 * What a shop with panel meters of good class, rule and caliper can expect, when nothing better is known. It makes about
 * 7 % (k = 2) for W/kg and 2.4 points for a ratio near 1.2. Standing: common practice, to be confirmed by the shop.
 */
export const DEFAULT_READING_UNCERTAINTY: ReadingUncertainty = {
  voltsRel: 0.006,
  wattsRel: 0.008,
  phaseErrorRad: 0.1 * DEGREE,
  areaRel: 0.02,
  stackingRel: 0.02,
  massRel: 0.01,
  frequencyRel: 0.0005,
  voltsRepeatRel: 0.0025,
  wattsRepeatRel: 0.005,
  cableResistanceRel: 0.03,
  exponent: FLUX_EXPONENT_HALF_WIDTH / Math.sqrt(3),
  hotSpotK: 0.5,
  clampMeter: false,
};

/** The same shop with a clamp meter: gain of a few percent, and a phase error of its own. */
export const CLAMP_READING_UNCERTAINTY: ReadingUncertainty = {
  ...DEFAULT_READING_UNCERTAINTY,
  wattsRel: 0.03,
  phaseErrorRad: 1 * DEGREE,
  wattsRepeatRel: 0.01,
  clampMeter: true,
};

/** What a reading brings into its own uncertainty. */
export interface UncertainReading {
  reading: RingReading;
  reduced: ReducedReading;
}

const checked = (u: ReadingUncertainty): ReadingUncertainty => {
  for (const [field, value] of Object.entries(u)) {
    if (typeof value === 'number' && !(Number.isFinite(value) && value >= 0)) throw new OutOfRangeError(field, `${field} must be 0 or more.`);
  }
  return u;
};

/** The wattmeter errs by this share of the core's watts per radian of phase error. */
const tanPhi = ({ reduced }: UncertainReading) => Math.sqrt(Math.max(1 - reduced.powerFactor ** 2, 0)) / reduced.powerFactor;
/** Watts through the meter over watts of the core: more than 1 when cable loss is in the reading. */
const throughMeter = ({ reduced }: UncertainReading) => (reduced.coreWatts + (reduced.cableLossW ?? 0)) / reduced.coreWatts;
const cableShare = ({ reduced }: UncertainReading) => (reduced.cableLossW ?? 0) / reduced.coreWatts;
const part = (sensitivity: number, standardUncertainty: number): Contribution => ({ sensitivity, standardUncertainty });

/** What differs from one reading to the next, and so counts in a ratio as well. */
const perReading = (test: UncertainReading, u: ReadingUncertainty): Contribution[] => [
  part(FLUX_EXPONENT, u.voltsRepeatRel),
  part(throughMeter(test), u.wattsRepeatRel),
  part(FLUX_EXPONENT, u.frequencyRel),
  part(cableShare(test), u.cableResistanceRel),
];

/**
 * Relative standard uncertainty of W/kg referred to a flux.
 *
 * `p ∝ W·V^−n·f^n·A^n / m`, m = ρ·A·l, and the phase error δ moves the watts by `tan φ·δ`:
 *
 * `u² = (n·u_V)² + (w·u_W)² + (tan φ·u_δ)² + ((n−1)·u_A)² + ((n−1)·u_k)² + u_m² + (ln(B_t/B)·u_n)² + repeats`
 *
 * Area and stacking stand in the flux and in the mass: of their n and −1, n − 1 is left.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | cos φ, B | `test.reduced` | –, T | as reduced |
 * | B_t | `referredToT` | T | more than 0 |
 * | u_V … u_n | `u` | – | 0 or more |
 *
 * @returns fraction of the W/kg, k = 1
 * @throws OutOfRangeError when an uncertainty is negative
 *
 * Source: law of propagation, JCGM 100; sensitivities of the ring test. Standing: from memory, computed.
 * @example
 * const core = deriveGeometry({ kind: 'stator', outerDiameterM: 0.53, innerDiameterM: 0.34, slotDepthM: 0.044, slots: 72, stackLengthM: 0.37, ducts: 0, ductWidthM: 0, stackingFactor: 0.95, densityKgPerM3: 7700 })
 * const reading = { excitingTurns: 24, searchTurns: 4, searchVoltsV: 20.99, voltmeter: 'average', excitingA: 25.1, wattsW: 102.1, wattmeterLead: 'search', frequencyHz: 50 }
 * 2 * lossUncertaintyRel({ reading, reduced: reduceReading(reading, core) }, 1.32)
 * // → 0.070
 */
export function lossUncertaintyRel(test: UncertainReading, referredToT: number, u: ReadingUncertainty = DEFAULT_READING_UNCERTAINTY): number {
  checked(u);
  if (!(Number.isFinite(referredToT) && referredToT > 0)) throw new OutOfRangeError('referredToT', 'The flux to refer to must be more than 0.');
  return combineUncorrelated([
    ...perReading(test, u),
    part(FLUX_EXPONENT, u.voltsRel),
    part(throughMeter(test), u.wattsRel),
    part(tanPhi(test), u.phaseErrorRad),
    part(FLUX_EXPONENT - 1, u.areaRel),
    part(FLUX_EXPONENT - 1, u.stackingRel),
    part(1, u.massRel),
    part(Math.log(referredToT / test.reduced.fluxDensityT), u.exponent),
  ]);
}

/**
 * Relative standard uncertainty of the ratio after / before.
 *
 * One core and one set of meters: size, stacking, density, mass and the gain of the meters are wrong by the same share in
 * both tests and cancel. The wattmeter's phase error does not: it moves each test by its own `tan φ`, and damage raises the
 * power factor. The flux exponent counts by what the two fluxes differ.
 *
 * `u² = ((tan φ_a − tan φ_b)·u_δ)² + (ln(B_b/B_a)·u_n)² + repeats of both`
 *
 * Another voltmeter in the second test brings its gain in twice: `2·(n·u_V)²`.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | cos φ_b, B_b | `before.reduced` | –, T | as reduced |
 * | cos φ_a, B_a | `after.reduced` | –, T | as reduced |
 * | – | `sameVoltmeter` | – | true when one voltmeter of one kind served both tests |
 *
 * @returns fraction of the ratio, k = 1
 * @throws OutOfRangeError when an uncertainty is negative
 *
 * Source: law of propagation with correlated input, JCGM 100. Standing: from memory, computed.
 * @example
 * const core = deriveGeometry({ kind: 'stator', outerDiameterM: 0.34, innerDiameterM: 0.218, slotDepthM: 0.028, slots: 48, stackLengthM: 0.22, ducts: 0, ductWidthM: 0, stackingFactor: 0.95, densityKgPerM3: 7700 })
 * const first = { excitingTurns: 16, searchTurns: 4, searchVoltsV: 8.096, voltmeter: 'average', excitingA: 26.5, wattsW: 40.01, wattmeterLead: 'search', frequencyHz: 50 }
 * const second = { ...first, searchVoltsV: 8.084, excitingA: 26.6, wattsW: 47.31 }
 * const test = (reading) => ({ reading, reduced: reduceReading(reading, core) })
 * 2 * ratioUncertaintyRel(test(first), test(second)) * 1.186
 * // → 0.024
 */
export function ratioUncertaintyRel(
  before: UncertainReading,
  after: UncertainReading,
  u: ReadingUncertainty = DEFAULT_READING_UNCERTAINTY,
  sameVoltmeter = true,
): number {
  checked(u);
  const gain = sameVoltmeter ? [] : [part(FLUX_EXPONENT, u.voltsRel), part(FLUX_EXPONENT, u.voltsRel)];
  return combineUncorrelated([
    ...perReading(before, u),
    ...perReading(after, u),
    ...gain,
    part(throughMeter(after) - throughMeter(before), u.wattsRel),
    part(tanPhi(after) - tanPhi(before), u.phaseErrorRad),
    part(Math.log(before.reduced.fluxDensityT / after.reduced.fluxDensityT), u.exponent),
  ]);
}
