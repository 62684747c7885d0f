import type { Verdict } from '@libs/measurement';
import type { CoreGeometry, DerivedGeometry } from './core-geometry.js';
import type { RingReading } from './ring-reading.js';

export type CorePhase = 'before' | 'after';
export type TargetBasis = 'standard' | 'winding' | 'supply';
export type FrameState = 'bare' | 'in-frame';
export type FrameMaterial = 'cast-iron' | 'steel' | 'aluminium' | 'none';
export type CablePath = 'bore-and-outside' | 'over-frame' | 'under-ribs' | 'through-spider' | 'through-shaft' | 'through-vents';

export interface CoreTemperatures {
  ambientC: number;
  startC: number;
  meanC?: number;
  coolestC?: number;
  hottestC?: number;
  hottestSlot?: number;
  minutes: number;
}

export interface CoreInstruments {
  voltmeterId?: string;
  ammeterId?: string;
  wattmeterId?: string;
  thermometerId?: string;
  /** Empty for a meter with one range. */
  wattmeterRange?: string;
  clampMeter: boolean;
}

export interface CoreChecks {
  rotorOut: boolean;
  leadsOpen: boolean;
  parallelsOpened: boolean;
  onePointEarthed: boolean;
  throughBoltsMeasured: boolean;
  boreClear: boolean;
  barrierUp: boolean;
}

/** One core test as recorded: size, set-up, readings, checks. SI; nothing in it is a result. */
export interface CoreTestInput {
  phase: CorePhase;
  geometry: CoreGeometry;
  target: { basis: TargetBasis; fluxDensityT: number };
  frame: { state: FrameState; material: FrameMaterial };
  cablePath: CablePath;
  massBasis: 'back-iron';
  reading: RingReading;
  temperatures: CoreTemperatures;
  instruments: CoreInstruments;
  checks: CoreChecks;
}

/** Why something is not valid, not judged, or worth a look: a code for programs, words for people. */
export interface Reason {
  code: string;
  words: string;
}

export interface CoreTestProblem {
  /** Dotted path into the input, such as `reading.searchVoltsV`. */
  path: string;
  code: string;
  message: string;
}

export type JudgedTest = 'increase' | 'fall' | 'hot-spot' | 'absolute';

export interface Judgement {
  test: JudgedTest;
  verdict: Verdict | 'shown-not-judged';
  /** In `unit`; absent when it could not be told. */
  measured?: number;
  limit?: number;
  expandedUncertainty?: number;
  /** '1' is a fraction: 0.186 with unit '1' is +18.6 %. */
  unit: '1' | 'K' | 'W/kg';
  reasons: Reason[];
  source: string;
  standing: string;
}

/** After against before, both referred to the target flux of the before test. */
export interface CoreComparison {
  ratio: number;
  /** ratio − 1: 0.186 is +18.6 %. */
  increase: number;
  /** Same unit as `increase`: 0.024 is 2.4 points. */
  expandedUncertainty: number;
  low: number;
  high: number;
  valid: boolean;
  reasons: Reason[];
}

export interface CoreTestResult {
  /** Which version of the calculation made this result. */
  calculation: string;
  geometry: DerivedGeometry;
  fluxDensityT: number;
  fluxShareOfTarget: number;
  coreWatts: number;
  /** At the flux as measured. */
  wattsPerKg: number;
  /** Referred to the target flux. */
  wattsPerKgReferred: number;
  expandedUncertaintyRel: number;
  expandedUncertaintyWPerKg: number;
  apparentVA: number;
  vaPerKg: number;
  powerFactor: number;
  fieldRmsAPerM: number;
  voltsPerTurn: number;
  excitingVoltsV: number;
  cableLossW?: number;
  innerEdgeFluxT: number;
  meanRiseK?: number;
  hotSpotK?: number;
  hotSpotLimitK?: number;
  comparison?: CoreComparison;
  increaseEstablished: boolean;
  /** The measurement itself stands: a before test may be compared against, an after test may be judged. */
  valid: boolean;
  validityReasons: Reason[];
  judgements: Judgement[];
  verdict: Verdict;
  warnings: Reason[];
}

/** The before test an after test is held against. */
export interface BeforeTest {
  input: CoreTestInput;
  result: CoreTestResult;
}
