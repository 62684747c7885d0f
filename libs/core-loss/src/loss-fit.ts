import { OutOfRangeError } from '@libs/quantities';
import type { Reason } from './core-test.js';
import { fitLinear, type LinearFit } from './linear-fit.js';

/** One measured loss at its flux and frequency. */
export interface LossPoint {
  frequencyHz: number;
  fluxDensityT: number;
  wattsPerKg: number;
  /** Standard uncertainty as a fraction of the loss; 0.01 when left out. */
  standardUncertaintyRel?: number;
}

/** A coefficient with its standard uncertainty, spread of the points about the fit included. */
export interface Coefficient {
  value: number;
  standardUncertainty: number;
}

interface FitFigures {
  hysteresis: Coefficient;
  exponent: Coefficient;
  eddy: Coefficient;
  /** Correlation of hysteresis and eddy coefficient; near −1 means that only their sum is known. */
  correlation: number;
  chiSquared: number;
  degreesOfFreedom: number;
  conditionNumber: number;
  /** Measured over fitted, less 1, point by point. */
  residualsRel: number[];
  notes: Reason[];
}
export type TwoTermFit = ({ outcome: 'fitted' } & FitFigures) | { outcome: 'not-told'; reasons: Reason[] };
export type ThreeTermFit =
  | ({ outcome: 'fitted'; excess: Coefficient; correlationWithExcess: number } & FitFigures)
  | { outcome: 'not-told'; reasons: Reason[] };

/** Beyond this the parts of a fit trade places at the cost of almost nothing. */
export const ILL_CONDITIONED = 30;
const EXPONENT = { least: 1, most: 3 };
const DEFAULT_REL = 0.01;

const notTold = (code: string, words: string) => ({ outcome: 'not-told' as const, reasons: [{ code, words }] });

function checked(points: readonly LossPoint[]): void {
  points.forEach((point, i) => {
    for (const field of ['frequencyHz', 'fluxDensityT', 'wattsPerKg'] as const) {
      if (!(Number.isFinite(point[field]) && point[field] > 0)) throw new OutOfRangeError(`points.${i}.${field}`, `${field} must be a number, more than 0.`);
    }
    const u = point.standardUncertaintyRel;
    if (u !== undefined && !(Number.isFinite(u) && u > 0)) throw new OutOfRangeError(`points.${i}.standardUncertaintyRel`, 'An uncertainty must be a number, more than 0.');
  });
}

function checkedExponent(n: number): number {
  if (!(n >= EXPONENT.least && n <= EXPONENT.most)) throw new OutOfRangeError('exponent', 'The exponent lies between 1 and 3.');
  return n;
}

const uncertaintyOf = (p: LossPoint) => (p.standardUncertaintyRel ?? DEFAULT_REL) * p.wattsPerKg;
const distinct = (values: readonly number[]) => new Set(values.map((v) => Math.round(v * 1000))).size;

const hysteresisColumn = (p: LossPoint, n: number) => p.frequencyHz * p.fluxDensityT ** n;
const eddyColumn = (p: LossPoint) => (p.frequencyHz * p.fluxDensityT) ** 2;
const excessColumn = (p: LossPoint) => (p.frequencyHz * p.fluxDensityT) ** 1.5;

const solve = (points: readonly LossPoint[], row: (p: LossPoint) => number[]): LinearFit | undefined =>
  fitLinear(points.map(row), points.map((p) => p.wattsPerKg), points.map(uncertaintyOf));

/** Points that scatter more than they claim make every coefficient less sure by that much. */
const spreadOf = (chiSquared: number, degreesOfFreedom: number) => (degreesOfFreedom > 0 ? Math.max(1, Math.sqrt(chiSquared / degreesOfFreedom)) : 1);

const residuals = (points: readonly LossPoint[], fitted: (p: LossPoint) => number) => points.map((p) => p.wattsPerKg / fitted(p) - 1);

function partNotes(parts: [name: string, part: Coefficient][], conditionNumber: number): Reason[] {
  const notes: Reason[] = [];
  if (conditionNumber > ILL_CONDITIONED) {
    notes.push({ code: 'ill-conditioned', words: 'The split is not unique: other shares of the parts fit the readings nearly as well. Trust the sum, not the parts.' });
  }
  for (const [name, { value, standardUncertainty }] of parts) {
    if (value < -2 * standardUncertainty) notes.push({ code: 'negative', words: `The ${name} part comes out below 0: these readings do not follow the model.` });
    else if (value <= 2 * standardUncertainty) notes.push({ code: 'not-from-zero', words: `The ${name} part cannot be told from 0.` });
  }
  return notes;
}

