import { conclude, refuseProblems, type MachineTestEvaluation } from './evaluation.js';
import {
  deriveInsulation,
  deriveWindingResistance,
  judgeInsulation,
  judgeNewWinding,
  judgeSurge,
  judgeWindingResistance,
  yesOrNo,
  type InsulationDerived,
  type WindingResistanceDerived,
} from './judge-winding.js';
import { DEFAULT_MACHINE_TEST_LIMITS, type MachineTestLimits } from './limits.js';
import { beforeVarnishProblems, incomingTestProblems, insulationWarnings } from './reading-problems.js';
import type { BeforeVarnishPart, BeforeVarnishReadings, IncomingTestReadings } from './readings.js';

export interface WindingTestDerived {
  insulation: InsulationDerived;
  windingResistance: WindingResistanceDerived | null;
}

export type IncomingPart = 'winding-resistance';

/**
 * The incoming test: insulation and resistance of the winding as found. An as-found winding is never high-potential
 * tested. A verdict here steers the job; it accuses nobody.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `readings` | SI | without problems |
 * | – | `limits` | SI | the shop's |
 *
 * @returns judgements with their sources, one verdict, derived figures
 * @throws OutOfRangeError naming the first problem of `incomingTestProblems`
 *
 * Source: IEEE 43-2013; resistance balance quoted from ANSI/EASA AR100-2020. Standing: each judgement carries its own.
 * @example
 * evaluateIncomingTest({ insulation: { windingKind: 'random-wound', ratedVoltageV: 400, testVoltsV: 500, resistanceOhm: 12e6, windingTemperatureC: 20, correctionRule: 'halving' }, windingResistance: null }).verdict
 * // → 'does-not-conform'
 */
export function evaluateIncomingTest(
  readings: IncomingTestReadings,
  limits: MachineTestLimits = DEFAULT_MACHINE_TEST_LIMITS,
  demanded: readonly IncomingPart[] = [],
): MachineTestEvaluation<WindingTestDerived, IncomingPart> {
  refuseProblems(incomingTestProblems(readings));
  const derived = deriveWinding(readings, limits);
  const judgements = judgeInsulation(readings.insulation, derived.insulation, limits);
  if (readings.windingResistance && derived.windingResistance) judgements.push(judgeWindingResistance(readings.windingResistance, derived.windingResistance, limits));
  const notDone: IncomingPart[] = readings.windingResistance ? [] : ['winding-resistance'];
  return conclude(judgements, { notDone, demanded }, insulationWarnings(readings.insulation), derived);
}

export const deriveWinding = (r: IncomingTestReadings, limits: MachineTestLimits): WindingTestDerived => ({
  insulation: deriveInsulation(r.insulation, limits),
  windingResistance: r.windingResistance && deriveWindingResistance(r.windingResistance),
});

/**
 * The test before varnish: what is found here is still cheap to put right. Insulation of a new winding, resistance,
 * surge comparison (usual peak 2 U + 1000 V for wire below 1 kV), polarity by a dummy rotor.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `readings` | SI | without problems; null is "not done" |
 * | – | `limits` | SI | the shop's |
 * | – | `demanded` | – | parts that must be there |
 *
 * @returns judgements with their sources, one verdict, what was not done, derived figures
 * @throws OutOfRangeError naming the first problem of `beforeVarnishProblems`
 *
 * Source: the gate before the dip tank. Standing: common practice, except the insulation minimum (IEEE 43-2013).
 * @example
 * evaluateBeforeVarnish({ insulation: { windingKind: 'random-wound', ratedVoltageV: 400, testVoltsV: 500, resistanceOhm: 900e6, windingTemperatureC: 24, correctionRule: 'halving' }, windingResistance: null, surgeDifferenceFraction: 0.03, surgePeakV: 1800, polarityRight: true }).verdict
 * // → 'conforms'
 */
export function evaluateBeforeVarnish(
  readings: BeforeVarnishReadings,
  limits: MachineTestLimits = DEFAULT_MACHINE_TEST_LIMITS,
  demanded: readonly BeforeVarnishPart[] = [],
): MachineTestEvaluation<WindingTestDerived, BeforeVarnishPart> {
  refuseProblems(beforeVarnishProblems(readings));
  const { insulation, windingResistance, surgeDifferenceFraction, surgePeakV, polarityRight } = readings;
  const derived = deriveWinding(readings, limits);
  const judgements = [...judgeInsulation(insulation, derived.insulation, limits), ...judgeNewWinding(insulation, derived.insulation, limits)];
  const notDone: BeforeVarnishPart[] = [];
  if (windingResistance && derived.windingResistance) judgements.push(judgeWindingResistance(windingResistance, derived.windingResistance, limits));
  else notDone.push('winding-resistance');
  if (surgeDifferenceFraction === null) notDone.push('surge');
  else {
    const wire = insulation.windingKind === 'random-wound' && insulation.ratedVoltageV < 1000;
    judgements.push(judgeSurge(surgeDifferenceFraction, { appliedV: surgePeakV, leastV: wire ? 2 * insulation.ratedVoltageV + 1000 : null }, limits));
  }
  if (polarityRight === null) notDone.push('polarity');
  else {
    judgements.push(
      yesOrNo('polarity', polarityRight, 'Common practice: a dummy rotor turns one way in every position', {
        right: 'The dummy rotor turns one way in every position.',
        wrong: 'The dummy rotor stalls or turns back: a coil or group is reversed. Redo the connection before varnish.',
      }),
    );
  }
  return conclude(judgements, { notDone, demanded }, insulationWarnings(insulation), derived);
}
