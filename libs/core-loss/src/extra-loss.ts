import { OutOfRangeError } from '@libs/quantities';

/** Stands beside every figure of this file, on screen and on paper. */
export const EXTRA_LOSS_CAUTION =
  'An indication only. A ring test loads the back iron and nothing else: it is no efficiency test, and teeth, rotor and the turning field are not in it. The extra watts are the change of the ring test times a core loss that is assumed.';

/** Share of all losses at full load that the core has, when the maker says nothing: 15 to 25 % in usual sizes. */
export const USUAL_CORE_SHARE = { low: 0.15, middle: 0.2, high: 0.25 } as const;

const atLeastZero = (value: number, field: string): number => {
  if (!(Number.isFinite(value) && value >= 0)) throw new OutOfRangeError(field, `${field} must be a number, 0 or more.`);
  return value;
};
const positive = (value: number, field: string): number => {
  if (!(Number.isFinite(value) && value > 0)) throw new OutOfRangeError(field, `${field} must be a number, more than 0.`);
  return value;
};
const efficiencyChecked = (value: number): number => {
  if (!(value > 0 && value < 1)) throw new OutOfRangeError('efficiency', 'An efficiency lies between 0 and 1.');
  return value;
};

/**
 * Core loss of a machine from its plate, assumed as a share of all its losses.
 *
 * `P_core = s·P_out·(1/η − 1)`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | P_out | `ratedPowerW` | W | more than 0 |
 * | η | `efficiency` | – | between 0 and 1 |
 * | s | `coreShare` | – | 0 to 1; 0.2 when left out, 0.15 to 0.25 usual |
 *
 * @returns W
 * @throws OutOfRangeError outside those ranges
 *
 * Source: definition of efficiency; the share as quoted in papers on motor losses. Standing: computed; the share common practice.
 * @example
 * assumedCoreLossW(15000, 0.921)
 * // → 257.3
 */
export function assumedCoreLossW(ratedPowerW: number, efficiency: number, coreShare: number = USUAL_CORE_SHARE.middle): number {
  if (!(coreShare >= 0 && coreShare <= 1)) throw new OutOfRangeError('coreShare', 'The share of the core lies between 0 and 1.');
  return coreShare * positive(ratedPowerW, 'ratedPowerW') * (1 / efficiencyChecked(efficiency) - 1);
}

/**
 * Efficiency of a machine whose loss grew.
 *
 * `η' = P_out / (P_out/η + ΔP)`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | P_out | `ratedPowerW` | W | more than 0 |
 * | η | `efficiency` | – | between 0 and 1 |
 * | ΔP | `extraLossW` | W | any that leaves a loss |
 *
 * @returns fraction
 * @throws OutOfRangeError outside those ranges, or when nothing would be lost any more
 *
 * Source: definition of efficiency. Standing: computed.
 * @example
 * efficiencyWithExtraLoss(15000, 0.921, 51.5)
 * // → 0.9181
 */
export function efficiencyWithExtraLoss(ratedPowerW: number, efficiency: number, extraLossW: number): number {
  const output = positive(ratedPowerW, 'ratedPowerW');
  const input = output / efficiencyChecked(efficiency) + extraLossW;
  if (!(Number.isFinite(input) && input > output)) throw new OutOfRangeError('extraLossW', 'With these watts the machine would lose nothing.');
  return output / input;
}

export interface ExtraLoss {
  extraWatts: number;
  expandedUncertaintyW: number;
  kWhPerYear: number;
  /** In minor units of the currency the tariff was given in; absent without a tariff. */
  amountMinorPerYear?: number;
  caution: typeof EXTRA_LOSS_CAUTION;
}

/**
 * What a risen core loss costs in a year: watts, kilowatt-hours, money. A core's loss runs at every load, so that the hours are those on the line.
 *
 * `ΔP = increase·P_core`, `E = ΔP·h/1000`, `K = E·tariff`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | increase | `change.increase` | – | more than −1; 0.2 is +20 % |
 * | U | `change.expandedUncertainty` | – | of the increase, 0 or more |
 * | P_core | `use.coreLossW` | W | 0 or more; from the maker, or `assumedCoreLossW` |
 * | h | `use.hoursPerYear` | h | 0 to 8784 |
 * | tariff | `use.tariffMinorPerKWh` | minor units/kWh | 0 or more, fractions allowed; leave out where it is not known |
 *
 * @returns watts with the uncertainty of the increase alone, kWh and money a year, and the caution that stands beside them; a fall gives negative figures
 * @throws OutOfRangeError outside those ranges
 *
 * Source: definition of energy; an association article says that a ring test gives no loss for efficiency arithmetic. Standing: computed; the caution read.
 * @example
 * const year = extraLossPerYear({ increase: 0.2, expandedUncertainty: 0.024 }, { coreLossW: 719.4, hoursPerYear: 8000, tariffMinorPerKWh: 10 })
 * year.kWhPerYear
 * // → 1151
 * year.amountMinorPerYear
 * // → 11510
 */
export function extraLossPerYear(
  change: { increase: number; expandedUncertainty: number },
  use: { coreLossW: number; hoursPerYear: number; tariffMinorPerKWh?: number },
): ExtraLoss {
  if (!(Number.isFinite(change.increase) && change.increase > -1)) throw new OutOfRangeError('increase', 'The increase must be a number, more than −100 %.');
  atLeastZero(change.expandedUncertainty, 'expandedUncertainty');
  const coreLossW = atLeastZero(use.coreLossW, 'coreLossW');
  if (!(use.hoursPerYear >= 0 && use.hoursPerYear <= 8784)) throw new OutOfRangeError('hoursPerYear', 'A year has 0 to 8784 hours on the line.');
  const extraWatts = change.increase * coreLossW;
  const kWhPerYear = (extraWatts * use.hoursPerYear) / 1000;
  const { tariffMinorPerKWh } = use;
  return {
    extraWatts,
    expandedUncertaintyW: change.expandedUncertainty * coreLossW,
    kWhPerYear,
    ...(tariffMinorPerKWh === undefined ? {} : { amountMinorPerYear: Math.round(kWhPerYear * atLeastZero(tariffMinorPerKWh, 'tariffMinorPerKWh')) }),
    caution: EXTRA_LOSS_CAUTION,
  };
}
