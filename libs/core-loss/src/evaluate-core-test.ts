import { expanded, worstOf, type Verdict } from '@libs/measurement';
import { OutOfRangeError } from '@libs/quantities';
import { deriveGeometry } from './core-geometry.js';
import { NOT_ESTABLISHED, judgeAbsolute, judgeFall, judgeHotSpot, judgeIncrease, scaledHotSpotLimitK } from './core-judgements.js';
import { DEFAULT_CORE_LIMITS, type CoreLimits } from './core-limits.js';
import type { BeforeTest, CoreComparison, CoreTestInput, CoreTestResult, Judgement, Reason } from './core-test.js';
import { coreTestProblems } from './core-test-problems.js';
import { beyond, comparisonReasons, setupWarnings, validityReasons } from './core-test-validity.js';
import {
  CLAMP_READING_UNCERTAINTY,
  DEFAULT_READING_UNCERTAINTY,
  FLUX_EXPONENT,
  lossUncertaintyRel,
  ratioUncertaintyRel,
  type ReadingUncertainty,
  type UncertainReading,
} from './reading-uncertainty.js';
import { reduceReading, referLoss, type ReducedReading } from './ring-reading.js';
import { stopReasons } from './stop-rule.js';

/** Stored with every result, so that an old one can be told from a new one and computed again. */
export const CORE_LOSS_CALCULATION = 'core-loss/1';

interface Reduced extends UncertainReading {
  input: CoreTestInput;
  reduced: ReducedReading;
}

function reduceTest(input: CoreTestInput): Reduced & { geometry: ReturnType<typeof deriveGeometry> } {
  const [problem] = coreTestProblems(input);
  if (problem) throw new OutOfRangeError(problem.path, problem.message);
  const geometry = deriveGeometry(input.geometry);
  return { input, geometry, reading: input.reading, reduced: reduceReading(input.reading, geometry) };
}

const sameVoltmeter = (a: CoreTestInput, b: CoreTestInput) =>
  a.instruments.voltmeterId === b.instruments.voltmeterId && a.reading.voltmeter === b.reading.voltmeter;

/** A stored before test that cannot be reduced is named as such, not as a slip in the test at hand. */
function reduceBefore(input: CoreTestInput): Reduced {
  try {
    return reduceTest(input);
  } catch (error) {
    if (!(error instanceof OutOfRangeError)) throw error;
    throw new OutOfRangeError(`before.${error.field}`, `The before test: ${error.message}`);
  }
}

/** Both losses are referred to the target of the before test; what is one core's size cancels in the ratio. */
function compare(after: Reduced, before: BeforeTest, afterValid: boolean, limits: CoreLimits, uncertainty: ReadingUncertainty): CoreComparison {
  const first = reduceBefore(before.input);
  const target = before.input.target.fluxDensityT;
  const referred = ({ reduced }: Reduced) => referLoss(reduced.wattsPerKg, reduced.fluxDensityT, target, FLUX_EXPONENT);
  const ratio = referred(after) / referred(first);
  const u = ratioUncertaintyRel(first, after, uncertainty, sameVoltmeter(first.input, after.input));
  const expandedUncertainty = ratio * expanded(u, limits.coverageFactor);
  const reasons = comparisonReasons(before.input, after.input, { before: before.result.valid, after: afterValid }, limits);
  const increase = ratio - 1;
  return { ratio, increase, expandedUncertainty, low: increase - expandedUncertainty, high: increase + expandedUncertainty, valid: reasons.length === 0, reasons };
}

function judgementWarnings(judgements: readonly Judgement[], comparison: CoreComparison | undefined, fluxDensityT: number, limits: CoreLimits): Reason[] {
  const warnings: Reason[] = [];
  const say = (code: string, words: string) => void warnings.push({ code, words });
  if (comparison?.valid && beyond(comparison.increase, limits.increaseWarn)) {
    say('increase-warn', `The loss rose by more than ${Math.round(limits.increaseWarn * 100)} %. Look for burrs, rubbed teeth and overheated plate before winding.`);
  }
  for (const judgement of judgements) {
    const { test, measured, limit } = judgement;
    if (test === 'fall' && judgement.verdict === 'shown-not-judged') warnings.push(...judgement.reasons);
    if (test === 'hot-spot' && measured !== undefined) {
      if (beyond(measured, scaledHotSpotLimitK(limits.hotSpotWarnK, fluxDensityT, limits.referenceFluxT))) {
        say('hot-spot-warn', `A spot is ${measured.toFixed(1)} K over the mean. Mark it and look at it again after the strip.`);
      }
    }
    if (test === 'absolute' && judgement.verdict === 'shown-not-judged' && measured !== undefined && limit !== undefined && measured > limit) {
      say('absolute-above', `W/kg is above ${limit}, the figure a bare stator core is held to. It is not judged here, but say it to the customer.`);
    }
  }
  return warnings;
}

