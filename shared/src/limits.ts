import { z } from 'zod';
import type { CoreLimits } from '@libs/core-loss';
import type { MachineTestLimits } from '@libs/machine-tests';

/** What a strip may do to the part, in °C; the lowest that applies counts. */
export interface BurnoutLimits {
  readonly organicOrUnknownC: number;
  readonly inorganicC: number;
  readonly aluminiumFrameC: number;
  readonly source: string;
  readonly standing: string;
}

/** The acceptance limits of the shop, as one published version. */
export interface LimitsSet {
  readonly core: CoreLimits;
  readonly machine: MachineTestLimits;
  readonly burnout: BurnoutLimits;
}

export const DEFAULT_BURNOUT_LIMITS: BurnoutLimits = {
  organicOrUnknownC: 370,
  inorganicC: 400,
  aluminiumFrameC: 300,
  source: 'ANSI/EASA AR100-2015 clause 3.3 (core plate); common practice (frame)',
  standing: 'S core plate, P frame; to be confirmed by the shop’s engineer',
};

export const limitsVersionViewSchema = z.strictObject({
  version: z.number().int(),
  publishedAt: z.string(),
  publishedBy: z.string(),
  note: z.string(),
  set: z.record(z.string(), z.unknown()),
});
export type LimitsVersionView = z.infer<typeof limitsVersionViewSchema>;
