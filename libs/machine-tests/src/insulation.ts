import { OutOfRangeError } from '@libs/quantities';
import { DEFAULT_MACHINE_TEST_LIMITS, type MachineTestLimit, type MachineTestLimits } from './limits.js';
import type { CorrectionRule, InsulationReading } from './readings.js';

const finite = (value: unknown): value is number => typeof value === 'number' && Number.isFinite(value);

/** Where each rule may be used. Halving has no bounds in print; these keep a slip of the pen out. */
export const CORRECTION_RANGE_C = { halving: [-20, 130], thermosetting: [10, 85] } as const satisfies Record<CorrectionRule, readonly [number, number]>;

/**
 * Factor that carries an insulation resistance from the winding's temperature to 40 °C.
 *
 * `R_40 = K_T · R_T`; halving: `K_T = 0.5^((40 − T)/10)`;
 * thermosetting: `K_T = exp(−B·(1/(T + 273) − 1/313))`, B = 4230 above 40 °C, 1245 below
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | T | `windingTemperatureC` | °C | −20 to 130 (halving), 10 to 85 (thermosetting) |
 * | – | `rule` | – | the report names it: at 25 °C the two differ by 2.3 times |
 *
 * @returns K_T, a ratio
 * @throws OutOfRangeError outside the range of the rule
 *
 * Source: IEEE 43-2013; the halving rule is its general rule before 2013. Standing: from memory, values computed.
 * @example
 * insulationCorrectionTo40C(25, 'thermosetting')
 * // → 0.8186
 */
export function insulationCorrectionTo40C(windingTemperatureC: number, rule: CorrectionRule): number {
  const [least, most] = CORRECTION_RANGE_C[rule];
  if (!finite(windingTemperatureC) || windingTemperatureC < least || windingTemperatureC > most) {
    throw new OutOfRangeError('windingTemperatureC', `This correction holds from ${least} to ${most} °C. Measure again with the winding in that range.`);
  }
  if (rule === 'halving') return 0.5 ** ((40 - windingTemperatureC) / 10);
  return Math.exp(-(windingTemperatureC > 40 ? 4230 : 1245) * (1 / (windingTemperatureC + 273) - 1 / 313));
}

const TEST_VOLTS = [
  { belowV: 1000, leastV: 500, mostV: 500 },
  { belowV: 2501, leastV: 500, mostV: 1000 },
  { belowV: 5001, leastV: 1000, mostV: 2500 },
  { belowV: 12001, leastV: 2500, mostV: 5000 },
  { belowV: Infinity, leastV: 5000, mostV: 10000 },
];

/**
 * DC volts to test the insulation of a winding with.
 *
 * under 1000 V: 500; 1000 to 2500 V: 500 to 1000; to 5000 V: 1000 to 2500; to 12000 V: 2500 to 5000; above: 5000 to 10000
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | U | `ratedVoltageV` | V | line to line, or DC volts; more than 0 |
 *
 * @returns the least and the most test volts, DC
 * @throws OutOfRangeError when the rated volts are not more than 0
 *
 * Source: IEEE 43, table of test voltages. Standing: quoted in a source that was read.
 * @example
 * insulationTestVolts(6600)
 * // → { leastV: 2500, mostV: 5000 }
 */
export function insulationTestVolts(ratedVoltageV: number): { leastV: number; mostV: number } {
  if (!finite(ratedVoltageV) || ratedVoltageV <= 0) throw new OutOfRangeError('ratedVoltageV', 'Enter the rated volts of the winding: more than 0.');
  const row = TEST_VOLTS.find((r) => ratedVoltageV < r.belowV)!;
  return { leastV: row.leastV, mostV: row.mostV };
}

/**
 * The least insulation resistance after one minute at 40 °C.
 *
 * random-wound, form-wound under 1 kV and DC armature: 5 MΩ; form-wound from 1 kV: 100 MΩ; field: `kV + 1` MΩ
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `reading.windingKind` | – | |
 * | U | `reading.ratedVoltageV` | V | more than 0 |
 * | – | `limits` | Ω | the shop's |
 *
 * @returns the limit in Ω with its source
 * @throws OutOfRangeError when the rated volts are not more than 0
 *
 * Source: IEEE 43-2013. Standing: from memory; the kV + 1 rule and the armature figure quoted in sources that were read.
 * @example
 * insulationMinimum({ windingKind: 'field', ratedVoltageV: 400 }).value
 * // → 1400000
 */
export function insulationMinimum(reading: Pick<InsulationReading, 'windingKind' | 'ratedVoltageV'>, limits: MachineTestLimits = DEFAULT_MACHINE_TEST_LIMITS): MachineTestLimit {
  insulationTestVolts(reading.ratedVoltageV);
  if (reading.windingKind === 'field') {
    const base = limits.insulationFieldBaseOhm;
    return { ...base, value: base.value + 1000 * reading.ratedVoltageV };
  }
  if (reading.windingKind === 'dc-armature') return limits.insulationArmatureOhm;
  return reading.windingKind === 'form-wound' && reading.ratedVoltageV >= 1000 ? limits.insulationFormOhm : limits.insulationRandomOhm;
}

/**
 * Polarization index: ten minutes over one minute, without correction as long as the winding keeps its temperature.
 *
 * `PI = R_10min / R_1min`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | R_1min | `oneMinuteOhm` | Ω | more than 0 |
 * | R_10min | `tenMinuteOhm` | Ω | more than 0 |
 *
 * @returns a ratio
 * @throws OutOfRangeError when a resistance is not more than 0
 *
 * Source: IEEE 43. Standing: quoted in a source that was read.
 * @example
 * polarizationIndex(1200e6, 3600e6)
 * // → 3
 */
export function polarizationIndex(oneMinuteOhm: number, tenMinuteOhm: number): number {
  if (!finite(oneMinuteOhm) || oneMinuteOhm <= 0) throw new OutOfRangeError('oneMinuteOhm', 'Enter the resistance after one minute: more than 0.');
  if (!finite(tenMinuteOhm) || tenMinuteOhm <= 0) throw new OutOfRangeError('tenMinuteOhm', 'Enter the resistance after ten minutes: more than 0.');
  return tenMinuteOhm / oneMinuteOhm;
}
