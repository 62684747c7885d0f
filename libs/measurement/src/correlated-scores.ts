import { shapeAt, type DistributionKind, type InputDistribution } from './input-distribution.js';
import { OutOfRangeError } from './out-of-range-error.js';

const TERMS = 48;
const STEP = 0.01;
const END = 9;

/** How much of each Hermite polynomial is in a shape: the correlation of two shapes is a power series in that of their scores. */
function hermiteParts(kind: DistributionKind): number[] {
  const parts = new Array<number>(TERMS).fill(0);
  for (let i = -END / STEP; i <= END / STEP; i += 1) {
    const z = i * STEP;
    const weighted = (shapeAt(kind, z) * Math.exp((-z * z) / 2) * STEP) / Math.sqrt(2 * Math.PI);
    let [before, here] = [0, 1];
    for (let n = 0; n < TERMS; n += 1) {
      parts[n] = (parts[n] ?? 0) + weighted * here;
      [before, here] = [here, (z * here - Math.sqrt(n) * before) / Math.sqrt(n + 1)];
    }
  }
  return parts;
}

const known = new Map<DistributionKind, number[]>();
const partsOf = (kind: DistributionKind): number[] => {
  const parts = known.get(kind) ?? hermiteParts(kind);
  known.set(kind, parts);
  return parts;
};

/** The correlation that normal scores must have so that the inputs made of them have the one that was asked for. */
export function scoreCorrelation(a: DistributionKind, b: DistributionKind, wanted: number): number {
  if (wanted === 0 || (a === 'normal' && b === 'normal') || (a === b && Math.abs(wanted) === 1)) return wanted;
  const [left, right] = [partsOf(a), partsOf(b)];
  const made = (score: number) => left.reduce((sum, part, n) => sum + part * (right[n] ?? 0) * score ** n, 0);
  const size = Math.abs(wanted);
  if (size > made(1) + 1e-4) {
    throw new OutOfRangeError('correlation', `Inputs of the kinds ${a} and ${b} cannot be correlated by more than ${made(1).toFixed(3)}.`);
  }
  let [low, high] = [0, 1];
  for (let i = 0; i < 60; i += 1) {
    const middle = (low + high) / 2;
    if (made(middle) < size) low = middle;
    else high = middle;
  }
  return Math.sign(wanted) * ((low + high) / 2);
}

function checkedTable(table: readonly (readonly number[])[], size: number): void {
  if (table.length !== size || table.some((row) => row.length !== size)) {
    throw new OutOfRangeError('correlation', 'The table of correlations needs one row and one column for each input.');
  }
  table.forEach((row, i) =>
    row.forEach((r, j) => {
      if (!(Math.abs(r) <= 1) || r !== table[j]?.[i] || (i === j && r !== 1)) {
        throw new OutOfRangeError('correlation', 'Correlations run from −1 to 1, are the same both ways, and are 1 with themselves.');
      }
    }),
  );
}

/** Lower triangle that turns independent normal scores into correlated ones. A meter used twice (1 off the diagonal) is allowed. */
export function scoreTriangle(inputs: readonly InputDistribution[], table: readonly (readonly number[])[]): number[][] {
  checkedTable(table, inputs.length);
  const wanted = inputs.map((a, i) => inputs.map((b, j) => (i === j ? 1 : scoreCorrelation(a.kind, b.kind, table[i]?.[j] ?? 0))));
  const lower: number[][] = inputs.map(() => inputs.map(() => 0));
  const at = (i: number, j: number) => lower[i]?.[j] ?? 0;
  for (let j = 0; j < inputs.length; j += 1) {
    const rest = (i: number) => {
      let left = wanted[i]?.[j] ?? 0;
      for (let k = 0; k < j; k += 1) left -= at(i, k) * at(j, k);
      return left;
    };
    const pivot = rest(j);
    if (pivot < -1e-9) throw new OutOfRangeError('correlation', 'These correlations contradict each other.');
    const bound = pivot < 1e-9;
    for (let i = j; i < inputs.length; i += 1) {
      // nothing of this score is left over: then nothing else may hang on it either
      if (bound && i > j && Math.abs(rest(i)) > 1e-4) throw new OutOfRangeError('correlation', 'These correlations contradict each other.');
      lower[i]![j] = bound ? 0 : i === j ? Math.sqrt(pivot) : rest(i) / Math.sqrt(pivot);
    }
  }
  return lower;
}
