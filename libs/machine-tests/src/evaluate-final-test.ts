import { conclude, refuseProblems, type MachineTestEvaluation } from './evaluation.js';
import { deriveWinding, type WindingTestDerived } from './evaluate-winding-test.js';
import { finalTestProblems } from './final-test-problems.js';
import { highPotentialLevel, type HighPotentialLevel } from './high-potential.js';
import type { TestJudgement } from './judgement.js';
import {
  deriveBearings,
  deriveNoLoad,
  deriveVibration,
  highPotentialWarnings,
  judgeBearings,
  judgeHighPotential,
  judgeNoLoad,
  judgeVibration,
  noLoadWarnings,
  type BearingDerived,
  type NoLoadDerived,
  type VibrationDerived,
} from './judge-running.js';
import { judgeInsulation, judgeNewWinding, judgeSurge, judgeWindingResistance, yesOrNo } from './judge-winding.js';
import { DEFAULT_MACHINE_TEST_LIMITS, type MachineTestLimits } from './limits.js';
import { insulationWarnings } from './reading-problems.js';
import type { FinalTestPart, FinalTestReadings, HighPotentialCase } from './readings.js';

export interface FinalTestDerived extends WindingTestDerived {
  highPotential: HighPotentialLevel | null;
  noLoad: NoLoadDerived | null;
  vibration: VibrationDerived | null;
  bearings: BearingDerived | null;
}

/** Old copper is in these; the figure for a new winding is not asked of them. */
const OLD_WINDING: readonly HighPotentialCase[] = ['reconditioned', 'part-rewound'];

/**
 * The final test: every part that was read is judged, every demanded part that is missing makes the whole not valid.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `readings` | SI | without problems; null is "not done" |
 * | – | `limits` | SI | the shop's |
 * | – | `demanded` | – | parts that must be there |
 *
 * @returns judgements with their sources, one verdict, what is missing, derived figures
 * @throws OutOfRangeError naming the first problem of `finalTestProblems`
 *
 * Source: each judgement carries its own. Standing: likewise.
 * @example
 * const readings = { insulation: { windingKind: 'random-wound', ratedVoltageV: 400, testVoltsV: 500, resistanceOhm: 2400e6, windingTemperatureC: 24, correctionRule: 'halving' }, windingResistance: null, highPotential: null, noLoad: null, vibration: null, directionRight: true, bearings: null, core: null };
 * const { verdict, missing } = evaluateFinalTest(readings, DEFAULT_MACHINE_TEST_LIMITS, ['direction', 'high-potential']);
 * ({ verdict, missing })
 * // → { verdict: 'not-valid', missing: ['high-potential'] }
 */
export function evaluateFinalTest(
  readings: FinalTestReadings,
  limits: MachineTestLimits = DEFAULT_MACHINE_TEST_LIMITS,
  demanded: readonly FinalTestPart[] = [],
): MachineTestEvaluation<FinalTestDerived, FinalTestPart> {
  refuseProblems(finalTestProblems(readings, limits));
  const derived = deriveFinal(readings, limits);
  const { judgements, notDone } = judgeParts(readings, derived, limits);
  const warnings = insulationWarnings(readings.insulation);
  if (readings.highPotential && derived.highPotential) warnings.push(...highPotentialWarnings(readings.highPotential, derived.highPotential));
  if (readings.noLoad && derived.noLoad) warnings.push(...noLoadWarnings(readings.noLoad, derived.noLoad));
  return conclude(judgements, { notDone, demanded }, warnings, derived);
}

const deriveFinal = (r: FinalTestReadings, limits: MachineTestLimits): FinalTestDerived => ({
  ...deriveWinding(r, limits),
  highPotential: r.highPotential && highPotentialLevel(r.highPotential, limits),
  noLoad: r.noLoad && deriveNoLoad(r.noLoad, r.insulation.ratedVoltageV),
  vibration: r.vibration && deriveVibration(r.vibration, limits),
  bearings: r.bearings && deriveBearings(r.bearings, limits),
});

function judgeParts(r: FinalTestReadings, d: FinalTestDerived, limits: MachineTestLimits): { judgements: TestJudgement[]; notDone: FinalTestPart[] } {
  const judgements = judgeInsulation(r.insulation, d.insulation, limits);
  const notDone: FinalTestPart[] = [];
  const part = (name: FinalTestPart, judged: TestJudgement | null) => void (judged ? judgements.push(judged) : notDone.push(name));

  if (r.highPotential && !OLD_WINDING.includes(r.highPotential.case)) judgements.push(...judgeNewWinding(r.insulation, d.insulation, limits));
  part('winding-resistance', r.windingResistance && d.windingResistance && judgeWindingResistance(r.windingResistance, d.windingResistance, limits));
  part('high-potential', r.highPotential && d.highPotential && judgeHighPotential(r.highPotential, d.highPotential, limits));
  if (typeof r.surgeDifferenceFraction === 'number') judgements.push(judgeSurge(r.surgeDifferenceFraction, { appliedV: null, leastV: null }, limits));
  part('no-load', d.noLoad && judgeNoLoad(d.noLoad, limits));
  part('vibration', r.vibration && d.vibration && judgeVibration(r.vibration, d.vibration, limits));
  part('direction', r.directionRight === null ? null : judgeDirection(r.directionRight));
  part('bearings', r.bearings && d.bearings && judgeBearings(r.bearings, d.bearings, limits));
  part('core', judgeCore(r.core));
  return { judgements, notDone };
}

const judgeDirection = (right: boolean): TestJudgement =>
  yesOrNo('direction', right, 'Common practice: the shaft turns as ordered at the marked phase order', {
    right: 'The shaft turns as ordered.',
    wrong: 'The shaft turns the wrong way. Swap two leads inside the box and mark them, then run again.',
  });

/** Taken over as the core test found it; nothing is judged a second time. */
function judgeCore(core: FinalTestReadings['core']): TestJudgement | null {
  if (!core || core.verdict === null) return null;
  const words = {
    conforms: 'The core test after burnout conforms.',
    inconclusive: 'The core test after burnout is inconclusive: the engineer decides.',
    'does-not-conform': 'The core test after burnout does not conform.',
    'not-valid': 'The core test after burnout is not valid.',
  }[core.verdict];
  const measured = core.wattsPerKg;
  return { test: 'core-loss', measured, unit: measured === null ? '' : 'W/kg', limit: null, verdict: core.verdict, source: 'Core test of this job', standing: 'P', words };
}
