import { OutOfRangeError } from '@libs/quantities';
import { phaseVolts } from './turns-and-flux.js';
import { positive } from './winding-data.js';

/** What of a winding may be changed while its coils keep their places. */
export interface WindingSupply {
  lineVoltsV: number;
  frequencyHz: number;
  connection: 'star' | 'delta';
  circuits: number;
  /** Only its ratio counts; leave it out where the span stays. */
  windingFactor?: number;
}

export interface Redesign {
  /** New turns of a coil over old ones, for the same flux. */
  turnsFactor: number;
  /** New copper area of one turn over the old one, for the same copper in the slot. */
  wireAreaFactor: number;
  /** New flux over old one, were the turns of a coil left as they are. */
  fluxFactorUnchanged: number;
}

/** Beyond this change the machine is no longer the one its maker designed: common practice asks. */
export const FLUX_CHANGE_TO_ASK = 0.1;

/**
 * Turns and wire for other volts, another frequency, connection or number of circuits, at the same flux.
 *
 * `t₂/t₁ = (U_ph2/f₂)/(U_ph1/f₁) · a₂/a₁ · k_w1/k_w2`, `A₂/A₁ = t₁/t₂`;
 * with the turns left as they are, the flux changes by the same ratio
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | U | `from.lineVoltsV`, `to.lineVoltsV` | V | more than 0; U_ph is U in delta, U/√3 in star |
 * | f | `.frequencyHz` | Hz | more than 0 |
 * | a | `.circuits` | – | whole, 1 or more |
 * | k_w | `.windingFactor` | – | more than 0, 1 at most; both or none |
 *
 * @returns three ratios; machines for explosive atmospheres may not be redesigned
 * @throws OutOfRangeError outside those ranges
 *
 * Source: machine text books. Standing: from memory, values computed.
 * @example
 * redesign({ lineVoltsV: 460, frequencyHz: 60, connection: 'star', circuits: 1 }, { lineVoltsV: 575, frequencyHz: 60, connection: 'star', circuits: 1 })
 * // → { turnsFactor: 1.25, wireAreaFactor: 0.80, fluxFactorUnchanged: 1.25 }
 */
export function redesign(from: WindingSupply, to: WindingSupply): Redesign {
  if ((from.windingFactor === undefined) !== (to.windingFactor === undefined)) throw new OutOfRangeError('windingFactor', 'Give both winding factors or neither.');
  const ratio = (to: number, from: number) => to / from;
  const voltSeconds = ratio(voltSecondsOf(to), voltSecondsOf(from));
  const turnsFactor = voltSeconds * ratio(circuitsOf(to), circuitsOf(from)) * ratio(factorOf(from), factorOf(to));
  return { turnsFactor, wireAreaFactor: 1 / turnsFactor, fluxFactorUnchanged: turnsFactor };
}

function voltSecondsOf(s: WindingSupply): number {
  if (!positive(s.frequencyHz)) throw new OutOfRangeError('frequencyHz', 'Enter the frequency: more than 0.');
  return phaseVolts(s.lineVoltsV, s.connection) / s.frequencyHz;
}

function circuitsOf(s: WindingSupply): number {
  if (!positive(s.circuits) || !Number.isInteger(s.circuits)) throw new OutOfRangeError('circuits', 'Count the parallel circuits: a whole number, 1 or more.');
  return s.circuits;
}

function factorOf({ windingFactor = 1 }: WindingSupply): number {
  if (!positive(windingFactor) || windingFactor > 1) throw new OutOfRangeError('windingFactor', 'A winding factor lies between 0 and 1.');
  return windingFactor;
}

/**
 * Slot fill of round enamelled wire: squares around the wires, over the slot that can be used.
 *
 * `S = n·Σ(strands·d_o²) / A_slot`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | n | `turnsInSlot` | – | layers × turns of a coil, more than 0 |
 * | d_o | `wires[].overallDiameterM` | m | over the film, more than 0 |
 * | A_slot | `slotAreaM2` | m² | without liner, separator and wedge, more than 0 |
 *
 * @returns a fraction; by hand 0.65 to 0.75, hardly above 0.80 (common practice)
 * @throws OutOfRangeError outside those ranges
 *
 * Standing: common practice.
 * @example
 * slotFill(24, [{ strands: 4, overallDiameterM: 0.001154 }], 0.00018)
 * // → 0.710
 */
export function slotFill(turnsInSlot: number, wires: readonly { strands: number; overallDiameterM: number }[], slotAreaM2: number): number {
  if (!positive(turnsInSlot)) throw new OutOfRangeError('turnsInSlot', 'Count the turns in a slot: more than 0.');
  if (!positive(slotAreaM2)) throw new OutOfRangeError('slotAreaM2', 'Measure the slot that can be used: more than 0.');
  if (wires.length === 0 || !wires.every((w) => positive(w.strands) && positive(w.overallDiameterM))) throw new OutOfRangeError('wires', 'Gauge the wire over its film and count the strands: more than 0.');
  return (turnsInSlot * wires.reduce((sum, w) => sum + w.strands * w.overallDiameterM ** 2, 0)) / slotAreaM2;
}
