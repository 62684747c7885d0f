export { compareWithMonteCarlo, type MonteCarloComparison, type PropagatedResult } from './compare-with-monte-carlo.js';
export { combineCorrelated, combineUncorrelated, expanded, type Contribution } from './combined-uncertainty.js';
export { acceptanceLimit, conformanceProbability, normalShareBelow } from './conformance-probability.js';
export { effectiveDegreesOfFreedom, type ContributionWithDegrees } from './effective-degrees.js';
export { standardOfInput, type InputDistribution } from './input-distribution.js';
export { propagateDistributions, type CoverageInterval, type MonteCarloOptions, type MonteCarloResult } from './monte-carlo.js';
export { OutOfRangeError } from './out-of-range-error.js';
export { seededUniform, type UniformStream } from './seeded-uniform.js';
export { standardFromExpanded, standardFromInstrument, standardFromLimits, standardFromRepeats, type InstrumentStatement } from './standard-uncertainty.js';
export { studentCoverageFactor, studentShareBelow } from './student-factor.js';
export {
  VERDICTS,
  gateOutcome,
  judgeLowerLimit,
  judgeRange,
  judgeUpperLimit,
  worstOf,
  type DecisionRule,
  type GateOutcome,
  type Verdict,
} from './verdict.js';
