import { DEFAULT_CORE_LIMITS } from '@libs/core-loss';
import { DEFAULT_MACHINE_TEST_LIMITS } from '@libs/machine-tests';
import { DEFAULT_BURNOUT_LIMITS, type LimitsSet } from '@shared/limits';

/** The limits a new shop starts with: each with its source, all to be confirmed by the shop's engineer. */
export const DEFAULT_LIMITS: LimitsSet = { core: DEFAULT_CORE_LIMITS, machine: DEFAULT_MACHINE_TEST_LIMITS, burnout: DEFAULT_BURNOUT_LIMITS };
