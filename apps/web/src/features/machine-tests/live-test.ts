import {
  beforeVarnishProblems,
  evaluateBeforeVarnish,
  evaluateFinalTest,
  evaluateIncomingTest,
  finalTestProblems,
  incomingTestProblems,
  type FinalTestDerived,
  type MachineTestEvaluation,
  type MachineTestLimits,
  type WindingTestDerived,
} from '@libs/machine-tests';
import { recordInputSchema, type ReadingsOf } from '@shared/records';
import { problemsOf } from '../../lib/form-problems.js';
import type { FormProblem } from '../../lib/typed.js';
import { demandedParts, finalReadings, finalTestForm, type FinalValues } from './final-test-form.js';
import type { FilledForm, MachineTestKind, TestContext } from './test-form.js';
import { beforeVarnishForm, incomingTestForm, type BeforeVarnishValues, type IncomingValues } from './winding-test-forms.js';

export interface ValuesOf {
  'incoming-test': IncomingValues;
  'before-varnish-test': BeforeVarnishValues;
  'final-test': FinalValues;
}

/** As much as stands on the screen: whole parts are judged, half-typed ones wait. */
export interface LiveTest<K extends MachineTestKind = MachineTestKind> extends FilledForm<ReadingsOf<K>> {
  /** null until the insulation can be judged: everything else is judged beside it */
  readonly evaluation: MachineTestEvaluation<WindingTestDerived & Partial<FinalTestDerived>> | null;
  /** parts that lack a figure or have a wrong one, by the names the readings have */
  readonly unfinished: ReadonlySet<string>;
  /** why no high-potential test may be made now */
  readonly highPotentialRefused: 'insulation-first' | 'insulation-failed' | null;
}

/** A formula names the three volts; the field is the first of them that cannot be. */
function atField(path: string, readings: ReadingsOf<MachineTestKind>): string {
  const point = /^noLoad\.points\.(\d+)\.(voltsV|ampsA)$/.exec(path);
  if (!point || !('noLoad' in readings)) return path;
  const figures = readings.noLoad?.points[Number(point[1])]?.[point[2] as 'voltsV'] ?? [];
  return `${path}.${Math.max(0, figures.findIndex((v) => !(v > 0)))}`;
}

const partOf = (path: string): string => path.split('.')[0]!;

function withProblems<K extends MachineTestKind>(kind: K, filled: FilledForm<ReadingsOf<K>>, library: readonly FormProblem[]): FormProblem[] {
  const contract = recordInputSchema.safeParse({ kind, readings: filled.readings, entered: filled.entered });
  const asked = contract.success ? [] : problemsOf(contract.error).map(({ path, message }) => ({ path: path.replace(/^readings\./, ''), message }));
  const seen = new Set<string>();
  const all = [...filled.problems, ...library.map(({ path, message }) => ({ path: atField(path, filled.readings), message })), ...asked];
  return all.filter(({ path }) => !seen.has(path) && seen.add(path));
}

/** The readings without the parts that have problems. */
function wholeParts<R extends object>(readings: R, unfinished: ReadonlySet<string>): R {
  return Object.fromEntries(Object.entries(readings).map(([part, reading]) => [part, unfinished.has(part) ? null : (reading as unknown)])) as R;
}

function highPotentialRefused(readings: ReadingsOf<MachineTestKind>, limits: MachineTestLimits, unfinished: ReadonlySet<string>): LiveTest['highPotentialRefused'] {
  if (unfinished.has('insulation')) return 'insulation-first';
  const { judgements } = evaluateIncomingTest({ insulation: readings.insulation, windingResistance: null }, limits);
  return judgements.some((j) => j.test === 'insulation-resistance' && j.verdict === 'conforms') ? null : 'insulation-failed';
}

function live<K extends MachineTestKind>(
  kind: K,
  filled: FilledForm<ReadingsOf<K>>,
  library: readonly FormProblem[],
  limits: MachineTestLimits,
  evaluate: (unfinished: ReadonlySet<string>) => NonNullable<LiveTest['evaluation']>,
): LiveTest<K> {
  const problems = withProblems(kind, filled, library);
  const unfinished = new Set(problems.map((p) => partOf(p.path)));
  return {
    ...filled,
    problems,
    unfinished,
    evaluation: unfinished.has('insulation') ? null : evaluate(unfinished),
    highPotentialRefused: highPotentialRefused(filled.readings, limits, unfinished),
  };
}

/** Computes by the library the server computes with, on each key. */
export const liveTest: { [K in MachineTestKind]: (values: ValuesOf[K], context: TestContext) => LiveTest<K> } = {
  'incoming-test': (values, { limits }) => {
    const filled = incomingTestForm.read(values);
    const { insulation, windingResistance } = filled.readings;
    const readings = { insulation, windingResistance };
    return live('incoming-test', filled, incomingTestProblems(readings), limits.machine, (unfinished) => evaluateIncomingTest(wholeParts(readings, unfinished), limits.machine));
  },
  'before-varnish-test': (values, { job, limits }) => {
    const filled = beforeVarnishForm.read(values);
    const { instruments: _instruments, remark: _remark, ...readings } = filled.readings;
    const demanded = job.machine.nameplate.kind === 'ac-magnet' ? [] : (['surge', 'polarity'] as const);
    return live('before-varnish-test', filled, beforeVarnishProblems(readings), limits.machine, (unfinished) => evaluateBeforeVarnish(wholeParts(readings, unfinished), limits.machine, demanded));
  },
  'final-test': (values, context) => {
    const { limits } = context;
    const filled = finalTestForm.read(values);
    const readings = finalReadings(filled.readings);
    return live('final-test', filled, finalTestProblems(readings, limits.machine), limits.machine, (unfinished) => evaluateFinalTest(wholeParts(readings, unfinished), limits.machine, demandedParts(context)));
  },
};
