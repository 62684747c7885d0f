import { standardFromLimits, studentCoverageFactor } from '@libs/measurement';
import { OutOfRangeError } from '@libs/quantities';
import type { Reason } from './core-test.js';
import { STEEL_HEAT_J_PER_KG_K } from './heating.js';

/** One temperature of one place, minutes after full flux was set. */
export interface WarmingPoint {
  minutes: number;
  celsius: number;
}

export interface LocalLossOptions {
  /** The slope is taken from the readings up to here; 3 minutes at most, because heat flows away. */
  withinMinutes?: number;
  /** J/(kg·K); 480 when left out, 460 to 490 counted in the uncertainty. */
  specificHeat?: number;
  /** Standard uncertainty of one reading against the next, K; the scatter about the line counts where it is larger. */
  readingK?: number;
}

export type LocalLoss =
  | { outcome: 'told'; wattsPerKg: number; expandedUncertainty: number; kelvinPerMinute: number; points: number; notes: Reason[] }
  | { outcome: 'not-told'; reasons: Reason[] };

/** Beyond this the slope is that of a core which gives heat away. */
const LONGEST_MINUTES = 3;
/** The first reading must be near the moment of full flux, and the readings must span some time. */
const LATEST_START = 0.5;
const SHORTEST_SPAN = 0.75;
const LEAST_POINTS = 4;
const HEAT_HALF_WIDTH = 15;
/** A slope that loses this share from its first to its second half is no straight warming. */
const MOST_BEND = 0.35;

interface Line {
  slope: number;
  uSlope: number;
}

/** The line through the points; its slope is as uncertain as their scatter, or as their reading says. */
function lineThrough(points: readonly WarmingPoint[], readingK: number): Line {
  const n = points.length;
  const meanX = points.reduce((sum, p) => sum + p.minutes, 0) / n;
  const meanY = points.reduce((sum, p) => sum + p.celsius, 0) / n;
  const spread = points.reduce((sum, p) => sum + (p.minutes - meanX) ** 2, 0);
  const slope = points.reduce((sum, p) => sum + (p.minutes - meanX) * (p.celsius - meanY), 0) / spread;
  const scatter = n > 2 ? Math.sqrt(points.reduce((sum, p) => sum + (p.celsius - meanY - slope * (p.minutes - meanX)) ** 2, 0) / (n - 2)) : readingK;
  return { slope, uSlope: Math.max(scatter, readingK) / Math.sqrt(spread) };
}

function checked(points: readonly WarmingPoint[], o: Required<LocalLossOptions>): void {
  points.forEach(({ minutes, celsius }, i) => {
    if (!(Number.isFinite(minutes) && minutes >= 0 && minutes <= 600)) throw new OutOfRangeError(`points.${i}.minutes`, 'Note the minutes since full flux: 0 to 600.');
    if (!(Number.isFinite(celsius) && celsius >= -60 && celsius <= 800)) throw new OutOfRangeError(`points.${i}.celsius`, 'A reading must be a temperature.');
    if (i > 0 && minutes <= (points[i - 1]?.minutes ?? -1)) throw new OutOfRangeError(`points.${i}.minutes`, 'The readings must follow one another in time.');
  });
  if (!(o.withinMinutes > 0 && o.withinMinutes <= LONGEST_MINUTES)) throw new OutOfRangeError('withinMinutes', `The slope is taken from the first ${LONGEST_MINUTES} minutes or less.`);
  if (!(o.specificHeat >= 400 && o.specificHeat <= 550)) throw new OutOfRangeError('specificHeat', 'The specific heat of steel lies between 400 and 550 J/(kg·K).');
  if (!(Number.isFinite(o.readingK) && o.readingK > 0)) throw new OutOfRangeError('readingK', 'The uncertainty of a reading must be more than 0.');
}

/** The second half of the readings warms more slowly by more than the bend that is allowed and the scatter explains. */
function bends(points: readonly WarmingPoint[], readingK: number): boolean {
  if (points.length < 6) return false;
  const half = Math.ceil(points.length / 2);
  const [early, late] = [lineThrough(points.slice(0, half), readingK), lineThrough(points.slice(-half), readingK)];
  return early.slope - late.slope > Math.max(MOST_BEND * early.slope, 2 * Math.hypot(early.uSlope, late.uSlope));
}

