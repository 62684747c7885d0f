import { exactFromNumber, minus, nearestNumber, over, plus, times, type Exact } from './exact-decimal.js';
import { dimensionOfKind, shownUnit, type Kind, type UnitSystem } from './kinds.js';
import { OutOfRangeError } from './out-of-range-error.js';
import { findUnit, type Unit } from './units.js';

export const exactInside = (value: Exact, unit: Unit): Exact => times(minus(value, unit.zero), unit.factor);
export const exactShown = (value: Exact, unit: Unit): Exact => plus(over(value, unit.factor), unit.zero);

const finite = (value: number, field: string): number => {
  if (!Number.isFinite(value)) throw new OutOfRangeError(field, 'A quantity must be a finite number.');
  return value;
};

/**
 * The figure inside for a figure shown in a system's unit.
 *
 * `inside = (shown − zero) × factor`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | shown | `shownValue` | unit of the kind in that system | finite |
 *
 * @returns the SI value (°C, rpm, min and fractions where the trade writes those)
 * @throws OutOfRangeError when the value is not finite
 *
 * Source: international yard and pound, exact, as listed in NIST SP 811 appendix B; 1 line = 1 maxwell = 1e-8 Wb.
 * Standing: exact by definition.
 * @example
 * toSi(85, 'flux-density', 'inch-pound')
 * // → 1.3175026
 */
export const toSi = (shownValue: number, kind: Kind, system: UnitSystem): number =>
  nearestNumber(exactInside(exactFromNumber(finite(shownValue, 'shownValue')), shownUnit(kind, system)));

/**
 * The figure shown in a system's unit for a figure inside: the inverse of `toSi`, for axes and drawings.
 *
 * `shown = inside / factor + zero`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | inside | `si` | SI | finite |
 *
 * @throws OutOfRangeError when the value is not finite
 *
 * Source: as `toSi`. Standing: exact by definition.
 * @example
 * toShown(0.0254, 'length', 'inch-pound')
 * // → 1
 */
export const toShown = (si: number, kind: Kind, system: UnitSystem): number =>
  nearestNumber(exactShown(exactFromNumber(finite(si, 'si')), shownUnit(kind, system)));

/**
 * A figure in a named unit turned into SI, for files and certificates of others.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `value` | `unit` | finite |
 * | – | `unit` | – | any unit of the kind's dimension |
 *
 * @throws OutOfRangeError when the value is not finite or the unit measures something else
 *
 * Source: as `toSi`. Standing: exact by definition.
 * @example
 * toSiFrom(1, 'Oe', 'field')
 * // → 79.577472
 */
export function toSiFrom(value: number, unit: string, kind: Kind): number {
  const found = findUnit(unit, dimensionOfKind(kind));
  if (!found) throw new OutOfRangeError('unit', `${unit} does not measure ${dimensionOfKind(kind)}.`);
  return nearestNumber(exactInside(exactFromNumber(finite(value, 'value')), found));
}
