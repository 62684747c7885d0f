export type { Cable, SetupOption, Supply } from './bay.js';
export { deriveGeometry, geometryProblems, toothMassKg, type CoreGeometry, type CoreKind, type DerivedGeometry, type GeometryProblem } from './core-geometry.js';
export { scaledHotSpotLimitK } from './core-judgements.js';
export { coreLife, type CoreChange, type CoreLife, type CoreTrend, type CoreVisit, type LifeLimits, type LifePoint } from './core-life.js';
export { DEFAULT_CORE_LIMITS, type CoreLimitKey, type CoreLimits, type LimitSource } from './core-limits.js';
export { coreTestProblems } from './core-test-problems.js';
export type * from './core-test.js';
export { AISI_STEELS, EN_10106_STEELS, JIS_STEEL_NAMES, type AisiSteel, type ElectricalSteel, type SteelStanding } from './electrical-steels.js';
export { CORE_LOSS_CALCULATION, evaluateCoreTest } from './evaluate-core-test.js';
export {
  EXTRA_LOSS_CAUTION,
  USUAL_CORE_SHARE,
  assumedCoreLossW,
  efficiencyWithExtraLoss,
  extraLossPerYear,
  type ExtraLoss,
} from './extra-loss.js';
export { FIELD_BAND, hRmsEstimate, type CoreSteel } from './field-estimate.js';
export { GROWN_WORDS, partThatGrew, type GrownAnswer, type GrownOptions, type GrownPart } from './grown-part.js';
export { STEEL_HEAT_J_PER_KG_K, lossFromHeating, meanRiseEstimateK } from './heating.js';
export { findHotSpots, type HotSpot, type HotSpotLimits, type HotSpotMap } from './hot-spots.js';
export { localLossFromWarming, type LocalLoss, type LocalLossOptions, type WarmingPoint } from './local-loss.js';
export { ILL_CONDITIONED, fitThreeTermLoss, fitTwoTermLoss, type Coefficient, type LossPoint, type ThreeTermFit, type TwoTermFit } from './loss-fit.js';
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
export { classicalEddyWPerKg, laminationFactor, skinDepthM, steelResistivityOhmM, type SheetInFlux } from './sheet-eddy.js';
export { lossAtSine } from './sine-loss.js';
export { readSteelName, type NamedSteel, type SteelNameReading } from './steel-name.js';
export { ringTestDemand, stopReasons, type WatchedTemperatures } from './stop-rule.js';
export { STRIP_STEELS, builtCoreFieldAPerM, type StripSteel } from './strip-field.js';
export {
  ADJACENT_SLOTS,
  heatBySlot,
  mapProblems,
  riseMap,
  type MapReference,
  type RiseMap,
  type TemperatureMap,
} from './temperature-map.js';
export {
  MOST_SHARE_UNCERTAINTY,
  SEPARATION_REPEAT_REL,
  hysteresisFromLoop,
  lossPartsAt,
  separateTwoFrequencies,
  type FrequencyReading,
  type Separation,
  type SeparationFigures,
  type SeparationOptions,
} from './two-frequency-separation.js';
export { deriveVentedGeometry, type AxialVents } from './vented-core.js';
