/**
 * Mean range of two readings in units of their standard deviation, d₂ for n = 2.
 *
 * Source: NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.2. Standing: quoted in sources that were read; 2/√π, computed.
 */
export const D2_OF_TWO = 1.128;

/**
 * Upper limit of the moving-range chart over its mean, D₄ for n = 2.
 *
 * Source: NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.1. Standing: quoted in sources that were read.
 */
export const D4_OF_TWO = 3.267;

/** Fewer points than this say nothing about what is usual. Source: common practice. */
export const FEWEST_BASE_POINTS = 8;

/** From here on the limits are kept; before, they are a first estimate. Source: common practice. */
export const SETTLED_BASE_POINTS = 20;
