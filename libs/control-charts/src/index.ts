export { D2_OF_TWO, D4_OF_TWO, FEWEST_BASE_POINTS, SETTLED_BASE_POINTS } from './chart-constants.js';
export { firstSignal } from './first-signal.js';
export { individualsChart, type BasePeriod, type ChartPoint, type IndividualsChart, type NoChart } from './individuals-chart.js';
export { OutOfRangeError } from './out-of-range-error.js';
export { RUN_RULES, rulesCompletedAt, type RunRule, type RunRuleText } from './run-rules.js';