/** Not valid beats all. A before test stands without a hot-spot reading; an after test does not. */
function verdictOf(input: CoreTestInput, valid: boolean, judgements: readonly Judgement[]): Verdict {
  if (!valid) return 'not-valid';
  const judged = judgements.flatMap(({ test, verdict }): Verdict[] => {
    if (verdict === 'shown-not-judged') return [];
    if (input.phase === 'before' && test === 'hot-spot' && verdict === 'not-valid') return [];
    return [verdict];
  });
  return judged.length > 0 ? worstOf(judged) : 'conforms';
}

/**
 * One core test, from readings to verdict: the function that the screen calls while the technician types and the server
 * calls again before it keeps the result.
 *
 * 1. Reduce the reading (`reduceReading`), refer it to the target flux: `p_t = p·(B_t/B)²`.
 * 2. Valid or not: flux within 5 % of target, target 0.9 T or more, rotor out, leads and parallels open.
 * 3. An after test against its before test, both referred to the before test's target: `increase = p_a/p_b − 1`, valid only for
 *    the same set-up; U from `ratioUncertaintyRel`, where size, mass and meter gain cancel and the phase error does not.
 * 4. Hot spot over the core's mean, limit scaled by `(B/1.32 T)²`, after 15 minutes from a cold start. A spot over its limit
 *    before the time is up does not conform already.
 * 5. Absolute W/kg: judged only on a bare stator core, near 1.32 T and 50 or 60 Hz, without clamp meters, and only where no
 *    before test could be made; else shown.
 * 6. The worst of what was judged; not valid beats all.
 *
 * Before test: its own hot spot is judged; it stands without a hot-spot reading, because what it is for is the comparison.
 * `valid` says that it may be compared with, whatever its verdict. After test without a valid hot-spot reading: not valid.
 * `before: 'waived'`: the increase is not established; hot spots and, for a bare core, absolute W/kg are judged.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `input` | SI, °C, min | no `coreTestProblems` |
 * | – | `limits` | – | of the version in force for the job |
 * | – | `before` | – | the before test with its stored result, `'waived'`, or nothing |
 * | u | `uncertainty` | – | standard uncertainties; the shop's, or the default for the kind of meter |
 *
 * @returns everything the certificate prints; no judgement is left out without a reason
 * @throws OutOfRangeError with the path of the first figure that cannot be, as `coreTestProblems` names it
 *
 * Source: limits as noted in `limits.sources`; JCGM 106 and ISO 14253-1 for the verdicts. Standing: common practice.
 * @example
 * const first = {
 *   phase: 'before',
 *   geometry: { kind: 'stator', outerDiameterM: 0.53, innerDiameterM: 0.34, slotDepthM: 0.044, slots: 72, stackLengthM: 0.37, ducts: 0, ductWidthM: 0, stackingFactor: 0.95, densityKgPerM3: 7700 },
 *   target: { basis: 'standard', fluxDensityT: 1.32 },
 *   frame: { state: 'in-frame', material: 'cast-iron' },
 *   cablePath: 'over-frame',
 *   massBasis: 'back-iron',
 *   reading: { excitingTurns: 24, searchTurns: 4, searchVoltsV: 20.99, voltmeter: 'average', excitingA: 25.1, wattsW: 102.1, wattmeterLead: 'search', frequencyHz: 50 },
 *   temperatures: { ambientC: 21, startC: 21, meanC: 26.9, hottestC: 30, minutes: 20 },
 *   instruments: { wattmeterId: 'w-1', clampMeter: false },
 *   checks: { rotorOut: true, leadsOpen: true, parallelsOpened: true, onePointEarthed: true, throughBoltsMeasured: true, boreClear: true, barrierUp: true },
 * }
 * const before = { input: first, result: evaluateCoreTest(first, DEFAULT_CORE_LIMITS) }
 * before.result.wattsPerKgReferred
 * // → 2.959
 * const second = { ...first, phase: 'after', reading: { ...first.reading, searchVoltsV: 21.06, excitingA: 25.4, wattsW: 98.63 }, temperatures: { ambientC: 22, startC: 23, meanC: 28.7, hottestC: 31.3, minutes: 20 } }
 * const after = evaluateCoreTest(second, DEFAULT_CORE_LIMITS, before)
 * after.comparison.increase
 * // → -0.040
 * after.verdict
 * // → 'conforms'
 */
