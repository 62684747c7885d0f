import { OutOfRangeError } from '@libs/quantities';
import type { Reason } from './core-test.js';
import { DEFAULT_READING_UNCERTAINTY, FLUX_EXPONENT, FLUX_EXPONENT_HALF_WIDTH } from './reading-uncertainty.js';
import { referLoss } from './ring-reading.js';

/** One ring test of a core, reduced, as far as a separation needs it. Watts may stand for W/kg throughout. */
export interface FrequencyReading {
  frequencyHz: number;
  fluxDensityT: number;
  wattsPerKg: number;
  /** Needed with `phaseErrorRad`: the phase error moves each frequency by its own amount. */
  powerFactor?: number;
}

export interface SeparationOptions {
  /** Both losses are referred to this flux first; the flux between the two when left out. */
  referredToT?: number;
  exponent?: number;
  exponentUncertainty?: number;
  /** Standard uncertainty that differs from one reading to the other, as a fraction of the loss. */
  repeatRel?: number;
  /** What both readings share (mass, area, gain of the meters), as a fraction: it scales hysteresis and eddy alike. */
  commonRel?: number;
  phaseErrorRad?: number;
  coverageFactor?: number;
}

/** Reading-to-reading part of the loss with the meters of a usual shop, volts and watts together. */
export const SEPARATION_REPEAT_REL = Math.hypot(FLUX_EXPONENT * DEFAULT_READING_UNCERTAINTY.voltsRepeatRel, DEFAULT_READING_UNCERTAINTY.wattsRepeatRel);
/** A supply drifts by that much: closer than this two frequencies are one. */
const SAME_FREQUENCY = 0.01;
/** No loss is referred over more flux than this. */
const MOST_FLUX_CORRECTION = 0.05;
/** The eddy share of the loss must be known to this (expanded), else the two frequencies are too close to tell. */
export const MOST_SHARE_UNCERTAINTY = 0.15;

/** The line through loss per cycle against frequency. */
export interface SeparationFigures {
  /** a, J/kg per cycle: hysteresis, what is left at no frequency. */
  hysteresisPerCycle: number;
  /** b, J/kg per cycle and hertz: eddy currents, the slope. */
  eddyPerCycleHz: number;
  /** Standard uncertainties of a and b, and how they hang together: always against each other. */
  uHysteresisPerCycle: number;
  uEddyPerCycleHz: number;
  correlation: number;
  referredToT: number;
  coverageFactor: number;
  /** Share of the loss at the higher frequency that is eddy loss, with its expanded uncertainty. */
  eddyShare: number;
  expandedUncertaintyShare: number;
  /** Loss per cycle of both readings, referred to the one flux, lower frequency first. */
  points: { frequencyHz: number; joulesPerKg: number; standardUncertainty: number }[];
}

export type Separation =
  | ({ outcome: 'separated'; notes: Reason[] } & SeparationFigures)
  /** The two frequencies lie too close, or the readings are too uncertain: the figures are there, and do not tell. */
  | ({ outcome: 'too-close'; reasons: Reason[] } & SeparationFigures)
  /** A part came out below 0 by more than its uncertainty: one of the readings is wrong. */
  | ({ outcome: 'not-physical'; reasons: Reason[] } & SeparationFigures)
  | { outcome: 'same-frequency' | 'flux-apart'; reasons: Reason[] };

const positive = (value: number, field: string) => {
  if (!(Number.isFinite(value) && value > 0)) throw new OutOfRangeError(field, `${field} must be a number, more than 0.`);
};
const atLeastZero = (value: number, field: string) => {
  if (!(Number.isFinite(value) && value >= 0)) throw new OutOfRangeError(field, `${field} must be a number, 0 or more.`);
};

function checked(first: FrequencyReading, second: FrequencyReading, o: Required<Omit<SeparationOptions, 'referredToT'>>, referredToT: number): void {
  for (const [name, reading] of Object.entries({ first, second })) {
    for (const field of ['frequencyHz', 'fluxDensityT', 'wattsPerKg'] as const) positive(reading[field], `${name}.${field}`);
    const { powerFactor } = reading;
    if (powerFactor !== undefined && !(powerFactor > 0 && powerFactor <= 1)) throw new OutOfRangeError(`${name}.powerFactor`, 'A power factor lies between 0 and 1.');
    if (o.phaseErrorRad > 0 && powerFactor === undefined) throw new OutOfRangeError(`${name}.powerFactor`, 'A phase error counts by the power factor: give it for both readings.');
  }
  positive(referredToT, 'referredToT');
  positive(o.coverageFactor, 'coverageFactor');
  for (const field of ['exponentUncertainty', 'repeatRel', 'commonRel', 'phaseErrorRad'] as const) atLeastZero(o[field], field);
}

const tanPhi = (powerFactor: number) => Math.sqrt(1 - powerFactor ** 2) / powerFactor;