/**
 * Local loss of one place from how fast it warms after full flux is set. It holds only while no heat has flowed away: the readings must
 * begin at once, span most of a minute, lie within the first three minutes and on a line. Otherwise the answer is why not.
 *
 * `p = c·dT/dt`, dT/dt the least-squares slope, `U = t₉₅·√(u²(slope)/slope² + u²(c)/c²)·p`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | T, t | `points` | °C, min | in time's order, minutes since full flux |
 * | – | `options.withinMinutes` | min | more than 0, at most 3 |
 * | c | `options.specificHeat` | J/(kg·K) | 400 to 550, 480 when left out; ± 15 counted |
 * | – | `options.readingK` | K | more than 0, 0.1 when left out |
 *
 * A spot of 10 mm is smeared after a quarter of a minute, so the surface understates a small spot: the figure is a least value there.
 *
 * @returns `told` with W/kg and its expanded uncertainty; or `not-told`: `too-few`, `too-late`, `too-short`, `not-warming`, `too-noisy`, `bent`
 * @throws OutOfRangeError for readings that cannot be
 *
 * Source: heat balance, adiabatic start; diffusion times of steel. Standing: computed; specific heat from memory; the bounds are common practice.
 * @example
 * const points = [0, 0.5, 1, 1.5, 2].map((minutes) => ({ minutes, celsius: 22 + 1.25 * minutes }))
 * localLossFromWarming(points).wattsPerKg
 * // → 10.0
 * localLossFromWarming(points.map((p) => ({ ...p, minutes: p.minutes + 5 }))).reasons[0].code
 * // → 'too-late'
 */
export function localLossFromWarming(points: readonly WarmingPoint[], options: LocalLossOptions = {}): LocalLoss {
  const o = { withinMinutes: LONGEST_MINUTES, specificHeat: STEEL_HEAT_J_PER_KG_K, readingK: 0.1, ...options };
  checked(points, o);
  const notTold = (code: string, words: string): LocalLoss => ({ outcome: 'not-told', reasons: [{ code, words }] });
  const used = points.filter((p) => p.minutes <= o.withinMinutes + 1e-9);
  const [first] = points;
  if (first && first.minutes > LATEST_START) {
    return notTold('too-late', `The first reading was taken ${first.minutes.toFixed(1)} minutes after full flux. By then heat flows: let the core cool, and read from the first moment.`);
  }
  if (used.length < LEAST_POINTS) return notTold('too-few', `Take at least ${LEAST_POINTS} readings within ${o.withinMinutes} minutes of full flux.`);
  if ((used.at(-1)?.minutes ?? 0) - (used[0]?.minutes ?? 0) < SHORTEST_SPAN) return notTold('too-short', 'The readings span less than three quarters of a minute: read a little longer.');
  const { slope, uSlope } = lineThrough(used, o.readingK);
  const t = studentCoverageFactor(used.length - 2);
  if (slope + t * uSlope <= 0) return notTold('not-warming', 'The place cools. It was warm before: let the core settle and read again.');
  if (slope <= t * uSlope) return notTold('too-noisy', 'The readings scatter more than the place warms. Dull the spot with paint, hold the thermometer still, and read more often.');
  if (bends(used, o.readingK)) return notTold('bent', 'The place warms more and more slowly: heat flows away already. Take the readings of the first minute only.');
  const wattsPerKg = (o.specificHeat * slope) / 60;
  const rel = Math.hypot(uSlope / slope, standardFromLimits(HEAT_HALF_WIDTH) / o.specificHeat);
  return {
    outcome: 'told',
    wattsPerKg,
    expandedUncertainty: t * rel * wattsPerKg,
    kelvinPerMinute: slope,
    points: used.length,
    notes: [{ code: 'least-value', words: 'A small spot has lost heat to its surroundings within seconds: take this as the least it can be.' }],
  };
}
