import {
  beforeVarnishProblems,
  evaluateBeforeVarnish,
  evaluateFinalTest,
  evaluateIncomingTest,
  finalTestProblems,
  incomingTestProblems,
  type MachineTestEvaluation,
  type FinalTestDerived,
  type TestJudgement,
  type WindingTestDerived,
} from '@libs/machine-tests';
import { demandedFinalTestParts } from '@shared/machine-tests';
import type { ReadingsOf } from '@shared/records';
import { finalReadings } from './final-test-form.js';
import type { RecordContext } from './record-definition.js';

/** What can be said of a test that is still being typed: parts that are not complete yet are left out. */
export type RunningTest<D> = Pick<MachineTestEvaluation<D>, 'judgements' | 'verdict' | 'missing' | 'notDone' | 'warnings' | 'derived'>;

type Problem = { readonly path: string };
const partsWithProblems = (problems: readonly Problem[]) => new Set(problems.map((p) => p.path.split('.')[0]!));

/** Optional parts with problems are taken as not done; without the insulation there is nothing to say. */
function complete<R extends { insulation: unknown }>(readings: R, problems: readonly Problem[]): R | null {
  const broken = partsWithProblems(problems);
  if (broken.has('insulation')) return null;
  return Object.fromEntries(Object.entries(readings).map(([part, value]) => [part, broken.has(part) ? null : value])) as R;
}

export function runningIncoming({ insulation, windingResistance }: ReadingsOf<'incoming-test'>, { limits }: RecordContext): RunningTest<WindingTestDerived> | null {
  const now = complete({ insulation, windingResistance }, incomingTestProblems({ insulation, windingResistance }));
  return now && evaluateIncomingTest(now, limits.machine);
}

export function runningBeforeVarnish({ instruments: _i, remark: _r, ...readings }: ReadingsOf<'before-varnish-test'>, { job, limits }: RecordContext): RunningTest<WindingTestDerived> | null {
  const now = complete(readings, beforeVarnishProblems(readings));
  return now && evaluateBeforeVarnish(now, limits.machine, job.machine.nameplate.kind === 'ac-magnet' ? [] : ['surge', 'polarity']);
}

/** A level that is refused before the insulation passed keeps its problem at the panel, and the panel out of the verdict. */
export function runningFinal(input: ReadingsOf<'final-test'>, held: boolean | null, { job, limits }: RecordContext): RunningTest<FinalTestDerived> | null {
  const readings = finalReadings(input);
  // whether it held is asked, never taken for granted
  const asked = readings.highPotential && held === null ? { ...readings, highPotential: null } : readings;
  const now = complete(asked, finalTestProblems(asked, limits.machine));
  return now && evaluateFinalTest(now, limits.machine, demandedFinalTestParts(job.machine.nameplate.kind, job.route));
}

const PART_TESTS = {
  insulation: ['insulation-resistance', 'insulation-new-winding', 'polarization-index'],
  windingResistance: ['winding-resistance-balance', 'winding-resistance-as-found'],
  surge: ['surge-difference'],
  polarity: ['polarity'],
  highPotential: ['high-potential'],
  noLoad: ['no-load-current-balance', 'no-load-current-level'],
  vibration: ['vibration'],
  direction: ['direction'],
  bearings: ['bearing-rise'],
  core: ['core-loss'],
} as const;
export type TestPart = keyof typeof PART_TESTS;
export const judgementsOf = (running: RunningTest<unknown> | null, part: TestPart): TestJudgement[] => (running?.judgements ?? []).filter((j) => (PART_TESTS[part] as readonly string[]).includes(j.test));