/**
 * Splits the loss of a core into hysteresis and eddy loss, from two readings at two frequencies and one flux. Keep volts over
 * frequency the same and the flux stays; what is left of a difference is referred first, because unequal flux passes for eddy loss.
 *
 * `P/f = a + b·f`, `b = (P₂/f₂ − P₁/f₁)/(f₂ − f₁)`, `a = P₁/f₁ − b·f₁`, with `P = P_read·(B_t/B)^n`
 *
 * The uncertainties follow from what differs between the readings (repeats, flux exponent by what the fluxes differ, phase error by
 * each power factor) and what they share. An error of 0.5 % in each reading leaves the eddy loss known to some 30 % with 50 and
 * 60 Hz, and to a tenth with 25 and 50 Hz.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | P₁, f₁, B₁ | `first` | W/kg, Hz, T | more than 0 |
 * | P₂, f₂, B₂ | `second` | W/kg, Hz, T | more than 0; either may be the lower frequency |
 * | B_t | `options.referredToT` | T | within 5 % of both fluxes |
 * | n | `options.exponent` | – | 2.0 when left out, ± 0.3 as limits |
 * | u | `options.repeatRel`, `.commonRel` | – | fractions of the loss, 0 or more |
 * | δ | `options.phaseErrorRad` | rad | 0 or more; needs the power factors |
 *
 * @returns `separated` with a, b and their uncertainties; or by name why not: `same-frequency`, `flux-apart`, `too-close` (the eddy
 *   share is uncertain by more than 15 points; a and b are given all the same), `not-physical` (a part below 0 beyond its uncertainty)
 * @throws OutOfRangeError outside those ranges
 *
 * Source: machine text books; two-frequency separation at constant volts over frequency. Standing: from memory; checked against published problems.
 * @example
 * const parts = separateTwoFrequencies({ frequencyHz: 50, fluxDensityT: 1, wattsPerKg: 2500 }, { frequencyHz: 25, fluxDensityT: 1, wattsPerKg: 850 })
 * parts.hysteresisPerCycle * 50
 * // → 900
 * parts.eddyPerCycleHz * 50 ** 2
 * // → 1600
 */
export function separateTwoFrequencies(first: FrequencyReading, second: FrequencyReading, options: SeparationOptions = {}): Separation {
  const o = {
    exponent: FLUX_EXPONENT,
    exponentUncertainty: FLUX_EXPONENT_HALF_WIDTH / Math.sqrt(3),
    repeatRel: SEPARATION_REPEAT_REL,
    commonRel: 0,
    phaseErrorRad: 0,
    coverageFactor: 2,
    ...options,
  };
  const referredToT = options.referredToT ?? Math.sqrt(first.fluxDensityT * second.fluxDensityT);
  checked(first, second, o, referredToT);
  if (Math.abs(first.frequencyHz / second.frequencyHz - 1) < SAME_FREQUENCY) {
    return { outcome: 'same-frequency', reasons: [{ code: 'same-frequency', words: 'Both readings were taken at one frequency. It takes two to tell hysteresis from eddy loss; more flux levels do not help.' }] };
  }
  const apart = [first, second].filter(({ fluxDensityT }) => Math.abs(fluxDensityT / referredToT - 1) > MOST_FLUX_CORRECTION + 1e-9);
  if (apart.length > 0) {
    return { outcome: 'flux-apart', reasons: [{ code: 'flux-apart', words: `A reading lies more than 5 % away from ${referredToT.toFixed(2)} T. Keep volts over frequency the same and read again.` }] };
  }
  const figures = lineThrough(first.frequencyHz < second.frequencyHz ? [first, second] : [second, first], referredToT, o);
  return judged(figures);
}

function lineThrough(readings: [FrequencyReading, FrequencyReading], referredToT: number, o: Required<Omit<SeparationOptions, 'referredToT'>>): SeparationFigures {
  const [low, high] = readings;
  const perCycle = (r: FrequencyReading) => referLoss(r.wattsPerKg, r.fluxDensityT, referredToT, o.exponent) / r.frequencyHz;
  const [y1, y2] = [perCycle(low), perCycle(high)];
  const span = high.frequencyHz - low.frequencyHz;
  // each source moves the two points by these shares of themselves, one standard uncertainty at a time
  const phase = (r: FrequencyReading) => (o.phaseErrorRad > 0 ? tanPhi(r.powerFactor ?? 1) * o.phaseErrorRad : 0);
  const flux = (r: FrequencyReading) => Math.log(referredToT / r.fluxDensityT) * o.exponentUncertainty;
  const sources: [number, number][] = [
    [o.repeatRel, 0],
    [0, o.repeatRel],
    [o.commonRel, o.commonRel],
    [phase(low), phase(high)],
    [flux(low), flux(high)],
  ];
  const moves = sources.map(([r1, r2]) => {
    const b = (y2 * r2 - y1 * r1) / span;
    return { a: y1 * r1 - b * low.frequencyHz, b, share: ((high.frequencyHz / span) * (y1 / y2)) * (r2 - r1) };
  });
  const size = (pick: (move: (typeof moves)[number]) => number) => Math.hypot(...moves.map(pick));
  const eddyPerCycleHz = (y2 - y1) / span;
  const [uA, uB] = [size((m) => m.a), size((m) => m.b)];
  const pointU = (index: 0 | 1, y: number) => y * Math.hypot(...sources.map((source) => source[index]));
  return {
    hysteresisPerCycle: y1 - eddyPerCycleHz * low.frequencyHz,
    eddyPerCycleHz,
    uHysteresisPerCycle: uA,
    uEddyPerCycleHz: uB,
    correlation: uA > 0 && uB > 0 ? moves.reduce((sum, m) => sum + m.a * m.b, 0) / (uA * uB) : 0,
    referredToT,
    coverageFactor: o.coverageFactor,
    eddyShare: (eddyPerCycleHz * high.frequencyHz) / y2,
    expandedUncertaintyShare: o.coverageFactor * size((m) => m.share),
    points: [
      { frequencyHz: low.frequencyHz, joulesPerKg: y1, standardUncertainty: pointU(0, y1) },
      { frequencyHz: high.frequencyHz, joulesPerKg: y2, standardUncertainty: pointU(1, y2) },
    ],
  };
}

