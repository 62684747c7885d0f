import type { CoreLimits } from '@libs/core-loss';
import type { MachineTestLimits } from '@libs/machine-tests';

/** Where one limit of a strip comes from, and how far it stands. */
export interface BurnoutSource {
  readonly source: string;
  readonly standing: string;
}

/** What a strip may do to the part, in °C; the lowest that applies counts. */
export interface BurnoutLimits {
  readonly organicOrUnknownC: number;
  readonly inorganicC: number;
  readonly aluminiumFrameC: number;
  /** of all three together, as a strip's record prints it */
  readonly source: string;
  readonly standing: string;
  /** of each, in versions published by the shop */
  readonly sources?: { readonly organicOrUnknownC: BurnoutSource; readonly inorganicC: BurnoutSource; readonly aluminiumFrameC: BurnoutSource };
}

/** The acceptance limits of the shop, as one published version. */
export interface LimitsSet {
  readonly core: CoreLimits;
  readonly machine: MachineTestLimits;
  readonly burnout: BurnoutLimits;
}
