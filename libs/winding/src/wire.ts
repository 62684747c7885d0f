import { OutOfRangeError } from '@libs/quantities';
import { positive, type Conductor } from './winding-data.js';

const INCH_M = 0.0254;

/** One circular mil, the area of a wire of one thousandth of an inch: π/4 mil². */
export const CIRCULAR_MIL_M2 = (Math.PI / 4) * (INCH_M / 1000) ** 2;

/**
 * Bare diameter of an American wire gauge. 1/0, 2/0, 3/0 and 4/0 are gauges 0, −1, −2 and −3.
 *
 * `d = 0.005 in · 92^((36 − n)/39)`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | n | `gauge` | – | −3 to 56 |
 *
 * @returns m, exact by the formula; tables of magnet wire round to 0.0001 in first and differ by up to 0.25 %
 * @throws OutOfRangeError outside that range
 *
 * Source: ASTM B258. Standing: read.
 * @example
 * awgDiameter(18) * 1000
 * // → 1.0237
 */
export function awgDiameter(gauge: number): number {
  if (!Number.isFinite(gauge) || gauge < -3 || gauge > 56) throw new OutOfRangeError('gauge', 'American wire gauges run from 4/0 (−3) to 56.');
  return 0.005 * INCH_M * 92 ** ((36 - gauge) / 39);
}

/**
 * Reads a gauge as the trade writes it.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `text` | – | "18", "AWG 18", "4/0", "0000" |
 *
 * @returns the number for `awgDiameter`, or undefined when the text is no gauge
 *
 * Source: ASTM B258 names. Standing: from memory.
 * @example
 * awgGauge('4/0')
 * // → -3
 */
export function awgGauge(text: string): number | undefined {
  const bare = text.trim().replace(/^(awg|#)\s*|\s*awg$/gi, '');
  const aught = /^([1-4])\/0$/.exec(bare);
  if (aught) return 1 - Number(aught[1]);
  if (/^0{1,4}$/.test(bare)) return 1 - bare.length;
  const gauge = /^\d{1,2}$/.test(bare) ? Number(bare) : NaN;
  return gauge >= 1 && gauge <= 56 ? gauge : undefined;
}

/** Name of a gauge: 4/0 for −3, 18 for 18. */
export const awgName = (gauge: number): string => (gauge <= 0 ? `${1 - gauge}/0` : String(gauge));

/**
 * Area of the copper of one turn: all strands of all sizes in parallel.
 *
 * `A = Σ n·π/4·d²`, or `n·w·t` for flat wire (rounded corners left out)
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | n | `wires[].strands` | – | 1 or more |
 * | d | `wires[].bareDiameterM` | m | more than 0 |
 * | w, t | `wires[].widthM`, `.thicknessM` | m | more than 0 |
 *
 * @returns m²
 * @throws OutOfRangeError when there is no wire or a figure is not more than 0
 *
 * Source: geometry. Standing: exact.
 * @example
 * conductorArea([{ strands: 2, bareDiameterM: 0.00071 }]) / conductorArea([{ strands: 1, bareDiameterM: 0.001 }])
 * // → 1.0082
 */
export function conductorArea(wires: readonly Conductor[]): number {
  if (wires.length === 0) throw new OutOfRangeError('wires', 'Gauge the bare wire and count the strands.');
  return wires.reduce((sum, wire) => {
    const sides = 'bareDiameterM' in wire ? [wire.bareDiameterM] : [wire.widthM, wire.thicknessM];
    if (!positive(wire.strands) || !sides.every(positive)) throw new OutOfRangeError('wires', 'Gauge every wire and count its strands: more than 0.');
    return sum + wire.strands * ('bareDiameterM' in wire ? (Math.PI / 4) * wire.bareDiameterM ** 2 : wire.widthM * wire.thicknessM);
  }, 0);
}

/** A size of round enamelled wire: bare, and the most it may measure over its film. */
export interface MetricWire {
  bareM: number;
  grade1MostM: number;
  grade2MostM: number;
}

const mm = (bare: number, grade1: number, grade2: number): MetricWire => ({ bareM: bare / 1000, grade1MostM: grade1 / 1000, grade2MostM: grade2 / 1000 });

/**
 * Metric sizes with the largest overall diameter for film grade 1 and 2.
 *
 * Source: IEC 60317-0-1. Standing: read in an open list of wire sizes that agrees with memory.
 */
export const METRIC_WIRES: readonly MetricWire[] = [
  mm(0.2, 0.226, 0.239),
  mm(0.25, 0.281, 0.297),
  mm(0.315, 0.349, 0.367),
  mm(0.355, 0.392, 0.411),
  mm(0.4, 0.439, 0.459),
  mm(0.45, 0.491, 0.513),
  mm(0.5, 0.544, 0.566),
  mm(0.56, 0.606, 0.63),
  mm(0.63, 0.679, 0.704),
  mm(0.71, 0.762, 0.789),
  mm(0.8, 0.855, 0.884),
  mm(0.9, 0.959, 0.989),
  mm(1, 1.062, 1.094),
  mm(1.12, 1.184, 1.217),
  mm(1.25, 1.316, 1.349),
  mm(1.4, 1.468, 1.502),
  mm(1.6, 1.67, 1.706),
  mm(1.8, 1.872, 1.909),
  mm(2, 2.074, 2.112),
  mm(2.24, 2.316, 2.355),
  mm(2.5, 2.578, 2.618),
];

/** Further steps of the R20 and R40 series. Source: IEC 60317-0-1. Standing: from memory. */
export const FURTHER_METRIC_SIZES_M: readonly number[] = [0.224, 0.28, 0.425, 0.475, 0.53, 0.6, 0.67, 0.75, 0.85, 0.95, 1.06, 1.18, 1.32, 1.5, 1.7, 1.9, 2.12, 2.36, 2.8, 3.15].map((d) => d / 1000);

/** Every metric size a winder may have on the shelf, thinnest first. */
export const METRIC_SIZES_M: readonly number[] = [...METRIC_WIRES.map((w) => w.bareM), ...FURTHER_METRIC_SIZES_M].sort((a, b) => a - b);
