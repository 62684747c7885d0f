import { exactFromText, over, times, type Exact } from './exact-decimal.js';

/** What a unit measures. Kinds that share a dimension (a length in mm, a cable in m) read each other's units. */
export type Dimension =
  | 'length'
  | 'area'
  | 'mass'
  | 'density'
  | 'flux density'
  | 'specific loss'
  | 'specific apparent power'
  | 'temperature'
  | 'temperature difference'
  | 'resistance'
  | 'voltage'
  | 'current'
  | 'current density'
  | 'power'
  | 'apparent power'
  | 'frequency'
  | 'magnetic field'
  | 'angle'
  | 'fraction'
  | 'speed'
  | 'vibration velocity'
  | 'duration'
  | 'unbalance'
  | 'number';

export interface Unit {
  symbol: string;
  dimension: Dimension;
  /** Inside value = (shown − zero) × factor. */
  factor: Exact;
  zero: Exact;
  aliases: readonly string[];
}

const x = exactFromText;
/** Forty places: no double can tell it from the number itself. */
const PI = x('3.1415926535897932384626433832795028841972');
const INCH = x('0.0254'); // m, exact: international yard and pound of 1959, in NIST SP 811 appendix B
const POUND = x('0.45359237'); // kg, exact: same source
const SQUARE_INCH = times(INCH, INCH);
const ONE = x('1');

const unit = (dimension: Dimension, symbol: string, factor: Exact | string, aliases: readonly string[] = [], zero = '0'): Unit => ({
  symbol,
  dimension,
  factor: typeof factor === 'string' ? x(factor) : factor,
  zero: x(zero),
  aliases,
});

