import { OutOfRangeError } from '@libs/quantities';
import { DEFAULT_MACHINE_TEST_LIMITS, type MachineTestLimit, type MachineTestLimits } from './limits.js';
import type { VibrationReading } from './readings.js';

const positive = (value: unknown): value is number => typeof value === 'number' && Number.isFinite(value) && value > 0;

/** The table starts here; smaller machines have no row. */
export const LEAST_SHAFT_HEIGHT_M = 0.056;
/** Up to this speed NEMA limits displacement, 0.0025 in peak to peak, instead of velocity. */
const NEMA_DISPLACEMENT_TO_RPM = 1200;
const NEMA_DISPLACEMENT_M = 0.0025 * 0.0254;

/**
 * Vibration limit of an uncoupled machine with half a key.
 *
 * IEC 60034-14:2003 grade A or B: rms by shaft height H (56 to 132, over 132 to 280, over 280 mm) and mounting; grade B
 * has no figure for rigid mounting up to 132 mm.
 * NEMA MG 1: 0.15 in/s peak resilient, 0.8 of it rigid; up to 1200 rpm 0.0025 in peak to peak, here as the velocity it
 * has at running speed: `v = π·d·n/60`.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | H | `reading.shaftHeightM` | m | 0.056 or more; only for IEC |
 * | n | `reading.speedRpm` | rpm | more than 0; only for NEMA |
 * | – | `limits` | m/s | the shop's |
 *
 * @returns the limit in m/s with its source; rms for IEC, peak for NEMA
 * @throws OutOfRangeError when shaft height (IEC) or speed (NEMA) is missing or outside the table, or the grade has no figure
 *
 * Source: IEC 60034-14:2003 (the 2018 edition revised the table); NEMA MG 1 Part 7 as in ANSI/EASA AR100-2015 4.5.6.
 * Standing: read; the conversion of displacement is computed.
 * @example
 * vibrationLimit({ standard: 'iec-60034-14-2003', mounting: 'free-suspension', shaftHeightM: 0.315, speedRpm: 1499 }).value
 * // → 0.0028
 */
export function vibrationLimit(reading: Pick<VibrationReading, 'standard' | 'mounting' | 'grade' | 'shaftHeightM' | 'speedRpm'>, limits: MachineTestLimits = DEFAULT_MACHINE_TEST_LIMITS): MachineTestLimit {
  const rigid = reading.mounting === 'rigid';
  if (reading.standard === 'nema-mg1') {
    if (!positive(reading.speedRpm)) throw new OutOfRangeError('speedRpm', 'Enter the speed: the NEMA limit depends on it.');
    const row = rigid ? limits.vibrationNemaRigid : limits.vibrationNemaResilient;
    if (reading.speedRpm > NEMA_DISPLACEMENT_TO_RPM) return row;
    const value = ((Math.PI * reading.speedRpm) / 60) * NEMA_DISPLACEMENT_M * (rigid ? 0.8 : 1);
    return { ...row, value, source: `${row.source}; up to 1200 rpm 0.0025 in peak to peak, as velocity at running speed` };
  }
  const height = reading.shaftHeightM;
  if (!positive(height)) throw new OutOfRangeError('shaftHeightM', 'Enter the shaft height: the IEC limit goes by it.');
  if (height < LEAST_SHAFT_HEIGHT_M) throw new OutOfRangeError('shaftHeightM', 'The IEC table starts at 56 mm shaft height. Check the height, or take the NEMA limit.');
  const band = height <= 0.132 ? 'To132' : height <= 0.28 ? 'To280' : 'Above280';
  if (reading.grade !== 'B') return limits[`vibration${rigid ? 'Rigid' : 'Free'}${band}`];
  if (!rigid) return limits[`vibrationGradeBFree${band}`];
  if (band === 'To132') throw new OutOfRangeError('grade', 'Grade B has no figure for rigid mounting up to 132 mm shaft height. Hang the machine freely, or take grade A.');
  return limits[`vibrationGradeBRigid${band}`];
}
