import type { DecisionRule } from '@libs/measurement';

/** Where a limit comes from and how far it stands: printed beside every verdict. */
export interface LimitSource {
  /** Standard and clause, or 'common practice'. */
  source: string;
  /** S: a standard carries it. P: common practice, no standard behind it. C: the customer's contract. */
  standing: 'S' | 'P' | 'C';
}

/** The acceptance limits a core test is judged by: data of the shop, versioned, never code. Fractions are of 1. */
export interface CoreLimits {
  increaseWarn: number;
  increaseLimit: number;
  fallAsk: number;
  absoluteWPerKg50: number;
  absoluteWPerKg60: number;
  hotSpotWarnK: number;
  hotSpotLimitK: number;
  /** The flux the hot-spot and absolute limits are stated at. */
  referenceFluxT: number;
  fluxTolerance: number;
  startTemperatureToleranceK: number;
  hotSpotStartToleranceK: number;
  hotSpotMinMinutes: number;
  hotSpotMinFluxShare: number;
  minimumTargetT: number;
  stopMeanC: number;
  stopSpotOverMeanK: number;
  stopSpotC: number;
  demandedFromPowerW: number;
  demandedFromDiameterM: number;
  coverageFactor: number;
  decisionRule: DecisionRule;
  sources: Record<CoreLimitKey, LimitSource>;
}

/** The rows of the limits that carry a source note of their own. */
export type CoreLimitKey = 'increase' | 'fall' | 'absolute' | 'hot-spot' | 'set-up' | 'hot-spot-start' | 'stop' | 'demanded';
