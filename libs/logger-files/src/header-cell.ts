import { unitFromText, type TemperatureUnit } from './temperature-unit.js';

export interface HeaderCell {
  readonly name: string;
  readonly unit: TemperatureUnit | null;
  /** a unit stands there that is no temperature: humidity, volts, pressure */
  readonly otherUnit: boolean;
}

/**
 * Name and unit of a column from its heading: `Core 1 (°C)`, `T2 [degF]`, `Oven, °C`.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `cell` | text | any |
 * | – | `unitCell` | text | the cell below, where the file has a row of units |
 *
 * @returns the name as written, without the unit
 *
 * Source: own.
 * @example
 * readHeaderCell('Core 1 (°C)')
 * // → { name: 'Core 1', unit: 'C', otherUnit: false }
 */
export function readHeaderCell(cell: string, unitCell = ''): HeaderCell {
  const below = unitFromText(unitCell);
  if (unitCell !== '') return { name: cell, unit: below, otherUnit: below === null };
  const bracketed = /^(.*?)\s*[[(]([^\])]*)[\])]$/.exec(cell);
  if (bracketed) {
    const unit = unitFromText(bracketed[2]!);
    if (unit !== null) return { name: bracketed[1]!, unit, otherUnit: false };
    return isOtherUnit(bracketed[2]!) ? { name: bracketed[1]!, unit: null, otherUnit: true } : { name: cell, unit: null, otherUnit: false };
  }
  // a bare letter is a name ("C", "F"); with its degree sign, or after a comma, it is a unit
  const trailing = /^(.*?)[\s,_]*((?:°|º|deg\.?\s?)[CF]|℃|℉)$/i.exec(cell) ?? /^(.+?),\s*([CFK])$/.exec(cell);
  return trailing ? { name: trailing[1]!, unit: unitFromText(trailing[2]!), otherUnit: false } : { name: cell, unit: null, otherUnit: false };
}

const isOtherUnit = (text: string) => /^(?:%|%?\s?rh|m?v|m?a|k?w|k?pa|m?bar|hz|rpm|ohm|Ω|l\/min|m\/s)$/i.test(text.trim());
