import { worstOf, type Verdict } from '@libs/measurement';
import { OutOfRangeError } from '@libs/quantities';
import { MACHINE_TESTS_CALCULATION, type MachineTestProblem, type TestJudgement } from './judgement.js';

/** A machine's test, evaluated. The same on the screen and on the server. */
export interface MachineTestEvaluation<Derived, Part extends string = string> {
  calculation: typeof MACHINE_TESTS_CALCULATION;
  judgements: TestJudgement[];
  /** The worst of the judgements; not valid while a demanded part is missing; null when nothing was judged. */
  verdict: Verdict | null;
  /** Demanded, and not there. */
  missing: Part[];
  /** Not there, demanded or not: the paper says "not done", never nothing. */
  notDone: Part[];
  /** Unusual readings that may still be right. */
  warnings: MachineTestProblem[];
  derived: Derived;
}

/** Readings with problems are never evaluated: the caller shows the problems first. */
export function refuseProblems(problems: readonly MachineTestProblem[]): void {
  const [first] = problems;
  if (first) throw new OutOfRangeError(first.path, first.message);
}

export function conclude<Derived, Part extends string>(
  judgements: TestJudgement[],
  parts: { notDone: Part[]; demanded: readonly Part[] },
  warnings: MachineTestProblem[],
  derived: Derived,
): MachineTestEvaluation<Derived, Part> {
  const missing = parts.notDone.filter((part) => parts.demanded.includes(part));
  const verdicts = judgements.map((j) => j.verdict);
  const verdict = missing.length > 0 ? 'not-valid' : verdicts.length > 0 ? worstOf(verdicts) : null;
  return { calculation: MACHINE_TESTS_CALCULATION, judgements, verdict, missing, notDone: parts.notDone, warnings, derived };
}
