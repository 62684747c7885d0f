import { OutOfRangeError } from '@libs/quantities';
import { calculatedResistance, copperMass, currentDensity, type CalculatedResistance } from './copper.js';
import { backIronFluxDensity, fluxFlag, gapFluxDensity, gapPeakFluxDensity, toothFluxDensity, type FluxFlag } from './flux-densities.js';
import { INDUCED_SHARE, fluxPerPole, phaseVolts, turnsPerPhase } from './turns-and-flux.js';
import { finite, positive, windingProblems, type WindingData, type WindingProblem } from './winding-data.js';
import { windingFactors, type WindingFactors } from './winding-factors.js';

/** The core that the winding lies in, as the ring test knows it. */
export interface WoundCore {
  kind: 'stator' | 'rotor';
  /** Bore of a stator, outside diameter of a rotor. */
  gapDiameterM: number;
  stackLengthM: number;
  netLengthM: number;
  /** Back-iron depth times net length. */
  backIronAreaM2: number;
  /** Where the tooth is narrowest. */
  toothWidthM?: number | null | undefined;
}

export interface WindingCheckInput {
  /** Star or delta. */
  winding: WindingData;
  lineVoltsV: number;
  frequencyHz: number;
  /** 0.97 unless told: share of the volts that is induced. A slip-ring rotor's open-circuit volts are all induced: 1. */
  inducedShare?: number | undefined;
  ratedCurrentA?: number | null | undefined;
  core?: WoundCore | null | undefined;
  /** For the resistance; 20 unless told. */
  temperatureC?: number | undefined;
}

/** What follows from the data; a figure that cannot be told is absent, and `missing` says what is wanted for it. */
export interface WindingCheck {
  factors: WindingFactors;
  turnsPerPhase: number;
  fluxPerPoleWb: number;
  gapAverageT?: number;
  gapPeakT?: number;
  toothT?: number;
  /** Back iron in service: the ring test's target where it is to be "the winding's operating flux". */
  operatingBackIronT?: number;
  currentDensityAPerM2?: number;
  resistance?: CalculatedResistance;
  copperKg?: number;
  flags: FluxFlag[];
  missing: string[];
}

/**
 * Everything that is wrong with what a winding is checked from. It never throws.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `input` | SI | anything; a wrong figure is a problem, a missing core or current is not |
 *
 * @returns an empty list when `checkWinding` will accept the input
 *
 * Standing: common practice.
 * @example
 * windingCheckProblems({ winding: { slots: 48, poles: 4, layers: 2, coils: 48, turnsPerCoil: 12, spanTo: 11, connection: 'delta', circuits: 2, wires: [{ strands: 4, bareDiameterM: 0.00106 }] }, lineVoltsV: 0, frequencyHz: 50 }).map((p) => p.path)
 * // → ['lineVoltsV']
 */
export function windingCheckProblems(input: WindingCheckInput): WindingProblem[] {
  const problems: WindingProblem[] = windingProblems(input.winding).map((p) => ({ ...p, path: `winding.${p.path}` }));
  const say = (path: string, code: string, message: string) => void problems.push({ path, code, message });
  if (input.winding.connection === 'single' || input.winding.connection === 'dc') say('winding.connection', 'not-three-phase', 'Flux and resistance are reckoned for three-phase windings only.');
  if (!positive(input.lineVoltsV)) say('lineVoltsV', 'not-positive', 'Enter the line volts of the winding: more than 0.');
  if (!positive(input.frequencyHz)) say('frequencyHz', 'not-positive', 'Enter the frequency: more than 0.');
  const { inducedShare, ratedCurrentA, temperatureC, core } = input;
  if (inducedShare !== undefined && !(positive(inducedShare) && inducedShare <= 1)) say('inducedShare', 'range', 'The induced share of the volts lies between 0 and 1. Take 0.97 when it is unknown.');
  if (ratedCurrentA !== undefined && ratedCurrentA !== null && !positive(ratedCurrentA)) say('ratedCurrentA', 'not-positive', 'Enter the rated amperes: more than 0. Leave them empty when they are unknown.');
  if (temperatureC !== undefined && !(finite(temperatureC) && temperatureC >= -60 && temperatureC <= 250)) say('temperatureC', 'range', 'Enter the temperature of the winding: −60 to 250 °C.');
  if (core) coreProblems(core, input.winding.slots, say);
  return problems;
}

