export { toShown, toSi, toSiFrom } from './convert-quantity.js';
export { formatQuantity, formatUsual, type FormatOptions } from './format-quantity.js';
export { KINDS, unitOf, usualDigits, type Kind, type UnitSystem } from './kinds.js';
export { OutOfRangeError } from './out-of-range-error.js';
export { parseQuantity, type ParseCode, type ParseResult } from './parse-quantity.js';
export type { Dimension } from './units.js';
