import { OutOfRangeError } from '@libs/quantities';
import { SINE_FORM_FACTOR } from './ring-reading.js';

/**
 * Loss under a sine of the same peak flux, from a loss read under a wave whose form factor is off. At equal mean volts the flux and
 * its hysteresis are the same; the eddy part goes with the square of the rms volts.
 *
 * `P_sine = P / (h + e·(FF/1.1107)²)`, `h + e = 1`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | P | `loss` | W or W/kg | 0 or more |
 * | FF | `formFactor` | – | 1 to 2; 1.1107 is a sine |
 * | e | `eddyShare` | – | 0 to 1, share of all that is not hysteresis; from a separation, or 0.3 to 0.5 on usual motor steel |
 *
 * @returns in the unit of `loss`
 * @throws OutOfRangeError outside those ranges
 *
 * Source: form of ASTM A343. Standing: from memory. The usual share: common practice.
 * @example
 * lossAtSine(3, 1.15, 0.4)
 * // → 2.916
 */
export function lossAtSine(loss: number, formFactor: number, eddyShare: number): number {
  if (!(Number.isFinite(loss) && loss >= 0)) throw new OutOfRangeError('loss', 'The loss must be 0 or more.');
  if (!(formFactor >= 1 && formFactor <= 2)) throw new OutOfRangeError('formFactor', 'The form factor lies between 1 and 2; a sine has 1.111.');
  if (!(eddyShare >= 0 && eddyShare <= 1)) throw new OutOfRangeError('eddyShare', 'The share of the eddy loss lies between 0 and 1.');
  return loss / (1 - eddyShare + eddyShare * (formFactor / SINE_FORM_FACTOR) ** 2);
}