/** χ² of the best fit with a given exponent; where nothing fits, it is endless. */
const chiAt = (points: readonly LossPoint[], n: number) => solve(points, (p) => [hysteresisColumn(p, n), eddyColumn(p)])?.chiSquared ?? Infinity;

/** The exponent with the least χ²: a coarse search, so that no side valley is taken, then golden section. */
function bestExponent(points: readonly LossPoint[]): number {
  const steps = Array.from({ length: 41 }, (_, i) => EXPONENT.least + i * 0.05);
  const start = steps.reduce((best, n) => (chiAt(points, n) < chiAt(points, best) ? n : best));
  let [low, high] = [Math.max(EXPONENT.least, start - 0.05), Math.min(EXPONENT.most, start + 0.05)];
  const golden = (Math.sqrt(5) - 1) / 2;
  for (let i = 0; i < 60; i += 1) {
    const [a, b] = [high - golden * (high - low), low + golden * (high - low)];
    if (chiAt(points, a) < chiAt(points, b)) high = b;
    else low = a;
  }
  return (low + high) / 2;
}

/**
 * Hysteresis and eddy coefficient by least squares over a set of readings at several fluxes and frequencies, each weighted by its own
 * uncertainty.
 *
 * `P = k_h·f·B^n + k_e·f²·B²`, `Σ ((P_i − P)/u_i)²` least; u of a coefficient from the fit's covariance, times `√(χ²/ν)` where that is more than 1
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | f, B, P | `points[i]` | Hz, T, W/kg | more than 0 |
 * | u | `points[i].standardUncertaintyRel` | – | fraction of P; 0.01 when left out |
 * | n | `exponent` | – | 1 to 3, or `'fit'` to find it too: three fluxes' worth of readings then |
 *
 * @returns `fitted` with coefficients in W/kg for Hz and T, χ², condition number, residuals and notes; or `not-told` with the reason: `too-few`,
 *   `one-frequency`, `one-flux`, `exponent-at-end`
 * @throws OutOfRangeError for readings that cannot be
 *
 * Source: Steinmetz's two-term loss; least squares of any text book. Standing: from memory.
 * @example
 * const points = [[50, 1], [50, 1.3], [100, 1], [100, 1.3]].map(([frequencyHz, fluxDensityT]) => ({ frequencyHz, fluxDensityT, wattsPerKg: 0.02 * frequencyHz * fluxDensityT ** 1.8 + 1e-4 * (frequencyHz * fluxDensityT) ** 2 }))
 * const fit = fitTwoTermLoss(points, 'fit')
 * fit.exponent.value
 * // → 1.80
 * fit.hysteresis.value
 * // → 0.020
 */
export function fitTwoTermLoss(points: readonly LossPoint[], exponent: number | 'fit' = 2): TwoTermFit {
  checked(points);
  const free = exponent === 'fit' ? 3 : 2;
  if (points.length < free) return notTold('too-few', `At least ${free} readings are needed.`);
  if (distinct(points.map((p) => p.frequencyHz)) < 2) return notTold('one-frequency', 'All readings were taken at one frequency. Flux levels alone cannot separate hysteresis from eddy loss.');
  if (exponent === 'fit' && distinct(points.map((p) => p.fluxDensityT)) < 2) return notTold('one-flux', 'All readings were taken at one flux: the exponent cannot be found. State it, or read at a second flux.');
  const n = exponent === 'fit' ? bestExponent(points) : checkedExponent(exponent);
  if (exponent === 'fit' && (n < EXPONENT.least + 1e-3 || n > EXPONENT.most - 1e-3)) {
    return notTold('exponent-at-end', 'No exponent between 1 and 3 fits these readings. Look for a slip in one of them.');
  }
  const fit = solve(points, (p) => [hysteresisColumn(p, n), eddyColumn(p)]);
  if (!fit) return notTold('cannot-be-split', 'These readings do not tell the two parts apart.');
  const [kh = 0, ke = 0] = fit.coefficients;
  // with the exponent free, the fit is made straight about its solution and n counts as a third column
  const wide = exponent === 'fit' ? solve(points, (p) => [hysteresisColumn(p, n), eddyColumn(p), kh * hysteresisColumn(p, n) * Math.log(p.fluxDensityT)]) : fit;
  if (!wide) return notTold('cannot-be-split', 'These readings do not tell the two parts and the exponent apart.');
  const degreesOfFreedom = points.length - free;
  const spread = spreadOf(fit.chiSquared, degreesOfFreedom);
  const covariance = (i: number, j: number) => wide.covariance[i]?.[j] ?? 0;
  const u = (i: number) => spread * Math.sqrt(Math.max(covariance(i, i), 0));
  const hysteresis = { value: kh, standardUncertainty: u(0) };
  const eddy = { value: ke, standardUncertainty: u(1) };
  return {
    outcome: 'fitted',
    hysteresis,
    exponent: { value: n, standardUncertainty: exponent === 'fit' ? u(2) : 0 },
    eddy,
    correlation: covariance(0, 1) / Math.sqrt(covariance(0, 0) * covariance(1, 1)),
    chiSquared: fit.chiSquared,
    degreesOfFreedom,
    conditionNumber: wide.conditionNumber,
    residualsRel: residuals(points, (p) => kh * hysteresisColumn(p, n) + ke * eddyColumn(p)),
    notes: partNotes([['hysteresis', hysteresis], ['eddy', eddy]], wide.conditionNumber),
  };
}