function judged(figures: SeparationFigures): Separation {
  const { hysteresisPerCycle, eddyPerCycleHz, uHysteresisPerCycle, uEddyPerCycleHz, coverageFactor, expandedUncertaintyShare, points } = figures;
  const [low, high] = points;
  if (expandedUncertaintyShare > MOST_SHARE_UNCERTAINTY) {
    const words = `${low?.frequencyHz ?? 0} and ${high?.frequencyHz ?? 0} Hz are too close for readings this uncertain: the eddy share is known to ± ${Math.round(expandedUncertaintyShare * 100)} points only. Take a frequency farther away, half or double.`;
    return { outcome: 'too-close', ...figures, reasons: [{ code: 'too-close', words }] };
  }
  const below = (value: number, u: number) => value + coverageFactor * u < 0;
  const reasons: Reason[] = [];
  if (below(eddyPerCycleHz, uEddyPerCycleHz)) reasons.push({ code: 'eddy-negative', words: 'The eddy loss comes out below 0: the loss per cycle cannot fall with frequency. Check flux, watts and temperature of both readings.' });
  if (below(hysteresisPerCycle, uHysteresisPerCycle)) reasons.push({ code: 'hysteresis-negative', words: 'The hysteresis loss comes out below 0. Check flux, watts and turns of both readings.' });
  if (reasons.length > 0) return { outcome: 'not-physical', ...figures, reasons };
  const notes: Reason[] = [];
  if (eddyPerCycleHz <= coverageFactor * uEddyPerCycleHz) notes.push({ code: 'eddy-near-zero', words: 'The eddy loss is smaller than its own uncertainty.' });
  if (hysteresisPerCycle <= coverageFactor * uHysteresisPerCycle) notes.push({ code: 'hysteresis-near-zero', words: 'The hysteresis loss is smaller than its own uncertainty.' });
  return { outcome: 'separated', ...figures, notes };
}

/**
 * Loss at a frequency from its two parts, at the flux of the separation.
 *
 * `P = a·f + b·f²`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | a, b | `parts` | J/kg, J/(kg·Hz) | as separated |
 * | f | `frequencyHz` | Hz | more than 0; far beyond the readings it reads high, because excess loss grows less than eddy loss |
 *
 * @returns hysteresis, eddy and total in W/kg
 * @throws OutOfRangeError when the frequency is not more than 0
 *
 * Source: machine text books. Standing: from memory.
 * @example
 * lossPartsAt({ hysteresisPerCycle: 4, eddyPerCycleHz: 0.16 }, 50)
 * // → { hysteresis: 200, eddy: 400, total: 600 }
 */
export function lossPartsAt(parts: Pick<SeparationFigures, 'hysteresisPerCycle' | 'eddyPerCycleHz'>, frequencyHz: number): { hysteresis: number; eddy: number; total: number } {
  positive(frequencyHz, 'frequencyHz');
  const hysteresis = parts.hysteresisPerCycle * frequencyHz;
  const eddy = parts.eddyPerCycleHz * frequencyHz ** 2;
  return { hysteresis, eddy, total: hysteresis + eddy };
}

/**
 * Hysteresis loss from the area of a loop on squared paper.
 *
 * `p = A_loop·f / D`, `A_loop = squares · ΔB · ΔH`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | A_loop | `loopJPerM3` | J/m³ per cycle | 0 or more |
 * | f | `frequencyHz` | Hz | more than 0 |
 * | D | `densityKgPerM3` | kg/m³ | more than 0 |
 *
 * @returns W/kg
 * @throws OutOfRangeError outside those ranges
 *
 * Source: machine text books. Standing: from memory.
 * @example
 * hysteresisFromLoop(94 * 0.1 * 20, 50, 7650)
 * // → 1.23
 */
export function hysteresisFromLoop(loopJPerM3: number, frequencyHz: number, densityKgPerM3: number): number {
  atLeastZero(loopJPerM3, 'loopJPerM3');
  positive(frequencyHz, 'frequencyHz');
  positive(densityKgPerM3, 'densityKgPerM3');
  return (loopJPerM3 * frequencyHz) / densityKgPerM3;
}
