import { normalShareBelow } from './conformance-probability.js';
import { OutOfRangeError } from './out-of-range-error.js';

/** ln Γ by the series of Lanczos, g = 7, nine terms. */
const LANCZOS = [
  0.99999999999980993, 676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059, 12.507343278686905, -0.13857109526572012,
  9.9843695780195716e-6, 1.5056327351493116e-7,
] as const;
function logGamma(x: number): number {
  const [first, ...rest] = LANCZOS;
  const sum = rest.reduce((total, c, i) => total + c / (x + i), first as number);
  const t = x + 6.5;
  return 0.5 * Math.log(2 * Math.PI) + (x - 0.5) * Math.log(t) - t + Math.log(sum);
}

/** The regularized incomplete beta function I_x(a, b), by its continued fraction. */
function betaShare(x: number, a: number, b: number): number {
  if (x <= 0) return 0;
  if (x >= 1) return 1;
  if (x > (a + 1) / (a + b + 2)) return 1 - betaShare(1 - x, b, a);
  const front = Math.exp(logGamma(a + b) - logGamma(a) - logGamma(b) + a * Math.log(x) + b * Math.log1p(-x)) / a;
  const kept = (value: number) => (Math.abs(value) < 1e-300 ? 1e-300 : value);
  let c = 1;
  let d = 1 / kept(1 - ((a + b) * x) / (a + 1));
  let fraction = d;
  for (let m = 1; m <= 5000; m += 1) {
    let change = 1;
    for (const term of [(m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m)), (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1))]) {
      d = 1 / kept(1 + term * d);
      c = kept(1 + term / c);
      change = c * d;
      fraction *= change;
    }
    if (Math.abs(change - 1) < 1e-15) break;
  }
  return front * fraction;
}

const checkedDegrees = (degreesOfFreedom: number): number => {
  if (!(degreesOfFreedom > 0)) throw new OutOfRangeError('degreesOfFreedom', 'The degrees of freedom must be more than 0; without end is allowed.');
  return degreesOfFreedom;
};

/**
 * Share of Student's distribution below t.
 *
 * `F(t) = 1 − ½·I_x(ν/2, ½)` for t ≥ 0, `x = ν/(ν + t²)`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | t | `t` | standard uncertainties | any |
 * | ν | `degreesOfFreedom` | – | more than 0; Infinity is the normal distribution |
 *
 * @returns 0 to 1
 * @throws OutOfRangeError outside those ranges
 *
 * Source: any book of statistics. Standing: computed.
 * @example
 * studentShareBelow(2.228139, 10)
 * // → 0.975
 */
export function studentShareBelow(t: number, degreesOfFreedom: number): number {
  if (Number.isNaN(t)) throw new OutOfRangeError('t', 't must be a number.');
  const nu = checkedDegrees(degreesOfFreedom);
  if (nu > 1e10) return normalShareBelow(t);
  const tail = Math.abs(t) === Infinity ? 0 : 0.5 * betaShare(nu / (nu + t * t), nu / 2, 0.5);
  return t < 0 ? tail : 1 - tail;
}

/**
 * Coverage factor for a stated probability: how many standard uncertainties to either side.
 *
 * `F(k) = (1 + p)/2` of Student's distribution
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | ν | `degreesOfFreedom` | – | 0.5 or more; Infinity gives the normal distribution's factor |
 * | p | `probability` | – | more than 0, at most 0.9999 |
 *
 * A fraction of a degree is taken as it is; who wants the more careful factor rounds down first, as JCGM 100 does.
 *
 * @returns k
 * @throws OutOfRangeError outside those ranges
 *
 * Source: JCGM 100 annex G, table G.2. Standing: from memory; values computed.
 * @example
 * studentCoverageFactor(10, 0.95)
 * // → 2.228
 */
export function studentCoverageFactor(degreesOfFreedom: number, probability = 0.95): number {
  if (!(checkedDegrees(degreesOfFreedom) >= 0.5)) throw new OutOfRangeError('degreesOfFreedom', 'Fewer degrees of freedom than a half say nothing.');
  if (!(probability > 0 && probability <= 0.9999)) throw new OutOfRangeError('probability', 'The coverage probability lies between 0 and 0.9999.');
  const wanted = (1 + probability) / 2;
  let low = 0;
  let high = 2;
  while (studentShareBelow(high, degreesOfFreedom) < wanted) high *= 2;
  for (let i = 0; i < 200 && high - low > 1e-14 * high; i += 1) {
    const middle = (low + high) / 2;
    if (studentShareBelow(middle, degreesOfFreedom) < wanted) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
