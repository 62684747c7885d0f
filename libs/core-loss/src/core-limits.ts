import type { DecisionRule } from '@libs/measurement';

/** Where a limit comes from and how far it stands: printed beside every verdict. */
export interface LimitSource {
  /** Standard and clause, or 'common practice'. */
  source: string;
  /** S: a standard carries it. P: common practice, no standard behind it. C: the customer's contract. */
  standing: 'S' | 'P' | 'C';
}

/** The rows of the limits that carry a source note of their own. */
export type CoreLimitKey = 'increase' | 'fall' | 'absolute' | 'hot-spot' | 'set-up' | 'hot-spot-start' | 'stop' | 'demanded';

/** The acceptance limits a core test is judged by: data of the shop, versioned, never code. Fractions are of 1. */
export interface CoreLimits {
  /** A higher increase than this is said on the result; it fails nothing. */
  increaseWarn: number;
  increaseLimit: number;
  /** A larger fall than this asks to check the set-up. */
  fallAsk: number;
  absoluteWPerKg50: number;
  absoluteWPerKg60: number;
  hotSpotWarnK: number;
  hotSpotLimitK: number;
  /** The flux the hot-spot and absolute limits are stated at. */
  referenceFluxT: number;
  /** Flux may differ from its target by this fraction. */
  fluxTolerance: number;
  startTemperatureToleranceK: number;
  hotSpotStartToleranceK: number;
  hotSpotMinMinutes: number;
  hotSpotMinFluxShare: number;
  /** The least target a supply that is too small may be tested at. */
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

const practice = (source: string): LimitSource => ({ source, standing: 'P' });

/**
 * The limits the product ships with, each to be confirmed by the shop's engineer. None of them is printed as what a
 * standard says: the 20 % and the watts per pound are the trade's own figures.
 */
export const DEFAULT_CORE_LIMITS: CoreLimits = {
  increaseWarn: 0.1,
  increaseLimit: 0.2,
  fallAsk: 0.1,
  absoluteWPerKg50: 7.2,
  absoluteWPerKg60: 8.8,
  hotSpotWarnK: 5,
  hotSpotLimitK: 10,
  referenceFluxT: 1.32,
  fluxTolerance: 0.05,
  startTemperatureToleranceK: 10,
  hotSpotStartToleranceK: 5,
  hotSpotMinMinutes: 15,
  hotSpotMinFluxShare: 0.95,
  minimumTargetT: 0.9,
  stopMeanC: 90,
  stopSpotOverMeanK: 25,
  stopSpotC: 110,
  demandedFromPowerW: 7500,
  demandedFromDiameterM: 0.18,
  coverageFactor: 2,
  decisionRule: 'ask',
  sources: {
    increase: practice('Common practice: 20 % over the before test in the same set-up, both referred to one flux'),
    fall: practice('Common practice: a few percent of fall is stress relief; more than 10 % asks to check the set-up'),
    absolute: practice('Common practice: 4 W/lb (8.8 W/kg) at 60 Hz, divided by 1.22 for 50 Hz, back-iron mass at 1.32 T'),
    'hot-spot': practice('Common practice: 10 K over the core mean at 1.32 T, scaled with flux squared'),
    'set-up': practice('Common practice: flux within 5 % of target, core start within 10 K, the same set-up and meters'),
    'hot-spot-start': practice('Common practice: core within 5 K of ambient at the start, at least 15 minutes at 95 % of target'),
    stop: practice('Common practice: stop at 90 °C mean, a spot 25 K over the mean or over 110 °C, or a rising current'),
    demanded: practice('Common practice: from 7.5 kW or 180 mm outside diameter up, or when the customer asks'),
  },
};
