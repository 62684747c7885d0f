import { FirstShop1796083200000 } from './1796083200000-first-shop.js';
import { BurnoutLoads1796169600000 } from './1796169600000-burnout-loads.js';
import { InstrumentCalibrations1796256000000 } from './1796256000000-instrument-calibrations.js';

/** Registered by hand, oldest first: no globs, so that build, tests and scripts run the same list. */
export const migrations = [FirstShop1796083200000, BurnoutLoads1796169600000, InstrumentCalibrations1796256000000];
