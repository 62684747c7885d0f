import { exactInside, exactShown } from './convert-quantity.js';
import { exactFromNumber, exactFromText, fixedText, nearestNumber, significantText } from './exact-decimal.js';
import { shownUnit, unitOf, usualDigits, type Kind, type UnitSystem } from './kinds.js';
import { OutOfRangeError } from './out-of-range-error.js';
import type { Unit } from './units.js';

export interface FormatOptions {
  /** Digits behind the point. */
  digits?: number;
  /** Significant digits; ignored when `digits` is given. */
  significant?: number;
  /** Write the unit behind the figure; true when left out. */
  unit?: boolean;
  /** Decimal sign; a point when left out. */
  decimal?: '.' | ',';
}

/** The shortest text in this unit that reads back as the very same double. */
function losslessText(si: number, unit: Unit): string {
  const shown = exactShown(exactFromNumber(si), unit);
  for (let significant = 1; significant < 40; significant += 1) {
    const text = significantText(shown, significant, false);
    if (nearestNumber(exactInside(exactFromText(text), unit)) === si) return text;
  }
  return significantText(shown, 40, false);
}

/** `12,345` would read as twelve thousand to some: one more digit says that the comma is a decimal sign. */
const withComma = (text: string) => text.replace('.', ',').replace(/^(-?[1-9]\d{0,2},\d{3})$/, '$10');

/**
 * Writes a figure in the reader's system. With neither `digits` nor `significant` nothing is lost: the text, read by
 * `parseQuantity`, gives the same number back bit by bit, so that a field may be shown in inches and stored in metres.
 * Rounding is half away from zero, of the figure as a person would write it (1.005 to two digits is 1.01).
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `si` | SI (°C, rpm, min, fraction) | finite |
 * | – | `kind` | – | one of `KINDS` |
 * | – | `system` | – | `'si'` or `'inch-pound'` |
 * | – | `options.digits` | – | 0 to 20 |
 * | – | `options.significant` | – | 1 to 20 |
 *
 * @returns text such as `12.5 mm`
 * @throws OutOfRangeError when the value is not finite or the digits are out of range
 *
 * Source: conversion as `toSi`. Standing: exact by definition.
 * @example
 * formatQuantity(0.034925, 'length', 'inch-pound')
 * // → '1.375 in'
 * @example
 * formatQuantity(2.84, 'specific-loss', 'inch-pound', { digits: 2 })
 * // → '1.29 W/lb'
 */
export function formatQuantity(si: number, kind: Kind, system: UnitSystem, options: FormatOptions = {}): string {
  if (!Number.isFinite(si)) throw new OutOfRangeError('si', 'Only a finite number can be written.');
  const { digits, significant } = options;
  if (digits !== undefined && !(Number.isInteger(digits) && digits >= 0 && digits <= 20)) {
    throw new OutOfRangeError('digits', 'Digits behind the point run from 0 to 20.');
  }
  if (significant !== undefined && !(Number.isInteger(significant) && significant >= 1 && significant <= 20)) {
    throw new OutOfRangeError('significant', 'Significant digits run from 1 to 20.');
  }
  const full = losslessText(si, shownUnit(kind, system));
  let text = full;
  if (digits !== undefined) text = fixedText(exactFromText(full), digits);
  else if (significant !== undefined) text = significantText(exactFromText(full), significant, true);
  if (options.decimal === ',') text = withComma(text);
  const unit = unitOf(kind, system);
  if (options.unit === false || unit === '') return text;
  return unit === '%' || unit === '°' ? `${text}${unit === '%' ? ' ' : ''}${unit}` : `${text} ${unit}`;
}

/**
 * Writes a figure with the digits a shop usually reads: for tables and papers.
 *
 * @returns text such as `2.84 W/kg`
 * @throws OutOfRangeError when the value is not finite
 * @example
 * formatUsual(1.3175, 'flux-density', 'inch-pound')
 * // → '85.0 kl/in²'
 */
export const formatUsual = (si: number, kind: Kind, system: UnitSystem, options: Omit<FormatOptions, 'digits' | 'significant'> = {}): string =>
  formatQuantity(si, kind, system, { ...options, digits: usualDigits(kind, system) });
