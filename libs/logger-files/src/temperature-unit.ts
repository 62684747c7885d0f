export type TemperatureUnit = 'C' | 'F' | 'K';

const WORDS: Record<string, TemperatureUnit> = { C: 'C', DEGC: 'C', CELSIUS: 'C', F: 'F', DEGF: 'F', FAHRENHEIT: 'F', K: 'K', KELVIN: 'K' };

/**
 * The temperature unit a word stands for: `°C`, `[degF]`, `(K)`, `Celsius`. A degree sign spoilt by a wrong encoding still counts.
 *
 * @returns null where the word is no temperature unit
 *
 * Source: own.
 * @example
 * unitFromText('(°F)')
 * // → 'F'
 */
export function unitFromText(text: string): TemperatureUnit | null {
  const letters = text.trim().replace(/^[[(]|[\])]$/g, '').replace(/[°º˚\ufffd]|Â|℃|℉|deg(?:rees?)?\.?\s*/gi, (sign) => (sign === '℃' ? 'C' : sign === '℉' ? 'F' : ''));
  return WORDS[letters.trim().toUpperCase()] ?? null;
}

/**
 * A temperature in °C.
 *
 * `t_C = (t_F − 32)/1.8` `t_C = T_K − 273.15`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | t | `value` | `unit` | finite |
 *
 * Source: definition of the units.
 * @example
 * toCelsius(698, 'F')
 * // → 370
 */
export function toCelsius(value: number, unit: TemperatureUnit): number {
  if (unit === 'C') return value;
  return unit === 'F' ? (value - 32) / 1.8 : value - 273.15;
}
