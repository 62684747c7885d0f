export type { Cable, SetupOption, Supply } from './bay.js';
export { deriveGeometry, geometryProblems, toothMassKg, type CoreGeometry, type CoreKind, type DerivedGeometry, type GeometryProblem } from './core-geometry.js';
export { scaledHotSpotLimitK } from './core-judgements.js';
export { DEFAULT_CORE_LIMITS, type CoreLimitKey, type CoreLimits, type LimitSource } from './core-limits.js';
export { coreTestProblems } from './core-test-problems.js';
export type * from './core-test.js';
export { CORE_LOSS_CALCULATION, evaluateCoreTest } from './evaluate-core-test.js';
export { FIELD_BAND, hRmsEstimate, type CoreSteel } from './field-estimate.js';
export { STEEL_HEAT_J_PER_KG_K, lossFromHeating, meanRiseEstimateK } from './heating.js';
export { planSetups, setupObstacles, type SetupRequest } from './plan-setups.js';
export {
  CLAMP_READING_UNCERTAINTY,
  DEFAULT_READING_UNCERTAINTY,
  FLUX_EXPONENT,
  FLUX_EXPONENT_HALF_WIDTH,
  lossUncertaintyRel,
  ratioUncertaintyRel,
  type ReadingUncertainty,
  type UncertainReading,
} from './reading-uncertainty.js';
export {
  SATURATION_T,
  SINE_FORM_FACTOR,
  readingProblems,
  reduceReading,
  referLoss,
  voltsPerTurnFor,
  type ReadingProblem,
  type ReducedReading,
  type RingReading,
} from './ring-reading.js';
export { ringTestDemand, stopReasons, type WatchedTemperatures } from './stop-rule.js';
