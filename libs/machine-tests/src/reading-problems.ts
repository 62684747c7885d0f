import { CORRECTION_RANGE_C, insulationTestVolts } from './insulation.js';
import type { MachineTestProblem } from './judgement.js';
import type { BeforeVarnishReadings, IncomingTestReadings, InsulationReading, WindingResistanceReading } from './readings.js';

export const finite = (value: unknown): value is number => typeof value === 'number' && Number.isFinite(value);
export const positive = (value: unknown): value is number => finite(value) && value > 0;

/** Collects problems under one part of the readings. */
export function problemsUnder(part: string): { problems: MachineTestProblem[]; say: (path: string, code: string, message: string) => void } {
  const problems: MachineTestProblem[] = [];
  return { problems, say: (path, code, message) => void problems.push({ path: path === '' ? part : `${part}.${path}`, code, message }) };
}

export function insulationProblems(r: InsulationReading): MachineTestProblem[] {
  const { problems, say } = problemsUnder('insulation');
  if (!positive(r.ratedVoltageV)) say('ratedVoltageV', 'not-positive', 'Enter the rated volts of the winding: more than 0.');
  if (!positive(r.testVoltsV)) say('testVoltsV', 'not-positive', 'Enter the test volts: more than 0.');
  if (!positive(r.resistanceOhm)) say('resistanceOhm', 'not-positive', 'Enter the resistance after one minute: more than 0. A dead short is entered as the least the meter shows.');
  const range = CORRECTION_RANGE_C[r.correctionRule];
  if (!range) say('correctionRule', 'correction-rule', 'Choose how the reading is carried to 40 °C.');
  else if (!finite(r.windingTemperatureC) || r.windingTemperatureC < range[0] || r.windingTemperatureC > range[1]) {
    say('windingTemperatureC', 'winding-temperature', `Enter the temperature of the winding: this correction holds from ${range[0]} to ${range[1]} °C.`);
  }
  if (r.tenMinuteResistanceOhm !== undefined && !positive(r.tenMinuteResistanceOhm)) {
    say('tenMinuteResistanceOhm', 'not-positive', 'Enter the resistance after ten minutes, or leave it empty.');
  }
  return problems;
}

/** What is unusual but may be so: the test is kept, the words go beside it. */
export function insulationWarnings(r: InsulationReading): MachineTestProblem[] {
  if (!positive(r.ratedVoltageV) || !positive(r.testVoltsV)) return [];
  const { leastV, mostV } = insulationTestVolts(r.ratedVoltageV);
  if (r.testVoltsV >= leastV && r.testVoltsV <= mostV) return [];
  const volts = leastV === mostV ? `${leastV} V` : `${leastV} to ${mostV} V`;
  return [{ path: 'insulation.testVoltsV', code: 'test-volts', message: `IEEE 43 tests a winding of ${r.ratedVoltageV} V with ${volts} DC. Check the setting, or say why.` }];
}

export function windingResistanceProblems(r: WindingResistanceReading | null): MachineTestProblem[] {
  if (r === null) return [];
  const { problems, say } = problemsUnder('windingResistance');
  if (r.resistancesOhm.length !== 3) say('resistancesOhm', 'three-readings', 'Measure between all three pairs of leads.');
  r.resistancesOhm.forEach((ohm, i) => {
    if (!positive(ohm)) say(`resistancesOhm.${i}`, 'not-positive', 'Measure the resistance: more than 0.');
  });
  if (!finite(r.windingTemperatureC) || r.windingTemperatureC < -40 || r.windingTemperatureC > 200) {
    say('windingTemperatureC', 'winding-temperature', 'Enter the temperature of the winding: between -40 and 200 °C.');
  }
  return problems;
}

export function surgeProblems(difference: number | null | undefined): MachineTestProblem[] {
  if (difference === null || difference === undefined) return [];
  if (finite(difference) && difference >= 0 && difference <= 10) return [];
  return [{ path: 'surgeDifferenceFraction', code: 'surge-difference', message: 'Enter the difference between the waves: 0 or more.' }];
}

/**
 * Everything that is wrong with the readings of an incoming test, each with its box. Empty when it can be evaluated.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `readings` | SI | figures may be NaN, zero or negative: each is a problem, not an error |
 *
 * Standing: common practice.
 * @example
 * incomingTestProblems({ insulation: { windingKind: 'random-wound', ratedVoltageV: 400, testVoltsV: 500, resistanceOhm: NaN, windingTemperatureC: 22, correctionRule: 'halving' }, windingResistance: null }).map((p) => p.path)
 * // → ['insulation.resistanceOhm']
 */
export const incomingTestProblems = (readings: IncomingTestReadings): MachineTestProblem[] => [
  ...insulationProblems(readings.insulation),
  ...windingResistanceProblems(readings.windingResistance),
];

/**
 * Everything that is wrong with the readings before varnish. Empty when they can be evaluated.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `readings` | SI | as `incomingTestProblems` |
 *
 * Standing: common practice.
 * @example
 * beforeVarnishProblems({ insulation: { windingKind: 'random-wound', ratedVoltageV: 400, testVoltsV: 500, resistanceOhm: 9e8, windingTemperatureC: 22, correctionRule: 'halving' }, windingResistance: null, surgeDifferenceFraction: -0.1, surgePeakV: 0, polarityRight: true }).map((p) => p.path)
 * // → ['surgeDifferenceFraction', 'surgePeakV']
 */
export function beforeVarnishProblems(readings: BeforeVarnishReadings): MachineTestProblem[] {
  const problems = [...insulationProblems(readings.insulation), ...windingResistanceProblems(readings.windingResistance), ...surgeProblems(readings.surgeDifferenceFraction)];
  if (readings.surgePeakV !== null && !positive(readings.surgePeakV)) {
    problems.push({ path: 'surgePeakV', code: 'not-positive', message: 'Enter the peak volts of the surge test, or leave it empty.' });
  }
  return problems;
}
