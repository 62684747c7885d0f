import { findUnit, type Dimension, type Unit } from './units.js';

/** How a person wants to read figures; the stored value is the same for both. */
export type UnitSystem = 'si' | 'inch-pound';

interface KindRow {
  dimension: Dimension;
  /** Unit shown, and digits behind the point that a shop usually reads. */
  si: readonly [unit: string, digits: number];
  inchPound: readonly [unit: string, digits: number];
  /** For messages: what a field of this kind asks for. */
  words: string;
}

/**
 * What a figure is, and with it the unit it is shown in. Inside, every figure is SI, with four exceptions that the
 * trade never writes otherwise: temperatures are °C, speeds rpm, durations minutes, percentages fractions of 1.
 */
export const KIND_ROWS = {
  length: { dimension: 'length', si: ['mm', 1], inchPound: ['in', 3], words: 'a length' },
  'wire-diameter': { dimension: 'length', si: ['mm', 3], inchPound: ['in', 4], words: 'a wire diameter' },
  'cable-length': { dimension: 'length', si: ['m', 1], inchPound: ['ft', 0], words: 'a cable length' },
  deviation: { dimension: 'length', si: ['µm', 0], inchPound: ['mil', 1], words: 'a deviation' },
  area: { dimension: 'area', si: ['mm²', 1], inchPound: ['in²', 3], words: 'an area' },
  mass: { dimension: 'mass', si: ['kg', 2], inchPound: ['lb', 1], words: 'a mass' },
  density: { dimension: 'density', si: ['kg/m³', 0], inchPound: ['lb/in³', 4], words: 'a density' },
  'flux-density': { dimension: 'flux density', si: ['T', 3], inchPound: ['kl/in²', 1], words: 'a flux density' },
  'specific-loss': { dimension: 'specific loss', si: ['W/kg', 2], inchPound: ['W/lb', 2], words: 'a loss per mass' },
  'specific-apparent-power': { dimension: 'specific apparent power', si: ['VA/kg', 1], inchPound: ['VA/lb', 1], words: 'an apparent power per mass' },
  temperature: { dimension: 'temperature', si: ['°C', 1], inchPound: ['°F', 1], words: 'a temperature' },
  'temperature-difference': { dimension: 'temperature difference', si: ['K', 1], inchPound: ['°F', 1], words: 'a temperature difference' },
  resistance: { dimension: 'resistance', si: ['Ω', 4], inchPound: ['Ω', 4], words: 'a resistance' },
  'resistance-milli': { dimension: 'resistance', si: ['mΩ', 3], inchPound: ['mΩ', 3], words: 'a resistance' },
  'resistance-mega': { dimension: 'resistance', si: ['MΩ', 0], inchPound: ['MΩ', 0], words: 'an insulation resistance' },
  voltage: { dimension: 'voltage', si: ['V', 1], inchPound: ['V', 1], words: 'a voltage' },
  current: { dimension: 'current', si: ['A', 1], inchPound: ['A', 1], words: 'a current' },
  'current-density': { dimension: 'current density', si: ['A/mm²', 2], inchPound: ['A/in²', 0], words: 'a current density' },
  power: { dimension: 'power', si: ['W', 1], inchPound: ['W', 1], words: 'a power' },
  'rated-power': { dimension: 'power', si: ['kW', 2], inchPound: ['hp', 1], words: 'a rated power' },
  'apparent-power': { dimension: 'apparent power', si: ['kVA', 2], inchPound: ['kVA', 2], words: 'an apparent power' },
  frequency: { dimension: 'frequency', si: ['Hz', 2], inchPound: ['Hz', 2], words: 'a frequency' },
  field: { dimension: 'magnetic field', si: ['A/m', 0], inchPound: ['A/in', 2], words: 'a magnetic field' },
  angle: { dimension: 'angle', si: ['°', 1], inchPound: ['°', 1], words: 'an angle' },
  percent: { dimension: 'fraction', si: ['%', 1], inchPound: ['%', 1], words: 'a percentage' },
  speed: { dimension: 'speed', si: ['rpm', 0], inchPound: ['rpm', 0], words: 'a speed' },
  'vibration-velocity': { dimension: 'vibration velocity', si: ['mm/s', 2], inchPound: ['in/s', 3], words: 'a vibration velocity' },
  duration: { dimension: 'duration', si: ['min', 0], inchPound: ['min', 0], words: 'a time in minutes' },
  unbalance: { dimension: 'unbalance', si: ['g·mm', 1], inchPound: ['oz·in', 3], words: 'an unbalance' },
  count: { dimension: 'number', si: ['', 0], inchPound: ['', 0], words: 'a whole number' },
  number: { dimension: 'number', si: ['', 3], inchPound: ['', 3], words: 'a number' },
} as const satisfies Record<string, KindRow>;

export type Kind = keyof typeof KIND_ROWS;

/** Every kind there is, in the order of the table above. */
export const KINDS = Object.keys(KIND_ROWS) as readonly Kind[];

const row = (kind: Kind): KindRow => KIND_ROWS[kind];
const shown = (kind: Kind, system: UnitSystem) => (system === 'si' ? row(kind).si : row(kind).inchPound);

/**
 * The unit a kind is shown in.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `kind` | – | one of `KINDS` |
 * | – | `system` | – | `'si'` or `'inch-pound'` |
 *
 * @returns the symbol, such as `mm`; an empty string for counts and plain numbers
 * @example
 * unitOf('flux-density', 'inch-pound')
 * // → 'kl/in²'
 */
export const unitOf = (kind: Kind, system: UnitSystem): string => shown(kind, system)[0];

/**
 * Digits behind the point that a shop usually reads for a kind: for tables and papers, never for fields.
 *
 * @returns a whole number, 0 or more
 * @example
 * usualDigits('specific-loss', 'si')
 * // → 2
 */
export const usualDigits = (kind: Kind, system: UnitSystem): number => shown(kind, system)[1];

/** The unit row itself, for conversion. Every symbol in the table exists, which a test holds. */
export function shownUnit(kind: Kind, system: UnitSystem): Unit {
  const found = findUnit(unitOf(kind, system), row(kind).dimension);
  if (!found) throw new Error(`The unit of ${kind} is not in the table of units.`);
  return found;
}

export const dimensionOfKind = (kind: Kind): Dimension => row(kind).dimension;
export const wordsOfKind = (kind: Kind): string => row(kind).words;