/**
 * Hysteresis, classical eddy and excess coefficient by least squares. The excess part lies between the other two, so that over a few
 * frequencies the three can hardly be told apart: the split is not unique, and the result says so.
 *
 * `P = k_h·f·B^n + k_cl·f²·B² + k_ex·(f·B)^1.5`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | f, B, P, u | `points[i]` | Hz, T, W/kg, – | as `fitTwoTermLoss` |
 * | n | `exponent` | – | 1 to 3, stated and not found |
 *
 * @returns as `fitTwoTermLoss`, with the excess part; `not-told` below three readings or three frequencies
 * @throws OutOfRangeError for readings that cannot be
 *
 * Source: Bertotti's three-term loss, 1988. Standing: paper seen; formula from memory.
 * @example
 * const points = [[50, 1.49], [100, 4.15], [200, 11.7], [400, 35.9]].map(([frequencyHz, wattsPerKg]) => ({ frequencyHz, fluxDensityT: 1, wattsPerKg }))
 * const fit = fitThreeTermLoss(points)
 * fit.excess.value
 * // → 2.439e-3
 * fit.notes[0].code
 * // → 'ill-conditioned'
 */
export function fitThreeTermLoss(points: readonly LossPoint[], exponent = 2): ThreeTermFit {
  checked(points);
  const n = checkedExponent(exponent);
  if (points.length < 3) return notTold('too-few', 'At least 3 readings are needed.');
  if (distinct(points.map((p) => p.frequencyHz)) < 3) return notTold('too-few-frequencies', 'Three parts need readings at three frequencies or more.');
  const fit = solve(points, (p) => [hysteresisColumn(p, n), eddyColumn(p), excessColumn(p)]);
  if (!fit) return notTold('cannot-be-split', 'These readings do not tell the three parts apart.');
  const degreesOfFreedom = points.length - 3;
  const spread = spreadOf(fit.chiSquared, degreesOfFreedom);
  const covariance = (i: number, j: number) => fit.covariance[i]?.[j] ?? 0;
  const part = (i: number): Coefficient => ({ value: fit.coefficients[i] ?? 0, standardUncertainty: spread * Math.sqrt(Math.max(covariance(i, i), 0)) });
  const correlation = (i: number, j: number) => covariance(i, j) / Math.sqrt(covariance(i, i) * covariance(j, j));
  const [hysteresis, eddy, excess] = [part(0), part(1), part(2)];
  return {
    outcome: 'fitted',
    hysteresis,
    exponent: { value: n, standardUncertainty: 0 },
    eddy,
    excess,
    correlation: correlation(0, 1),
    correlationWithExcess: correlation(0, 2),
    chiSquared: fit.chiSquared,
    degreesOfFreedom,
    conditionNumber: fit.conditionNumber,
    residualsRel: residuals(points, (p) => hysteresis.value * hysteresisColumn(p, n) + eddy.value * eddyColumn(p) + excess.value * excessColumn(p)),
    notes: partNotes([['hysteresis', hysteresis], ['eddy', eddy], ['excess', excess]], fit.conditionNumber),
  };
}
