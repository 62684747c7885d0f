import { FirstShop1796083200000 } from './1796083200000-first-shop.js';

/** Registered by hand, oldest first: no globs, so that build, tests and scripts run the same list. */
export const migrations = [FirstShop1796083200000];
