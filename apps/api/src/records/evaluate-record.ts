import { coreTestProblems, evaluateCoreTest, type BeforeTest, type CoreTestInput, type CoreTestResult } from '@libs/core-loss';
import { burnoutProblems, judgeStrip } from '@shared/burnout-limit';
import type { ReadingsOf, RecordInput } from '@shared/records';
import { validBefore, waiverInForce } from '../jobs/core-standing.js';
import { lastOf, type JobFacts } from '../jobs/job-facts.js';
import { evaluateMachineTest } from './evaluate-machine-test.js';
import { NOTHING_FOLLOWS as PLAIN, refusedFor as refused, type Evaluation, type EvaluationContext } from './evaluation.js';

export function evaluateRecord(input: RecordInput, context: EvaluationContext): Evaluation {
  switch (input.kind) {
    case 'core-test-before':
      return evaluateCore('before', input.readings, context);
    case 'core-test-after':
      return evaluateCore('after', input.readings, context);
    case 'strip':
      return evaluateStrip(input.readings, context);
    case 'incoming-test':
    case 'before-varnish-test':
    case 'final-test':
      return evaluateMachineTest(input, context);
    case 'dismantling':
      return input.readings.rotorOut ? PLAIN : refused([{ path: 'rotorOut', code: 'rotor-in', message: 'The rotor comes out before the core is looked at.' }]);
    default:
      return PLAIN;
  }
}

function evaluateStrip(readings: ReadingsOf<'strip'>, { facts }: EvaluationContext): Evaluation {
  const dismantling = lastOf(facts, 'dismantling')?.readings as ReadingsOf<'dismantling'> | undefined;
  const problems = burnoutProblems(readings, dismantling);
  if (problems.length > 0) return refused(problems);
  const { verdict, result } = judgeStrip(readings, dismantling, facts.limits.burnout);
  return { ...PLAIN, verdict, result: { ...result }, calculation: 'strip/1' };
}

/** The readings as the library takes them; the set-up's choice and the remark are no part of the computation. */
export function coreTestInput(phase: 'before' | 'after', readings: ReadingsOf<'core-test-before'>): CoreTestInput {
  const { setup: _setup, remark: _remark, ...rest } = readings;
  return { phase, ...rest };
}

/** The test that an after test is held against: the last valid one before, or its waiver. */
export function beforeOf(facts: JobFacts): BeforeTest | 'waived' | undefined {
  const record = validBefore(facts);
  if (record) {
    return { input: coreTestInput('before', record.readings as ReadingsOf<'core-test-before'>), result: record.result as unknown as CoreTestResult };
  }
  return waiverInForce(facts) ? 'waived' : undefined;
}

function evaluateCore(phase: 'before' | 'after', readings: ReadingsOf<'core-test-before'>, context: EvaluationContext): Evaluation {
  const input = coreTestInput(phase, readings);
  const problems = coreTestProblems(input);
  if (problems.length > 0) return refused(problems.map((p) => ({ path: p.path, code: p.code, message: p.message })));
  const result = evaluateCoreTest(input, context.facts.limits.core, phase === 'after' ? beforeOf(context.facts) : undefined);
  const late = context.instrumentsPastGrace;
  const overdue = { code: 'instrument-overdue', words: `Out of calibration for more than thirty days: ${late.join(', ')}. Repeat with an instrument in calibration.` };
  const final: CoreTestResult = late.length === 0 ? result : { ...result, valid: false, verdict: 'not-valid', validityReasons: [...result.validityReasons, overdue] };
  return {
    problems: [],
    verdict: final.verdict,
    result: { ...final, ...againstOf(phase, context.facts) },
    calculation: final.calculation,
    wattsPerKg: final.wattsPerKgReferred,
    increase: final.comparison?.increase ?? null,
  };
}

/** Which revision of the before test this one was held against: a later correction of it asks for a new evaluation. */
function againstOf(phase: 'before' | 'after', facts: JobFacts): { against?: { recordId: string; revision: number } } {
  const before = phase === 'after' ? validBefore(facts) : undefined;
  return before ? { against: { recordId: before.id, revision: before.revision } } : {};
}
