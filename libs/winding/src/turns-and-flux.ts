import { OutOfRangeError } from '@libs/quantities';
import { positive, type WindingConnection, type WindingData } from './winding-data.js';
import { assertThreePhase } from './winding-factors.js';

const need = (value: unknown, field: string, words: string): void => {
  if (!positive(value)) throw new OutOfRangeError(field, words);
};

/** Share of the terminal volts that is induced at load, the rest being the drop in the winding; a designer's first guess. */
export const INDUCED_SHARE = 0.97;

/**
 * Turns in series in one phase.
 *
 * `N_ph = coils·turns / (3·circuits)`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `w` | – | star or delta, without problems |
 *
 * @returns turns, which need not be whole where coils differ
 * @throws OutOfRangeError naming the first figure that is wrong, or `connection` when the winding is not three-phase
 *
 * Source: machine text books. Standing: from memory.
 * @example
 * turnsPerPhase({ slots: 60, poles: 4, layers: 2, coils: 60, turnsPerCoil: 11, spanTo: 13, connection: 'delta', circuits: 4, wires: [{ strands: 6, bareDiameterM: 0.00106 }] })
 * // → 55
 */
export function turnsPerPhase(w: WindingData): number {
  assertThreePhase(w);
  return (w.coils * w.turnsPerCoil) / (3 * w.circuits);
}

/**
 * Volts across one phase: the line volts in delta, less by √3 in star.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | U | `lineVoltsV` | V | more than 0 |
 *
 * @throws OutOfRangeError when the volts are not more than 0 or the connection is not three-phase
 *
 * Source: three-phase circuits. Standing: exact.
 * @example
 * phaseVolts(400, 'star')
 * // → 230.94
 */
export function phaseVolts(lineVoltsV: number, connection: WindingConnection): number {
  need(lineVoltsV, 'lineVoltsV', 'Enter the line volts: more than 0.');
  if (connection !== 'star' && connection !== 'delta') throw new OutOfRangeError('connection', 'This holds for a three-phase winding: star or delta.');
  return connection === 'delta' ? lineVoltsV : lineVoltsV / Math.sqrt(3);
}

/**
 * Flux of one pole that induces the volts of a phase.
 *
 * `Φ = E / (4.44288·f·N_ph·k_w)`, 4.44288 = π·√2
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | E | `inducedVoltsV` | V | more than 0; about 0.97 of the phase volts at load |
 * | f | `frequencyHz` | Hz | more than 0 |
 * | N_ph | `turnsPerPhase` | – | more than 0 |
 * | k_w | `windingFactor` | – | more than 0, 1 at most |
 *
 * @returns Wb
 * @throws OutOfRangeError outside those ranges
 *
 * Source: machine text books. Standing: from memory, value computed.
 * @example
 * fluxPerPole({ inducedVoltsV: 460 / Math.sqrt(3), frequencyHz: 60, turnsPerPhase: 96, windingFactor: 0.901912 })
 * // → 0.0115066
 */
export function fluxPerPole(f: { inducedVoltsV: number; frequencyHz: number; turnsPerPhase: number; windingFactor: number }): number {
  need(f.inducedVoltsV, 'inducedVoltsV', 'Enter the volts of a phase: more than 0.');
  need(f.frequencyHz, 'frequencyHz', 'Enter the frequency: more than 0.');
  need(f.turnsPerPhase, 'turnsPerPhase', 'Count the turns of a phase: more than 0.');
  if (!positive(f.windingFactor) || f.windingFactor > 1) throw new OutOfRangeError('windingFactor', 'A winding factor lies between 0 and 1.');
  return f.inducedVoltsV / (Math.PI * Math.SQRT2 * f.frequencyHz * f.turnsPerPhase * f.windingFactor);
}

/**
 * Flux of one pole of a DC machine.
 *
 * `Φ = E·60·a / (Z·n·p)`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | E | `inducedVoltsV` | V | more than 0; the armature volts less its drop |
 * | Z | `conductors` | – | whole, all of the armature |
 * | a | `paths` | – | whole; a simple lap winding has as many as poles, a wave winding 2 |
 * | p | `poles` | – | 2 or more |
 * | n | `speedRpm` | rpm | more than 0 |
 *
 * @returns Wb
 * @throws OutOfRangeError outside those ranges
 *
 * Source: machine text books. Standing: from memory, value computed.
 * @example
 * dcFluxPerPole({ inducedVoltsV: 420, conductors: 368, paths: 4, poles: 4, speedRpm: 1500 })
 * // → 0.04565
 */
export function dcFluxPerPole(f: { inducedVoltsV: number; conductors: number; paths: number; poles: number; speedRpm: number }): number {
  need(f.inducedVoltsV, 'inducedVoltsV', 'Enter the armature volts: more than 0.');
  need(f.conductors, 'conductors', 'Count the conductors of the armature: more than 0.');
  need(f.paths, 'paths', 'Enter the parallel paths: as many as poles in a lap winding, 2 in a wave winding.');
  need(f.poles, 'poles', 'Count the poles: 2 or more.');
  need(f.speedRpm, 'speedRpm', 'Enter the speed: more than 0.');
  return (f.inducedVoltsV * 60 * f.paths) / (f.conductors * f.speedRpm * f.poles);
}