/** Every unit that may be typed or pasted. The inside unit of each dimension is the one with factor 1. */
export const UNITS: readonly Unit[] = [
  unit('length', 'mm', '0.001'),
  unit('length', 'cm', '0.01'),
  unit('length', 'm', '1', ['metre', 'meter']),
  unit('length', 'µm', '0.000001', ['um', 'micron']),
  unit('length', 'in', INCH, ['inch', 'inches', '"', '”', "''", '″']),
  unit('length', 'ft', '0.3048', ['foot', 'feet']),
  unit('length', 'mil', '0.0000254', ['mils', 'thou']),
  unit('area', 'mm²', '0.000001', ['sqmm']),
  unit('area', 'cm²', '0.0001'),
  unit('area', 'm²', '1'),
  unit('area', 'in²', SQUARE_INCH, ['sqin']),
  // a circular mil is the area of a wire one mil thick
  unit('area', 'cmil', times(over(PI, x('4')), times(x('0.0000254'), x('0.0000254'))), ['circularmil', 'circmil']),
  unit('area', 'kcmil', times(over(PI, x('4')), times(x('0.0254'), x('0.0000254'))), ['mcm']),
  unit('mass', 'kg', '1'),
  unit('mass', 'g', '0.001'),
  unit('mass', 't', '1000'),
  unit('mass', 'lb', POUND, ['lbs', 'lbm', 'pound', 'pounds']),
  unit('mass', 'oz', '0.028349523125'),
  unit('density', 'kg/m³', '1'),
  unit('density', 'g/cm³', '1000'),
  unit('density', 'lb/in³', over(POUND, times(SQUARE_INCH, INCH))),
  unit('flux density', 'T', '1', ['tesla']),
  unit('flux density', 'mT', '0.001'),
  unit('flux density', 'G', '0.0001', ['gauss']),
  unit('flux density', 'kG', '0.1', ['kilogauss']),
  // one line is one maxwell, 1e-8 Wb
  unit('flux density', 'kl/in²', over(x('0.00001'), SQUARE_INCH), ['kilolines/in2', 'kiloline/in2', 'klines/in2', 'kl/sqin']),
  unit('flux density', 'lines/in²', over(x('0.00000001'), SQUARE_INCH), ['line/in2', 'lines/sqin', 'l/in2']),
  unit('specific loss', 'W/kg', '1'),
  unit('specific loss', 'W/lb', over(ONE, POUND), ['w/lbs']),
  unit('specific apparent power', 'VA/kg', '1'),
  unit('specific apparent power', 'VA/lb', over(ONE, POUND), ['va/lbs']),
  unit('temperature', '°C', '1', ['C', 'degC', 'ºC']),
  unit('temperature', '°F', over(x('5'), x('9')), ['F', 'degF', 'ºF'], '32'),
  unit('temperature', 'K', '1', ['kelvin'], '273.15'),
  unit('temperature difference', 'K', '1', ['°C', 'C', 'degC', 'ºC', 'kelvin']),
  unit('temperature difference', '°F', over(x('5'), x('9')), ['F', 'degF', 'ºF']),
  unit('resistance', 'Ω', '1', ['ohms', 'R']),
  unit('resistance', 'mΩ', '0.001', ['milliohm', 'milliohms']),
  unit('resistance', 'µΩ', '0.000001', ['microohm', 'microhm']),
  unit('resistance', 'kΩ', '1000', ['kiloohm', 'kilohm']),
  unit('resistance', 'MΩ', '1000000', ['megohm', 'megohms', 'megaohm', 'Meg']),
  unit('resistance', 'GΩ', '1000000000', ['gigohm', 'gigaohm']),
  unit('resistance', 'TΩ', '1000000000000', ['teraohm']),
  unit('voltage', 'V', '1', ['volt', 'volts']),
  unit('voltage', 'mV', '0.001'),
  unit('voltage', 'kV', '1000'),
  unit('current', 'A', '1', ['amp', 'amps', 'ampere', 'amperes']),
  unit('current', 'mA', '0.001'),
  unit('current', 'µA', '0.000001'),
  unit('current', 'kA', '1000'),
  unit('current density', 'A/m²', '1'),
  unit('current density', 'A/mm²', '1000000'),
  unit('current density', 'A/in²', over(ONE, SQUARE_INCH)),
  unit('power', 'W', '1', ['watt', 'watts']),
  unit('power', 'kW', '1000'),
  unit('power', 'MW', '1000000'),
  // 550 ft·lbf/s with standard gravity, exact
  unit('power', 'hp', times(times(x('550'), x('0.3048')), times(POUND, x('9.80665')))),
  unit('power', 'PS', '735.49875'),
  unit('apparent power', 'VA', '1'),
  unit('apparent power', 'kVA', '1000'),
  unit('apparent power', 'MVA', '1000000'),
  unit('frequency', 'Hz', '1', ['cps']),
  unit('frequency', 'kHz', '1000'),
  unit('magnetic field', 'A/m', '1'),
  unit('magnetic field', 'A/cm', '100'),
  unit('magnetic field', 'A/in', over(ONE, INCH)),
  unit('magnetic field', 'Oe', over(x('1000'), times(x('4'), PI)), ['oersted']),
  unit('angle', 'rad', '1'),
  unit('angle', '°', over(PI, x('180')), ['deg', 'º', 'degrees']),
  unit('angle', '′', over(PI, x('10800')), ["'", 'minutes']),
  unit('fraction', '%', '0.01', ['percent', 'pct']),
  unit('speed', 'rpm', '1', ['1/min', 'r/min', 'min-1', 'min⁻¹']),
  unit('vibration velocity', 'm/s', '1'),
  unit('vibration velocity', 'mm/s', '0.001'),
  unit('vibration velocity', 'in/s', INCH, ['ips']),
  unit('duration', 'min', '1', ['minute', 'minutes']),
  unit('duration', 's', over(ONE, x('60')), ['sec', 'seconds']),
  unit('duration', 'h', '60', ['hr', 'hours', 'hour']),
  unit('unbalance', 'kg·m', '1'),
  unit('unbalance', 'g·mm', '0.000001', ['gmm', 'g-mm', 'g*mm']),
  unit('unbalance', 'oz·in', times(x('0.028349523125'), INCH), ['ozin', 'oz-in', 'oz*in']),
  unit('number', '', '1'),
];

const plain = (symbol: string) =>
  symbol
    .replace(/\s+/g, '')
    .replace(/\^?²|\^2/g, '2')
    .replace(/\^?³|\^3/g, '3')
    .replace(/[Ωω\u2126]/g, 'ohm')
    .replace(/[µμ]/g, 'u')
    .replace(/[·⋅]/g, '.');

const spellings = (u: Unit) => [u.symbol, ...u.aliases].map(plain);

/**
 * The unit a person meant. Case counts first (mΩ is not MΩ); where only one unit of the dimension could be meant
 * whatever the case, KW or HZ will do.
 */
export function findUnit(text: string, dimension: Dimension): Unit | undefined {
  const wanted = plain(text);
  const own = UNITS.filter((u) => u.dimension === dimension);
  const exactly = own.find((u) => spellings(u).includes(wanted));
  if (exactly) return exactly;
  const lower = wanted.toLowerCase();
  const loosely = own.filter((u) => spellings(u).some((s) => s.toLowerCase() === lower));
  return loosely.length === 1 ? loosely[0] : undefined;
}

/** What a unit of some other field measures, to say why it does not fit here. */
export function dimensionOf(text: string): Dimension | undefined {
  if (text === '') return undefined;
  return UNITS.map((u) => u.dimension).find((d) => findUnit(text, d) !== undefined);
}
