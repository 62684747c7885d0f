export type { Cable, SetupOption, Supply } from './bay.js';
export type { CoreGeometry, CoreKind, DerivedGeometry, GeometryProblem } from './core-geometry.js';
export type { CoreLimitKey, CoreLimits, LimitSource } from './core-limits.js';
export type * from './core-test.js';
export type { ReadingUncertainty } from './reading-uncertainty.js';
export type { ReducedReading, RingReading } from './ring-reading.js';
