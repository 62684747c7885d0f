export { OutOfRangeError } from './out-of-range-error.js';
export { VERDICTS, type DecisionRule, type GateOutcome, type Verdict } from './verdict.js';
