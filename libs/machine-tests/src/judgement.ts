import type { Verdict } from '@libs/measurement';
import type { Standing } from './limits.js';

/** What is judged at the incoming test, before varnish and at the final test. */
export type MachineTest =
  | 'insulation-resistance'
  | 'insulation-new-winding'
  | 'polarization-index'
  | 'winding-resistance-balance'
  | 'winding-resistance-as-found'
  | 'surge-difference'
  | 'polarity'
  | 'high-potential'
  | 'no-load-current-balance'
  | 'no-load-current-level'
  | 'vibration'
  | 'direction'
  | 'bearing-rise'
  | 'core-loss';

/** One test against its limit, with where the limit comes from. */
export interface TestJudgement {
  test: MachineTest;
  /** In `unit`; null where the test is a yes or a no. */
  measured: number | null;
  /** SI: Ω, V, K, m/s, A, W/kg; '1' is a fraction or a ratio, '' a yes or a no. */
  unit: string;
  limit: number | null;
  verdict: Verdict;
  source: string;
  standing: Standing;
  /** What it means and what to do next. */
  words: string;
}

/** A reading that cannot be, or must not be: the box it stands in and what to do. */
export interface MachineTestProblem {
  /** Dotted path into the readings, such as `insulation.resistanceOhm`. */
  path: string;
  code: string;
  message: string;
}

/** The calculation that made a result; it changes when a formula does. */
export const MACHINE_TESTS_CALCULATION = 'machine-tests/1';
