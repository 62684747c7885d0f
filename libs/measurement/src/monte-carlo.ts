import { scoreTriangle } from './correlated-scores.js';
import { checkedInput, shapeAt, shapeOfShare, standardOfInput, type InputDistribution } from './input-distribution.js';
import { OutOfRangeError } from './out-of-range-error.js';
import type { UniformStream } from './seeded-uniform.js';

export interface CoverageInterval {
  low: number;
  high: number;
}

export interface MonteCarloResult {
  /** Mean of the results. */
  estimate: number;
  standardUncertainty: number;
  /** The same share left out below and above. */
  symmetric: CoverageInterval;
  /** The narrowest interval that holds the stated share: the one to state when the results lie to one side. */
  shortest: CoverageInterval;
  probability: number;
  trials: number;
}

export interface MonteCarloOptions {
  /** 200 000 when left out: good to about 1 % of the interval. JCGM 101 takes 1 000 000. */
  trials?: number;
  /** Share of the results within the interval, 0.95 when left out. */
  probability?: number;
  /** Correlations of the inputs, as in `combineCorrelated`; none when left out. */
  correlation?: readonly (readonly number[])[];
}

/** Pairs of independent normal scores from pairs of uniform numbers (Box and Muller). */
function normalScores(uniform: UniformStream): () => number {
  let spare: number | undefined;
  return () => {
    if (spare !== undefined) {
      const kept = spare;
      spare = undefined;
      return kept;
    }
    const radius = Math.sqrt(-2 * Math.log(1 - uniform()));
    const angle = 2 * Math.PI * uniform();
    spare = radius * Math.sin(angle);
    return radius * Math.cos(angle);
  };
}

/** Fills the given row with one draw of all inputs. */
function drawer(inputs: readonly InputDistribution[], uniform: UniformStream, correlation: MonteCarloOptions['correlation']): (row: number[]) => void {
  const widths = inputs.map(standardOfInput);
  const score = normalScores(uniform);
  if (!correlation) {
    return (row) =>
      inputs.forEach(({ kind, estimate }, i) => {
        row[i] = estimate + (widths[i] ?? 0) * (kind === 'normal' ? score() : shapeOfShare(kind, uniform()));
      });
  }
  const lower = scoreTriangle(inputs, correlation);
  const scores = inputs.map(() => 0);
  return (row) => {
    for (let i = 0; i < scores.length; i += 1) scores[i] = score();
    inputs.forEach(({ kind, estimate }, i) => {
      let z = 0;
      for (let k = 0; k <= i; k += 1) z += (lower[i]?.[k] ?? 0) * (scores[k] ?? 0);
      row[i] = estimate + (widths[i] ?? 0) * shapeAt(kind, z);
    });
  };
}

function intervals(sorted: Float64Array, probability: number): { symmetric: CoverageInterval; shortest: CoverageInterval } {
  const last = sorted.length - 1;
  const held = Math.min(last, Math.round(probability * sorted.length));
  const at = (i: number) => sorted[i] ?? NaN;
  const first = Math.floor((last - held) / 2);
  let narrowest = 0;
  for (let i = 1; i + held <= last; i += 1) {
    if (at(i + held) - at(i) < at(narrowest + held) - at(narrowest)) narrowest = i;
  }
  return { symmetric: { low: at(first), high: at(first + held) }, shortest: { low: at(narrowest), high: at(narrowest + held) } };
}

/**
 * Propagation of whole distributions by drawing: each trial draws every input and works the model out; the results in order are
 * the distribution of the answer. It needs no sensitivities and stays right where the law of propagation does not: one wide
 * rectangular input, a model that bends, a result near 0.
 *
 * `y_r = f(x_1r … x_nr)`, `ȳ = Σ y_r/M`, `u² = Σ (y_r − ȳ)²/(M − 1)`, intervals from the sorted `y_r`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | x_i | `inputs[i]` | any | normal, rectangular or arcsine; width 0 or more |
 * | f | `model` | – | gives a finite number for every draw |
 * | – | `uniform` | – | `seededUniform(seed)`: the same seed, the same answer |
 * | M | `options.trials` | – | 1000 to 10 000 000 |
 * | p | `options.probability` | – | 0.5 to 0.999 |
 * | r_ij | `options.correlation[i][j]` | – | −1 to 1, symmetric, 1 on the diagonal |
 *
 * Correlated inputs are made from normal scores whose own correlation is chosen so that the inputs have the one asked for; for
 * normal inputs that is the joint normal distribution of JCGM 101, for others it is one of many that would do.
 *
 * @returns mean, standard uncertainty, symmetric and shortest interval, in the unit of the result
 * @throws OutOfRangeError outside those ranges, when correlations cannot exist, or when the model gives no number
 *
 * Source: JCGM 101:2008 clauses 5 to 7. Standing: from memory.
 * @example
 * const limit = { kind: 'rectangular', estimate: 0, halfWidth: Math.sqrt(3) }
 * const four = propagateDistributions([limit, limit, limit, limit], (x) => x[0] + x[1] + x[2] + x[3], seededUniform(1))
 * four.standardUncertainty
 * // → 2.0
 * four.symmetric.high
 * // → 3.9
 */
export function propagateDistributions(
  inputs: readonly InputDistribution[],
  model: (values: readonly number[]) => number,
  uniform: UniformStream,
  options: MonteCarloOptions = {},
): MonteCarloResult {
  const { trials = 200_000, probability = 0.95, correlation } = options;
  if (!(Number.isInteger(trials) && trials >= 1000 && trials <= 1e7)) throw new OutOfRangeError('trials', 'Take 1000 to 10 000 000 trials.');
  if (!(probability >= 0.5 && probability <= 0.999)) throw new OutOfRangeError('probability', 'The coverage probability lies between 0.5 and 0.999.');
  inputs.forEach(checkedInput);
  const draw = drawer(inputs, uniform, correlation);
  const row = inputs.map(() => 0);
  const results = new Float64Array(trials);
  for (let i = 0; i < trials; i += 1) {
    draw(row);
    const result = model(row);
    if (!Number.isFinite(result)) throw new OutOfRangeError('model', 'The model gives no number for some of the values its inputs may have.');
    results[i] = result;
  }
  const estimate = results.reduce((sum, y) => sum + y, 0) / trials;
  const variance = results.reduce((sum, y) => sum + (y - estimate) ** 2, 0) / (trials - 1);
  results.sort();
  return { estimate, standardUncertainty: Math.sqrt(variance), ...intervals(results, probability), probability, trials };
}
