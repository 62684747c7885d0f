export { MACHINE_TESTS_CALCULATION, type MachineTest, type MachineTestProblem, type TestJudgement } from './judgement.js';
export { DEFAULT_MACHINE_TEST_LIMITS, type MachineTestLimit, type MachineTestLimitKey, type MachineTestLimits, type Standing } from './limits.js';
export { BEFORE_VARNISH_PARTS, FINAL_TEST_PARTS } from './readings.js';
export type * from './readings.js';
export { CORRECTION_RANGE_C, insulationCorrectionTo40C, insulationMinimum, insulationTestVolts, polarizationIndex } from './insulation.js';
export { COPPER_ZERO_C, resistanceAt, riseByResistanceK, unbalanceFraction } from './winding-resistance.js';
export { highPotentialLevel, type HighPotentialLevel, type HighPotentialRequest } from './high-potential.js';
export { LOW_VOLTS_SHARE, noLoadLosses, noLoadSeparation, type NoLoadLosses, type NoLoadSeparation } from './no-load.js';
export { LEAST_SHAFT_HEIGHT_M, vibrationLimit } from './vibration.js';
