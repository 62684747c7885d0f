import {
  beforeVarnishProblems,
  evaluateBeforeVarnish,
  evaluateFinalTest,
  evaluateIncomingTest,
  finalTestProblems,
  incomingTestProblems,
  type FinalTestReadings,
  type MachineTestEvaluation,
  type MachineTestProblem,
} from '@libs/machine-tests';
import { demandedFinalTestParts } from '@shared/machine-tests';
import type { ReadingsOf, RecordInput } from '@shared/records';
import { coreAfter, coreBefore } from '../jobs/core-standing.js';
import type { JobFacts } from '../jobs/job-facts.js';
import { NOTHING_FOLLOWS, refusedFor, type Evaluation, type EvaluationContext } from './evaluation.js';

type MachineTestInput = Extract<RecordInput, { kind: 'incoming-test' | 'before-varnish-test' | 'final-test' }>;

export function evaluateMachineTest(input: MachineTestInput, context: EvaluationContext): Evaluation {
  const limits = context.facts.limits.machine;
  switch (input.kind) {
    case 'incoming-test': {
      const { insulation, windingResistance } = input.readings;
      return conclude(incomingTestProblems({ insulation, windingResistance }), () => evaluateIncomingTest({ insulation, windingResistance }, limits));
    }
    case 'before-varnish-test': {
      const { instruments: _i, remark: _r, ...readings } = input.readings;
      const demanded = context.machine.nameplate.kind === 'ac-magnet' ? [] : (['surge', 'polarity'] as const);
      return conclude(beforeVarnishProblems(readings), () => evaluateBeforeVarnish(readings, limits, demanded));
    }
    case 'final-test': {
      const readings = finalReadings(input.readings);
      const demanded = demandedFinalTestParts(context.machine.nameplate.kind, context.facts.route);
      const evaluation = conclude(finalTestProblems(readings, limits), () => evaluateFinalTest(readings, limits, demanded));
      return { ...evaluation, result: { ...evaluation.result, core: coreShownOnceMore(context.facts) } };
    }
  }
}

/** The core is shown beside the final test and judged at its own gate; it is not judged a second time here. */
export function finalReadings(input: ReadingsOf<'final-test'>): FinalTestReadings {
  const { instruments: _instruments, remark: _remark, ...readings } = input;
  return { ...readings, core: null };
}

function coreShownOnceMore(facts: JobFacts): Record<string, unknown> | null {
  const after = coreAfter(facts);
  const core = after.kind === 'missing' ? coreBefore(facts) : after;
  if (core.kind === 'missing') return null;
  const { wattsPerKgReferred, expandedUncertaintyWPerKg, fluxDensityT, judgements } = core.record.result;
  return { recordId: core.record.id, verdict: core.record.verdict, conceded: core.kind === 'does-not-conform' && core.concession !== undefined, wattsPerKgReferred, expandedUncertaintyWPerKg, fluxDensityT, judgements };
}

function conclude(problems: readonly MachineTestProblem[], evaluate: () => MachineTestEvaluation<unknown>): Evaluation {
  if (problems.length > 0) return refusedFor(problems);
  const evaluation = evaluate();
  return { ...NOTHING_FOLLOWS, verdict: evaluation.verdict, result: { ...evaluation }, calculation: evaluation.calculation };
}
