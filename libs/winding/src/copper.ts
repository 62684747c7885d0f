import { OutOfRangeError } from '@libs/quantities';
import { conductorArea } from './wire.js';
import { positive, type WindingData } from './winding-data.js';
import { assertThreePhase } from './winding-factors.js';
import { turnsPerPhase } from './turns-and-flux.js';

/** Copper of 100 % IACS at 20 °C, Ω·m. Source: IEC 60028. Standing: from memory. */
export const COPPER_OHM_M = 1.7241e-8;
/** Source: IEC 60028. Standing: from memory. */
export const COPPER_KG_PER_M3 = 8890;
const COPPER_ZERO_C = 234.5;

const meanTurnOf = (w: WindingData): number => {
  assertThreePhase(w);
  if (!positive(w.meanTurnM)) throw new OutOfRangeError('meanTurnM', 'Measure the mean turn of the sample coil.');
  return w.meanTurnM;
};

/**
 * Resistivity of copper at a temperature.
 *
 * `ρ = ρ_20·(234.5 + t)/254.5`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | t | `temperatureC` | °C | above −234.5 |
 *
 * @returns Ω·m
 * @throws OutOfRangeError outside that range
 *
 * Source: IEC 60028. Standing: from memory, values computed.
 * @example
 * copperResistivity(75) * 1e6
 * // → 0.020967
 */
export function copperResistivity(temperatureC: number): number {
  if (!positive(COPPER_ZERO_C + temperatureC)) throw new OutOfRangeError('temperatureC', 'Enter the temperature of the winding in °C.');
  return (COPPER_OHM_M * (COPPER_ZERO_C + temperatureC)) / (COPPER_ZERO_C + 20);
}

export interface CalculatedResistance {
  phaseOhm: number;
  /** Between two leads: two phases in series in star; one beside the other two in delta. */
  lineToLineOhm: number;
}

/**
 * Resistance a winding should have, from its mean turn.
 *
 * `R_ph = ρ·N_ph·l_t / (A·a)`; star `R_LL = 2·R_ph`, delta `R_LL = 2/3·R_ph`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | N_ph, a, A | `w` | – | star or delta, without problems |
 * | l_t | `w.meanTurnM` | m | more than 0 |
 * | t | `temperatureC` | °C | 20 unless told |
 *
 * @returns Ω; leads and joints are left out
 * @throws OutOfRangeError when the winding or its mean turn is wrong
 *
 * Source: machine text books. Standing: from memory.
 * @example
 * calculatedResistance({ slots: 48, poles: 4, layers: 2, coils: 48, turnsPerCoil: 12, spanTo: 11, connection: 'delta', circuits: 2, wires: [{ strands: 4, bareDiameterM: 0.00106 }], meanTurnM: 0.975 }).lineToLineOhm
 * // → 0.152
 */
export function calculatedResistance(w: WindingData, temperatureC = 20): CalculatedResistance {
  const meanTurnM = meanTurnOf(w);
  const phaseOhm = (copperResistivity(temperatureC) * turnsPerPhase(w) * meanTurnM) / (conductorArea(w.wires) * w.circuits);
  return { phaseOhm, lineToLineOhm: w.connection === 'star' ? 2 * phaseOhm : (2 / 3) * phaseOhm };
}

/**
 * Copper of a three-phase winding.
 *
 * `m = ρ_Cu · coils · turns · l_t · A`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `w` | – | star or delta, with its mean turn |
 *
 * @returns kg, bare, without leads
 * @throws OutOfRangeError when the winding or its mean turn is wrong
 *
 * Source: geometry; density by IEC 60028 (from memory).
 * @example
 * copperMass({ slots: 48, poles: 4, layers: 2, coils: 48, turnsPerCoil: 12, spanTo: 11, connection: 'delta', circuits: 2, wires: [{ strands: 4, bareDiameterM: 0.00106 }], meanTurnM: 0.975 })
 * // → 17.6
 */
export function copperMass(w: WindingData): number {
  return COPPER_KG_PER_M3 * w.coils * w.turnsPerCoil * meanTurnOf(w) * conductorArea(w.wires);
}

/**
 * Area of copper that the line current sees: all circuits, and √3 more in delta, since a delta's phase carries less.
 *
 * `A_line = a·A` (star), `√3·a·A` (delta)
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `w` | – | star or delta, without problems |
 *
 * @returns m²
 * @throws OutOfRangeError when the winding is wrong or not three-phase
 *
 * Source: three-phase circuits. Standing: exact.
 * @example
 * lineCopperArea({ slots: 48, poles: 4, layers: 2, coils: 48, turnsPerCoil: 12, spanTo: 11, connection: 'star', circuits: 2, wires: [{ strands: 1, bareDiameterM: 0.001 }] }) * 1e6
 * // → 1.5708
 */
export function lineCopperArea(w: WindingData): number {
  assertThreePhase(w);
  return conductorArea(w.wires) * w.circuits * (w.connection === 'delta' ? Math.sqrt(3) : 1);
}

/**
 * Current density of a three-phase winding.
 *
 * `J = I_line / A_line`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | I_line | `lineCurrentA` | A | more than 0 |
 *
 * @returns A/m²; usual 4 to 6.5 A/mm² in closed machines, 5 to 8 in open ones (common practice)
 * @throws OutOfRangeError when the winding is wrong or the current not more than 0
 *
 * Source: machine text books. Standing: from memory.
 * @example
 * currentDensity({ slots: 48, poles: 4, layers: 2, coils: 48, turnsPerCoil: 12, spanTo: 11, connection: 'delta', circuits: 2, wires: [{ strands: 4, bareDiameterM: 0.00106 }] }, 67) / 1e6
 * // → 5.48
 */
export function currentDensity(w: WindingData, lineCurrentA: number): number {
  if (!positive(lineCurrentA)) throw new OutOfRangeError('lineCurrentA', 'Enter the rated amperes: more than 0.');
  return lineCurrentA / lineCopperArea(w);
}
