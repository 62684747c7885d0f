import { OutOfRangeError } from '@libs/quantities';
import { positive } from './winding-data.js';

const need = (value: unknown, field: string, words: string): void => {
  if (!positive(value)) throw new OutOfRangeError(field, words);
};

/**
 * Mean flux density in the air gap under a pole.
 *
 * `B_av = Φ·p / (π·D·L)`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | Φ | `fluxPerPoleWb` | Wb | more than 0 |
 * | p | `poles` | – | number of poles, not of pairs |
 * | D | `boreM` | m | more than 0 |
 * | L | `stackLengthM` | m | gross, more than 0 |
 *
 * @returns T
 * @throws OutOfRangeError when a figure is not more than 0
 *
 * Source: machine text books. Standing: from memory, value computed.
 * @example
 * gapFluxDensity(0.0115066, 4, 0.18, 0.2)
 * // → 0.4070
 */
export function gapFluxDensity(fluxPerPoleWb: number, poles: number, boreM: number, stackLengthM: number): number {
  need(fluxPerPoleWb, 'fluxPerPoleWb', 'The flux of a pole must be more than 0.');
  need(poles, 'poles', 'Count the poles: 2 or more.');
  need(boreM, 'boreM', 'Measure the bore: more than 0.');
  need(stackLengthM, 'stackLengthM', 'Measure the stack: more than 0.');
  return (fluxPerPoleWb * poles) / (Math.PI * boreM * stackLengthM);
}

/**
 * Peak flux density in the air gap, of a sine wave along the bore.
 *
 * `B_pk = π/2 · B_av`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | B_av | `gapAverageT` | T | more than 0 |
 *
 * @returns T
 * @throws OutOfRangeError when the mean is not more than 0
 *
 * Source: machine text books. Standing: from memory, value computed.
 * @example
 * gapPeakFluxDensity(0.4070)
 * // → 0.6393
 */
export function gapPeakFluxDensity(gapAverageT: number): number {
  need(gapAverageT, 'gapAverageT', 'The mean flux density of the gap must be more than 0.');
  return (Math.PI / 2) * gapAverageT;
}

/**
 * Flux density in the narrowest part of a tooth: the flux of one slot pitch runs through one tooth.
 *
 * `B_t = B_pk·t_s·L / (t_w·L_n)`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | B_pk | `gapPeakT` | T | more than 0 |
 * | t_s | `slotPitchM` | m | at the bore: π·D over slots |
 * | t_w | `toothWidthM` | m | more than 0, less than the slot pitch |
 * | L | `stackLengthM` | m | gross |
 * | L_n | `netLengthM` | m | net iron, L at most |
 *
 * @returns T
 * @throws OutOfRangeError outside those ranges
 *
 * Source: machine text books. Standing: from memory.
 * @example
 * toothFluxDensity({ gapPeakT: 0.6393, slotPitchM: 0.0157, toothWidthM: 0.0065, stackLengthM: 0.2, netLengthM: 0.19 })
 * // → 1.625
 */
export function toothFluxDensity(t: { gapPeakT: number; slotPitchM: number; toothWidthM: number; stackLengthM: number; netLengthM: number }): number {
  need(t.gapPeakT, 'gapPeakT', 'The peak flux density of the gap must be more than 0.');
  need(t.slotPitchM, 'slotPitchM', 'The slot pitch must be more than 0.');
  if (!positive(t.toothWidthM) || t.toothWidthM >= t.slotPitchM) throw new OutOfRangeError('toothWidthM', 'Measure the tooth where it is narrowest: more than 0 and less than the slot pitch.');
  need(t.stackLengthM, 'stackLengthM', 'Measure the stack: more than 0.');
  if (!positive(t.netLengthM) || t.netLengthM > t.stackLengthM) throw new OutOfRangeError('netLengthM', 'The net iron length must be more than 0 and not longer than the stack.');
  return (t.gapPeakT * t.slotPitchM * t.stackLengthM) / (t.toothWidthM * t.netLengthM);
}

/**
 * Flux density of the back iron in service: half the flux of a pole turns each way. It is what a ring test at "the
 * winding's operating flux" sets.
 *
 * `B_y = (Φ/2) / A`, `A = h_y·L_n`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | Φ | `fluxPerPoleWb` | Wb | more than 0 |
 * | A | `backIronAreaM2` | m² | back-iron depth times net length, as the ring test uses it |
 *
 * @returns T
 * @throws OutOfRangeError when a figure is not more than 0
 *
 * Source: machine text books. Standing: from memory.
 * @example
 * backIronFluxDensity(0.05253, 0.0179265)
 * // → 1.465
 */
export function backIronFluxDensity(fluxPerPoleWb: number, backIronAreaM2: number): number {
  need(fluxPerPoleWb, 'fluxPerPoleWb', 'The flux of a pole must be more than 0.');
  need(backIronAreaM2, 'backIronAreaM2', 'The area of the back iron must be more than 0.');
  return fluxPerPoleWb / 2 / backIronAreaM2;
}

export type FluxPlace = 'gapAverageT' | 'gapPeakT' | 'statorToothT' | 'backIronT' | 'rotorToothT' | 'armatureToothT';

/** From designers' texts; a machine outside them is not wrong, its data are to be looked at again. */
export const USUAL_FLUX_DENSITIES_T = {
  gapAverageT: [0.35, 0.6],
  gapPeakT: [0.6, 0.9],
  statorToothT: [1.4, 1.8],
  backIronT: [1.1, 1.6],
  rotorToothT: [1.5, 1.9],
  armatureToothT: [1.8, 2.2],
} as const satisfies Record<FluxPlace, readonly [number, number]>;

const PLACE_WORDS: Record<FluxPlace, string> = {
  gapAverageT: 'mean of the air gap',
  gapPeakT: 'peak of the air gap',
  statorToothT: 'stator teeth',
  backIronT: 'back iron',
  rotorToothT: 'rotor teeth',
  armatureToothT: 'armature teeth',
};

export interface FluxFlag {
  place: FluxPlace;
  valueT: number;
  leastT: number;
  mostT: number;
  is: 'low' | 'usual' | 'high';
  words: string;
}

/**
 * A flux density beside what is usual there. It is a reason to look again, never a verdict.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `place` | – | where the flux runs |
 * | B | `valueT` | T | more than 0 |
 *
 * @returns low, usual or high, with the range and what to do
 * @throws OutOfRangeError when the flux density is not more than 0
 *
 * Standing: common practice (designers' texts).
 * @example
 * fluxFlag('backIronT', 1.75).is
 * // → 'high'
 */
export function fluxFlag(place: FluxPlace, valueT: number): FluxFlag {
  need(valueT, place, 'A flux density must be more than 0.');
  const [leastT, mostT] = USUAL_FLUX_DENSITIES_T[place];
  const is = valueT < leastT ? 'low' : valueT > mostT ? 'high' : 'usual';
  const range = `${leastT} to ${mostT} T`;
  const doNext = is === 'usual' ? '' : is === 'high' ? ' Count turns, circuits and connection again.' : ' Count turns, circuits and connection again; a low figure may be the maker’s choice.';
  return { place, valueT, leastT, mostT, is, words: `${PLACE_WORDS[place]} ${valueT.toFixed(2)} T, usual ${range}.${doNext}` };
}
