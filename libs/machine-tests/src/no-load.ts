import { OutOfRangeError } from '@libs/quantities';
import type { NoLoadPoint } from './readings.js';
import { meanOf } from './winding-resistance.js';

const positive = (value: unknown): value is number => typeof value === 'number' && Number.isFinite(value) && value > 0;

/** Up to this share of rated volts iron is far from saturation and the line through the points is straight. */
export const LOW_VOLTS_SHARE = 0.6;
/** A point this near the rated volts stands for them. */
const RATED_VOLTS_TOLERANCE = 0.02;

/** What one setting of the no-load run gives. */
export interface NoLoadLosses {
  meanVoltsV: number;
  meanAmpsA: number;
  windingLossW: number;
  /** Friction, windage and core together. */
  constantLossW: number;
}

/**
 * Constant loss of a machine that runs uncoupled: what it takes in less what its winding burns.
 *
 * `P_k = P_0 − 1.5·R_LL·I_0²`, the same for star and delta
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | U | `point.voltsV` | V | three line volts, each more than 0 |
 * | I_0 | `point.ampsA` | A | three line amperes, each more than 0; their mean counts |
 * | P_0 | `point.wattsW` | W | more than 0 |
 * | R_LL | `lineResistanceOhm` | Ω | between two leads, winding as warm as in the run |
 *
 * @returns volts, amperes, W
 * @throws OutOfRangeError when a figure is not more than 0 or the winding would burn more than was read
 *
 * Source: IEEE 112-2004 clause 5.5; IEC 60034-2-1. Standing: read; the factor 1.5 from memory.
 * @example
 * noLoadLosses({ voltsV: [401, 400, 399], ampsA: [118.2, 118.0, 117.5], wattsW: 3960 }, 0.013317).constantLossW
 * // → 3682
 */
export function noLoadLosses(point: NoLoadPoint, lineResistanceOhm: number): NoLoadLosses {
  if (!positive(lineResistanceOhm)) throw new OutOfRangeError('lineResistanceOhm', 'Measure the resistance between two leads: more than 0.');
  if (!point.voltsV.every(positive)) throw new OutOfRangeError('voltsV', 'Read the volts of all three lines: more than 0.');
  if (!point.ampsA.every(positive)) throw new OutOfRangeError('ampsA', 'Read the amperes of all three lines: more than 0.');
  if (!positive(point.wattsW)) throw new OutOfRangeError('wattsW', 'Read the watts: more than 0.');
  const meanAmpsA = meanOf(point.ampsA);
  const windingLossW = 1.5 * lineResistanceOhm * meanAmpsA ** 2;
  const constantLossW = point.wattsW - windingLossW;
  if (constantLossW <= 0) {
    throw new OutOfRangeError('wattsW', 'The winding alone burns more than these watts. Check the wattmeter’s range and connection, and the resistance.');
  }
  return { meanVoltsV: meanOf(point.voltsV), meanAmpsA, windingLossW, constantLossW };
}

export interface NoLoadSeparation {
  frictionAndWindageW: number;
  slopeWPerV2: number;
  /** Null when no point stands within 2 % of the rated volts. */
  coreLossW: number | null;
  /** How many low points the line was drawn through. */
  pointsInFit: number;
}

/**
 * Friction and windage apart from core loss: a straight line through the low points, continued to no volts.
 *
 * `P_k = P_fw + s·U²` by least squares over the points up to 60 % of rated volts; `P_fe = P_k(U_rated) − P_fw`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | U, I_0, P_0 | `points` | V, A, W | three or more different volts up to 60 % of rated |
 * | R_LL | `lineResistanceOhm` | Ω | more than 0 |
 * | U_rated | `ratedVoltageV` | V | more than 0 |
 *
 * @returns W and W/V²; a negative figure means the readings do not belong together
 * @throws OutOfRangeError when there are fewer than three different low points
 *
 * Source: IEEE 112-2004 clause 5.5. Standing: read; the 60 % is common practice (IEC 60034-2-1 fits up to 50 %).
 * @example
 * const at = (v, a, wattsW) => ({ voltsV: [v, v, v], ampsA: [a, a, a], wattsW });
 * noLoadSeparation([at(400, 11, 618.9), at(240, 5.6, 327), at(200, 4.7, 282.4), at(160, 3.9, 246.5), at(120, 3.3, 219.5)], 0.6, 400)
 * // → { frictionAndWindageW: 180.02, slopeWPerV2: 0.002062, coreLossW: 329.98, pointsInFit: 4 }
 */
export function noLoadSeparation(points: readonly NoLoadPoint[], lineResistanceOhm: number, ratedVoltageV: number): NoLoadSeparation {
  if (!positive(ratedVoltageV)) throw new OutOfRangeError('ratedVoltageV', 'Enter the rated volts: more than 0.');
  const losses = points.map((point) => noLoadLosses(point, lineResistanceOhm));
  const low = losses.filter((l) => l.meanVoltsV <= LOW_VOLTS_SHARE * ratedVoltageV);
  if (new Set(low.map((l) => l.meanVoltsV)).size < 3) {
    throw new OutOfRangeError('points', 'Take three points or more at different volts, up to 60 % of rated.');
  }
  const squares = low.map((l) => l.meanVoltsV ** 2);
  const meanSquare = meanOf(squares);
  const meanLoss = meanOf(low.map((l) => l.constantLossW));
  const over = low.reduce((sum, l, i) => sum + (squares[i]! - meanSquare) * (l.constantLossW - meanLoss), 0);
  const slopeWPerV2 = over / squares.reduce((sum, x) => sum + (x - meanSquare) ** 2, 0);
  const frictionAndWindageW = meanLoss - slopeWPerV2 * meanSquare;
  const rated = nearestToRated(losses, ratedVoltageV);
  return { frictionAndWindageW, slopeWPerV2, coreLossW: rated ? rated.constantLossW - frictionAndWindageW : null, pointsInFit: low.length };
}

/** The setting that stands for the rated volts, if one comes near enough. */
export function nearestToRated<T extends { meanVoltsV: number }>(settings: readonly T[], ratedVoltageV: number): T | undefined {
  const away = (s: T) => Math.abs(s.meanVoltsV - ratedVoltageV);
  const best = settings.reduce<T | undefined>((nearest, s) => (!nearest || away(s) < away(nearest) ? s : nearest), undefined);
  return best && away(best) <= RATED_VOLTS_TOLERANCE * ratedVoltageV ? best : undefined;
}
