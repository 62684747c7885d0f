import {
  SINE_FORM_FACTOR,
  coreTestProblems,
  deriveGeometry,
  evaluateCoreTest,
  geometryProblems,
  stopReasons,
  voltsPerTurnFor,
  type BeforeTest,
  type CoreGeometry,
  type CoreLimits,
  type CoreTestResult,
  type Reason,
} from '@libs/core-loss';
import type { Entered } from '@shared/fields';
import type { CoreTestReadings } from '@shared/core-tests';
import type { FormProblem } from '../../lib/typed.js';
import { coreTestInput, isFilled, readBench, type BenchValues, type Phase } from './bench-form.js';

/** What the volts on the search coil must be for the target, and what flux they make now. */
export interface FluxNow {
  readonly wantedSearchVoltsV: number;
  readonly fluxDensityT?: number;
}

/** The test as it stands while it is typed. */
export interface LiveTest {
  readonly readings: CoreTestReadings;
  readonly entered: Entered;
  /** null until every figure that the result needs is there and can be */
  readonly result: CoreTestResult | null;
  /** everything in the way of a result, missing figures included */
  readonly problems: readonly FormProblem[];
  /** of these, what is typed and wrong: shown at once */
  readonly wrong: ReadonlyMap<string, string>;
  readonly missing: number;
  /** null while the size cannot be drawn */
  readonly geometry: CoreGeometry | null;
  readonly flux: FluxNow | null;
  readonly stop: readonly Reason[];
}

export interface LiveContext {
  readonly phase: Phase;
  readonly limits: CoreLimits;
  readonly before: BeforeTest | 'waived' | undefined;
  readonly ampsRising: boolean;
}

/** Computes by the library the server computes with, on each key. */
export function liveTest(values: BenchValues, { phase, limits, before, ampsRising }: LiveContext): LiveTest {
  const { readings, entered, problems: unread } = readBench(values);
  const input = coreTestInput(phase, readings);
  const taken = new Set(unread.map((p) => p.path));
  const problems = [...unread, ...coreTestProblems(input).filter((p) => !taken.has(p.path)).map(({ path, message }) => ({ path, message }))];
  const filled = problems.filter((p) => isFilled(values, p.path));
  const { meanC, hottestC } = readings.temperatures;
  const drawable = Object.values(readings.geometry).every((v) => typeof v === 'string' || Number.isFinite(v));
  return {
    readings,
    entered,
    problems,
    wrong: new Map([...filled].reverse().map((p) => [p.path, p.message])),
    missing: problems.length - filled.length,
    result: problems.length === 0 ? evaluateCoreTest(input, limits, phase === 'after' ? before : undefined) : null,
    geometry: drawable ? readings.geometry : null,
    flux: fluxNow(readings),
    stop: stopReasons({ ...(meanC === undefined ? {} : { meanC }), ...(hottestC === undefined ? {} : { hottestC }), ampsRising }, limits),
  };
}

/** While the volts are raised there are no watts yet; the flux is wanted all the same. */
function fluxNow({ geometry, reading, target }: CoreTestReadings): FluxNow | null {
  const { searchTurns, frequencyHz, searchVoltsV, voltmeter, formFactor } = reading;
  const given = [searchTurns, frequencyHz, target.fluxDensityT].every((v) => Number.isFinite(v) && v > 0);
  if (!given || geometryProblems(geometry).length > 0) return null;
  const wave = voltmeter === 'true-rms' && formFactor !== undefined ? formFactor / SINE_FORM_FACTOR : 1;
  const wantedSearchVoltsV = voltsPerTurnFor(target.fluxDensityT, frequencyHz, deriveGeometry(geometry).areaM2) * searchTurns * wave;
  return Number.isFinite(searchVoltsV) && searchVoltsV > 0 ? { wantedSearchVoltsV, fluxDensityT: (target.fluxDensityT * searchVoltsV) / wantedSearchVoltsV } : { wantedSearchVoltsV };
}
