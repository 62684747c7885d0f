import { OutOfRangeError } from '@libs/quantities';
import { phaseBeltSlots, positive, windingProblems, type WindingData } from './winding-data.js';

const DEGREE = Math.PI / 180;

export interface WindingFactors {
  pitch: number;
  distribution: number;
  /** Their product. */
  winding: number;
}

/**
 * Pitch factor: what a coil that does not span a whole pole gives, against one that does.
 *
 * `k_p = sin(90° · y/τ)`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | y | `spanSlots` | slots | more than 0, less than 2 τ; 1-13 is 12 |
 * | τ | `slotsPerPole` | slots | more than 0 |
 *
 * @returns a ratio up to 1
 * @throws OutOfRangeError outside those ranges
 *
 * Source: machine text books. Standing: from memory, values computed.
 * @example
 * pitchFactor(7, 9)
 * // → 0.939693
 */
export function pitchFactor(spanSlots: number, slotsPerPole: number): number {
  if (!positive(slotsPerPole)) throw new OutOfRangeError('slotsPerPole', 'Slots per pole must be more than 0.');
  if (!positive(spanSlots) || spanSlots >= 2 * slotsPerPole) throw new OutOfRangeError('spanSlots', 'A coil spans more than 0 and less than two poles.');
  return Math.sin(90 * DEGREE * (spanSlots / slotsPerPole));
}

/**
 * Distribution factor: what the coils of a group give together, lying in neighbouring slots, against coils in one slot.
 *
 * `k_d = sin(q·α/2) / (q·sin(α/2))`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | q | `coilsInGroup` | – | whole, 1 or more |
 * | α | `slotAngleDeg` | electrical ° | more than 0, q·α at most 360; 180 over slots per pole |
 *
 * @returns a ratio up to 1
 * @throws OutOfRangeError outside those ranges
 *
 * Source: machine text books. Standing: from memory, values computed; 18 slots, 2 poles, three phases published as 0.9598.
 * @example
 * distributionFactor(3, 20)
 * // → 0.959795
 */
export function distributionFactor(coilsInGroup: number, slotAngleDeg: number): number {
  if (!positive(coilsInGroup) || !Number.isInteger(coilsInGroup)) throw new OutOfRangeError('coilsInGroup', 'Count the coils of a group: a whole number, 1 or more.');
  if (!positive(slotAngleDeg) || coilsInGroup * slotAngleDeg > 360) throw new OutOfRangeError('slotAngleDeg', 'The angle between slots must be more than 0, and the group at most one turn of 360°.');
  return Math.sin((coilsInGroup * slotAngleDeg * DEGREE) / 2) / (coilsInGroup * Math.sin((slotAngleDeg * DEGREE) / 2));
}

/**
 * Winding factor of a three-phase winding in belts of 60°.
 *
 * `k_w = k_p·k_d`, `k_d = sin 30° / (q·sin(30°/q))`; where q = slots/(3·poles) is a fraction, its numerator in lowest
 * terms stands for q. Two layers: k_p of the coil's span. One layer: the sides fill whole belts however their ends
 * are led, so the span changes nothing and k_p = 1.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `w` | – | star or delta, without problems |
 *
 * @returns the two factors and their product
 * @throws OutOfRangeError naming the first figure that is wrong, or `connection` when the winding is not three-phase
 *
 * Source: machine text books. Standing: from memory, values computed.
 * @example
 * windingFactors({ slots: 60, poles: 4, layers: 2, coils: 60, turnsPerCoil: 11, spanTo: 13, connection: 'delta', circuits: 4, wires: [{ strands: 6, bareDiameterM: 0.00106 }] }).winding
 * // → 0.9099
 */
export function windingFactors(w: WindingData): WindingFactors {
  assertThreePhase(w);
  const belt = phaseBeltSlots(w.slots, w.poles)!;
  const distribution = distributionFactor(belt, 60 / belt);
  const pitch = w.layers === 1 ? 1 : pitchFactor(w.spanTo - 1, w.slots / w.poles);
  return { pitch, distribution, winding: pitch * distribution };
}

export function assertWinding(w: WindingData): void {
  const [problem] = windingProblems(w);
  if (problem) throw new OutOfRangeError(problem.path, problem.message);
}

export function assertThreePhase(w: WindingData): void {
  assertWinding(w);
  if (w.connection !== 'star' && w.connection !== 'delta') throw new OutOfRangeError('connection', 'This holds for a three-phase winding: star or delta.');
}
