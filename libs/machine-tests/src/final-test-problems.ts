import { OutOfRangeError } from '@libs/quantities';
import { highPotentialLevel } from './high-potential.js';
import { insulationCorrectionTo40C, insulationMinimum } from './insulation.js';
import type { MachineTestProblem } from './judgement.js';
import { DEFAULT_MACHINE_TEST_LIMITS, type MachineTestLimits } from './limits.js';
import { noLoadLosses } from './no-load.js';
import { finite, insulationProblems, positive, problemsUnder, surgeProblems, windingResistanceProblems } from './reading-problems.js';
import type { BearingReading, FinalTestReadings, HighPotentialReading, InsulationReading, NoLoadReading, VibrationReading } from './readings.js';
import { vibrationLimit } from './vibration.js';

/** Lets a formula name the wrong figure itself, so that form and formula never disagree. */
function asProblem(part: string, code: string, formula: () => unknown): MachineTestProblem[] {
  try {
    formula();
    return [];
  } catch (error) {
    if (error instanceof OutOfRangeError) return [{ path: `${part}.${error.field}`, code, message: error.message }];
    throw error;
  }
}

/** Insulation that did not pass is never put under high potential: the test would break what drying might save. */
function highPotentialProblems(r: HighPotentialReading | null, insulation: InsulationReading, limits: MachineTestLimits): MachineTestProblem[] {
  if (r === null) return [];
  const { problems, say } = problemsUnder('highPotential');
  if (!positive(r.appliedVoltsV)) say('appliedVoltsV', 'not-positive', 'Enter the volts applied: more than 0.');
  if (!positive(r.seconds)) say('seconds', 'not-positive', 'Enter how long the volts were held, in seconds.');
  const level = asProblem('highPotential', 'level', () => highPotentialLevel(r, limits));
  if (insulationProblems(insulation).length === 0) {
    const at40 = insulationCorrectionTo40C(insulation.windingTemperatureC, insulation.correctionRule) * insulation.resistanceOhm;
    if (at40 < insulationMinimum(insulation, limits).value) {
      say('', 'insulation-first', 'The insulation resistance did not pass: no high-potential test. Clean and dry the winding, measure again, then test.');
    }
  }
  return [...problems, ...level];
}

function noLoadProblems(r: NoLoadReading | null): MachineTestProblem[] {
  if (r === null) return [];
  const { problems, say } = problemsUnder('noLoad');
  if (r.points.length === 0) say('points', 'no-points', 'Read volts, amperes and watts at rated volts.');
  if (!finite(r.frequencyHz) || r.frequencyHz < 1 || r.frequencyHz > 1000) say('frequencyHz', 'frequency', 'Enter the frequency of the supply: between 1 and 1000 Hz.');
  if (r.speedRpm !== null && !positive(r.speedRpm)) say('speedRpm', 'not-positive', 'Enter the speed, or leave it empty.');
  if (r.ratedVoltageV !== undefined && !positive(r.ratedVoltageV)) say('ratedVoltageV', 'not-positive', 'Enter the rated volts of the winding that is fed, or leave it empty.');
  if (!positive(r.lineResistanceOhm)) say('lineResistanceOhm', 'not-positive', 'Measure the resistance between two leads: more than 0.');
  else r.points.forEach((point, i) => problems.push(...asProblem(`noLoad.points.${i}`, 'no-load-point', () => noLoadLosses(point, r.lineResistanceOhm))));
  return problems;
}

function vibrationProblems(r: VibrationReading | null, limits: MachineTestLimits): MachineTestProblem[] {
  if (r === null) return [];
  const { problems, say } = problemsUnder('vibration');
  if (r.velocitiesMPerS.length === 0) say('velocitiesMPerS', 'no-points', 'Measure at least one point, better three at each end.');
  r.velocitiesMPerS.forEach((v, i) => {
    if (!finite(v) || v < 0) say(`velocitiesMPerS.${i}`, 'velocity', 'Enter the vibration velocity: 0 or more.');
  });
  return [...problems, ...asProblem('vibration', 'vibration-limit', () => vibrationLimit(r, limits))];
}

function bearingProblems(r: BearingReading | null): MachineTestProblem[] {
  if (r === null) return [];
  const { problems, say } = problemsUnder('bearings');
  for (const field of ['driveEndC', 'nonDriveEndC', 'ambientC'] as const) {
    if (!finite(r[field]) || r[field] < -40 || r[field] > 250) say(field, 'temperature', 'Enter the temperature: between -40 and 250 °C.');
  }
  if (!finite(r.changeInHalfHourK)) say('changeInHalfHourK', 'change', 'Enter by how much the warmer housing changed in the last half hour.');
  if (!Number.isInteger(r.poles) || r.poles < 2 || r.poles > 120 || r.poles % 2 !== 0) say('poles', 'poles', 'Enter the number of poles: 2, 4, 6 and so on.');
  return problems;
}

/**
 * Everything that is wrong with the readings of a final test, each with its box. A high-potential test on insulation
 * that did not pass is refused here.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `readings` | SI | figures may be NaN, zero or negative: each is a problem, not an error |
 * | – | `limits` | SI | the shop's |
 *
 * @returns an empty list when the test can be evaluated
 *
 * Source: insulation before high potential is the order of every test standard. Standing: common practice.
 * @example
 * finalTestProblems({ insulation: { windingKind: 'random-wound', ratedVoltageV: 400, testVoltsV: 500, resistanceOhm: 2e6, windingTemperatureC: 40, correctionRule: 'halving' }, windingResistance: null, highPotential: { case: 'new-winding', ratedVoltageV: 400, ratedPowerW: null, supply: 'ac', appliedVoltsV: 1800, seconds: 60, held: true }, noLoad: null, vibration: null, directionRight: null, bearings: null, core: null }).map((p) => p.code)
 * // → ['insulation-first']
 */
export const finalTestProblems = (readings: FinalTestReadings, limits: MachineTestLimits = DEFAULT_MACHINE_TEST_LIMITS): MachineTestProblem[] => [
  ...insulationProblems(readings.insulation),
  ...windingResistanceProblems(readings.windingResistance),
  ...surgeProblems(readings.surgeDifferenceFraction),
  ...highPotentialProblems(readings.highPotential, readings.insulation, limits),
  ...noLoadProblems(readings.noLoad),
  ...vibrationProblems(readings.vibration, limits),
  ...bearingProblems(readings.bearings),
];
