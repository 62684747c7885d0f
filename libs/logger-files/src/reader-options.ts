import type { ElapsedUnit } from './find-time-column.js';
import type { DecimalMark } from './number-cell.js';
import { OutOfRangeError } from './out-of-range-error.js';
import type { Separator } from './row-cells.js';
import type { TemperatureUnit } from './temperature-unit.js';
import type { DateOrder } from './time-cell.js';

export interface LoggerReaderOptions {
  /** temperatures whose time above is counted; 345 and 370 °C unless told */
  readonly limitsC?: readonly number[];
  /** added to every reading, for a thermocouple that is known to read wrong; one figure, or one for each channel by name */
  readonly thermocoupleOffsetK?: number | Readonly<Record<string, number>>;
  /** of channels whose unit the file does not state; °C unless told */
  readonly unit?: TemperatureUnit;
  /** a longer step is a gap; three usual steps unless told */
  readonly gapAfterMinutes?: number;
  /** time a heating or cooling rate is taken over; 10 minutes unless told */
  readonly rateOverMinutes?: number;
  /** readings outside are an open or shorted thermocouple; −50 to 1200 °C unless told */
  readonly plausibleC?: { readonly lowest: number; readonly highest: number };
  /** what the file leaves open may be said here */
  readonly separator?: Separator;
  readonly decimalMark?: DecimalMark;
  readonly dateOrder?: DateOrder;
  readonly elapsedUnit?: ElapsedUnit;
}

export const USUAL_LIMITS_C: readonly number[] = [345, 370];

function finite(value: number, field: string, words: string, above = -Infinity): number {
  if (!(Number.isFinite(value) && value > above)) throw new OutOfRangeError(field, words);
  return value;
}

/** The options with what is usual filled in; whatever cannot be used is refused before the first row. */
export function checkedOptions(options: LoggerReaderOptions) {
  const { thermocoupleOffsetK: offset = 0, plausibleC = { lowest: -50, highest: 1200 }, gapAfterMinutes } = options;
  const offsets = typeof offset === 'number' ? [offset] : Object.values(offset);
  for (const k of offsets) finite(k, 'thermocoupleOffsetK', 'The offset of a thermocouple must be a number, in kelvin.');
  finite(plausibleC.lowest, 'plausibleC', 'The lowest temperature a reading may have must be a number.');
  finite(plausibleC.highest, 'plausibleC', 'The highest temperature a reading may have must stand above the lowest.', plausibleC.lowest);
  return {
    limitsC: (options.limitsC ?? USUAL_LIMITS_C).map((limit) => finite(limit, 'limitsC', 'A limit must be a temperature in °C.')),
    offsetFor: (name: string) => (typeof offset === 'number' ? offset : Object.hasOwn(offset, name) ? offset[name]! : 0),
    unit: options.unit ?? 'C',
    gapAfterS: gapAfterMinutes === undefined ? null : finite(gapAfterMinutes, 'gapAfterMinutes', 'A gap must be longer than nothing.', 0) * 60,
    rateOverS: finite(options.rateOverMinutes ?? 10, 'rateOverMinutes', 'The time a rate is taken over must be more than 0.', 0) * 60,
    plausibleC,
  };
}
export type CheckedOptions = ReturnType<typeof checkedOptions>;