function coreProblems(core: WoundCore, slots: number, say: (path: string, code: string, message: string) => void): void {
  const lengths = { gapDiameterM: 'the bore, or the outside diameter of a rotor', stackLengthM: 'the stack' } as const;
  for (const [field, words] of Object.entries(lengths) as [keyof typeof lengths, string][]) {
    if (!positive(core[field])) say(`core.${field}`, 'not-positive', `Measure ${words}: more than 0.`);
  }
  if (!positive(core.netLengthM) || core.netLengthM > core.stackLengthM) say('core.netLengthM', 'range', 'The net iron length must be more than 0 and not longer than the stack.');
  if (!positive(core.backIronAreaM2)) say('core.backIronAreaM2', 'not-positive', 'The area of the back iron must be more than 0. Check the core’s size.');
  const { toothWidthM } = core;
  if (toothWidthM === undefined || toothWidthM === null) return;
  if (!positive(toothWidthM) || toothWidthM >= (Math.PI * core.gapDiameterM) / slots) say('core.toothWidthM', 'range', 'Measure the tooth where it is narrowest: more than 0 and less than the slot pitch.');
}

/**
 * What a winding does in its core: factors, flux, flux densities with what is usual, current density, resistance and copper.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `input` | SI | without problems |
 *
 * @returns the figures that can be told, flags for those beside the usual, and what is missing for the rest
 * @throws OutOfRangeError naming the first figure that is wrong; `windingCheckProblems` names them all
 *
 * Source: the functions it is made of.
 * @example
 * checkWinding({ winding: { slots: 60, poles: 4, layers: 2, coils: 60, turnsPerCoil: 11, spanTo: 13, connection: 'delta', circuits: 4, wires: [{ strands: 6, bareDiameterM: 0.00106 }] }, lineVoltsV: 400, frequencyHz: 50, core: { kind: 'stator', gapDiameterM: 0.28, stackLengthM: 0.29, netLengthM: 0.2755, backIronAreaM2: 0.01225975 } }).operatingBackIronT
 * // → 1.423
 */
export function checkWinding(input: WindingCheckInput): WindingCheck {
  const [problem] = windingCheckProblems(input);
  if (problem) throw new OutOfRangeError(problem.path, problem.message);
  const { winding, core, ratedCurrentA } = input;
  const factors = windingFactors(winding);
  const turns = turnsPerPhase(winding);
  const inducedVoltsV = (input.inducedShare ?? INDUCED_SHARE) * phaseVolts(input.lineVoltsV, winding.connection);
  const fluxPerPoleWb = fluxPerPole({ inducedVoltsV, frequencyHz: input.frequencyHz, turnsPerPhase: turns, windingFactor: factors.winding });
  const check: WindingCheck = { factors, turnsPerPhase: turns, fluxPerPoleWb, flags: [], missing: [] };
  if (core) Object.assign(check, inCore(core, winding, fluxPerPoleWb));
  else check.missing.push('Measure the core: flux densities follow from it.');
  if (core && !positive(core.toothWidthM)) check.missing.push('Measure the narrowest tooth: its flux density follows from it.');
  if (positive(ratedCurrentA)) check.currentDensityAPerM2 = currentDensity(winding, ratedCurrentA);
  else check.missing.push('Enter the rated amperes: the current density follows from them.');
  if (positive(winding.meanTurnM)) {
    check.resistance = calculatedResistance(winding, input.temperatureC ?? 20);
    check.copperKg = copperMass(winding);
  } else check.missing.push('Measure the mean turn: resistance and copper mass follow from it.');
  return check;
}

function inCore(core: WoundCore, winding: WindingData, fluxPerPoleWb: number) {
  const gapAverageT = gapFluxDensity(fluxPerPoleWb, winding.poles, core.gapDiameterM, core.stackLengthM);
  const gapPeakT = gapPeakFluxDensity(gapAverageT);
  const operatingBackIronT = backIronFluxDensity(fluxPerPoleWb, core.backIronAreaM2);
  const flags = [fluxFlag('gapAverageT', gapAverageT), fluxFlag('gapPeakT', gapPeakT), fluxFlag('backIronT', operatingBackIronT)];
  if (!positive(core.toothWidthM)) return { gapAverageT, gapPeakT, operatingBackIronT, flags };
  const toothT = toothFluxDensity({ ...core, gapPeakT, slotPitchM: (Math.PI * core.gapDiameterM) / winding.slots, toothWidthM: core.toothWidthM });
  return { gapAverageT, gapPeakT, operatingBackIronT, toothT, flags: [...flags, fluxFlag(core.kind === 'stator' ? 'statorToothT' : 'rotorToothT', toothT)] };
}
