export { combineCorrelated, combineUncorrelated, expanded, type Contribution } from './combined-uncertainty.js';
export { acceptanceLimit, conformanceProbability, normalShareBelow } from './conformance-probability.js';
export { OutOfRangeError } from './out-of-range-error.js';
export { standardFromExpanded, standardFromInstrument, standardFromLimits, standardFromRepeats, type InstrumentStatement } from './standard-uncertainty.js';
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