export function evaluateCoreTest(
  input: CoreTestInput,
  limits: CoreLimits = DEFAULT_CORE_LIMITS,
  before?: BeforeTest | 'waived',
  uncertainty: ReadingUncertainty = input.instruments.clampMeter ? CLAMP_READING_UNCERTAINTY : DEFAULT_READING_UNCERTAINTY,
): CoreTestResult {
  const test = reduceTest(input);
  const { geometry, reduced } = test;
  const { formFactorAssumedSine, ...figures } = reduced;
  const target = input.target.fluxDensityT;
  const wattsPerKgReferred = referLoss(reduced.wattsPerKg, reduced.fluxDensityT, target, FLUX_EXPONENT);
  const expandedUncertaintyRel = expanded(lossUncertaintyRel(test, target, uncertainty), limits.coverageFactor);
  const reasons = validityReasons(input, reduced.fluxDensityT, limits);
  const valid = reasons.length === 0;

  const after = input.phase === 'after';
  const waived = after && before === 'waived';
  const comparison = after && before !== undefined && before !== 'waived' ? compare(test, before, valid, limits, uncertainty) : undefined;

  const judgements: Judgement[] = [];
  if (after) judgements.push(judgeIncrease(comparison, waived, limits));
  if (comparison?.valid && comparison.increase < 0) judgements.push(judgeFall(comparison, limits));
  const hotSpot = judgeHotSpot(input, reduced.fluxDensityT, expanded(uncertainty.hotSpotK, limits.coverageFactor), limits);
  judgements.push(hotSpot);
  judgements.push(
    judgeAbsolute(input, { fluxDensityT: reduced.fluxDensityT, wattsPerKg: reduced.wattsPerKg, expandedUncertaintyRel, formFactorAssumedSine, waived }, limits),
  );

  const { meanC, hottestC, startC } = input.temperatures;
  const innerEdgeFluxT = reduced.fluxDensityT * geometry.innerToMeanFluxRatio;
  const warnings = [
    ...stopReasons({ meanC, hottestC }, limits),
    ...judgementWarnings(judgements, comparison, reduced.fluxDensityT, limits),
    ...(waived ? [NOT_ESTABLISHED] : []),
    ...(!after && hotSpot.verdict === 'not-valid' ? hotSpot.reasons : []),
    ...changeWarnings(input, comparison ? (before as BeforeTest).input : undefined),
    ...setupWarnings(input, { innerEdgeFluxT }, formFactorAssumedSine),
  ];

  return {
    calculation: CORE_LOSS_CALCULATION,
    geometry,
    ...figures,
    fluxShareOfTarget: reduced.fluxDensityT / target,
    wattsPerKgReferred,
    expandedUncertaintyRel,
    expandedUncertaintyWPerKg: wattsPerKgReferred * expandedUncertaintyRel,
    innerEdgeFluxT,
    ...(meanC === undefined ? {} : { meanRiseK: meanC - startC }),
    ...(meanC === undefined || hottestC === undefined ? {} : { hotSpotK: hottestC - meanC }),
    hotSpotLimitK: hotSpot.limit,
    ...(comparison ? { comparison } : {}),
    increaseEstablished: comparison?.valid ?? false,
    valid,
    validityReasons: reasons,
    judgements,
    verdict: verdictOf(input, valid, judgements),
    warnings,
  };
}

/** What changed between the tests without spoiling the comparison. */
function changeWarnings(input: CoreTestInput, before: CoreTestInput | undefined): Reason[] {
  if (!before) return [];
  const warnings: Reason[] = [];
  if (before.reading.excitingTurns !== input.reading.excitingTurns || before.reading.searchTurns !== input.reading.searchTurns) {
    warnings.push({ code: 'turns-changed', words: 'The turns are not those of the before test. Count them once more.' });
  }
  if (!sameVoltmeter(before, input)) {
    warnings.push({ code: 'voltmeter-changed', words: 'Another voltmeter served the before test: its error counts twice in the comparison.' });
  }
  return warnings;
}
