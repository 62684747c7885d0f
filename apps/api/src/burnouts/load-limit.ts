import type { PartLimitReason } from '@shared/burnouts';

export interface PartLimit {
  readonly limitC: number;
  readonly limitReason: PartLimitReason;
  readonly limitSource: string;
  readonly limitStanding: string;
}

/** The part that stands least heat sets the limit of everything in the oven with it. */
export function loadLimit(limits: readonly PartLimit[]): PartLimit {
  const [first, ...rest] = limits;
  if (!first) throw new Error('A load without a job has no limit');
  const { limitC, limitReason, limitSource, limitStanding } = rest.reduce((lowest, limit) => (limit.limitC < lowest.limitC ? limit : lowest), first);
  return { limitC, limitReason, limitSource, limitStanding };
}
