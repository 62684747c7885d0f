/** What a weighted straight fit of a few coefficients gives. */
export interface LinearFit {
  coefficients: number[];
  /** Covariance of the coefficients from the stated uncertainties alone. */
  covariance: number[][];
  /** Σ of the squared residuals over the squared uncertainties. */
  chiSquared: number;
  /** Largest over smallest stretch of the scaled problem; 1 is best, beyond about 30 the split is no longer clear. */
  conditionNumber: number;
}

/** Eigenvalues of a small symmetric table, by Jacobi's turns. */
function eigenvalues(table: readonly (readonly number[])[]): number[] {
  const a = table.map((row) => [...row]);
  const n = a.length;
  const at = (i: number, j: number) => a[i]?.[j] ?? 0;
  for (let sweep = 0; sweep < 60; sweep += 1) {
    let off = 0;
    for (let p = 0; p < n; p += 1) {
      for (let q = p + 1; q < n; q += 1) {
        off = Math.max(off, Math.abs(at(p, q)));
        if (at(p, q) === 0) continue;
        const theta = (at(q, q) - at(p, p)) / (2 * at(p, q));
        const t = (theta >= 0 ? 1 : -1) / (Math.abs(theta) + Math.sqrt(theta * theta + 1));
        const c = 1 / Math.sqrt(t * t + 1);
        const s = t * c;
        for (let k = 0; k < n; k += 1) [a[k]![p], a[k]![q]] = [c * at(k, p) - s * at(k, q), s * at(k, p) + c * at(k, q)];
        for (let k = 0; k < n; k += 1) [a[p]![k], a[q]![k]] = [c * at(p, k) - s * at(q, k), s * at(p, k) + c * at(q, k)];
      }
    }
    if (off < 1e-15) break;
  }
  return a.map((row, i) => row[i] ?? 0);
}

/** Inverse of a small positive table by elimination; undefined where it has none. */
function inverse(table: readonly (readonly number[])[]): number[][] | undefined {
  const n = table.length;
  const a = table.map((row, i) => [...row, ...table.map((_r, j) => (i === j ? 1 : 0))]);
  for (let p = 0; p < n; p += 1) {
    let best = p;
    for (let i = p + 1; i < n; i += 1) if (Math.abs(a[i]?.[p] ?? 0) > Math.abs(a[best]?.[p] ?? 0)) best = i;
    [a[p], a[best]] = [a[best]!, a[p]!];
    const pivot = a[p]?.[p] ?? 0;
    if (Math.abs(pivot) < 1e-13) return undefined;
    a[p] = a[p]!.map((value) => value / pivot);
    for (let i = 0; i < n; i += 1) {
      if (i === p) continue;
      const by = a[i]?.[p] ?? 0;
      a[i] = a[i]!.map((value, k) => value - by * (a[p]?.[k] ?? 0));
    }
  }
  return a.map((row) => row.slice(n));
}

/**
 * Weighted least squares for y ≈ Σ c_k·x_k. Rows are divided by the uncertainty of their y and columns by their own length, so that
 * the condition number says something about the question and nothing about its units.
 *
 * @returns undefined when the columns cannot be told apart at all, or there are fewer rows than columns
 */
export function fitLinear(rows: readonly (readonly number[])[], values: readonly number[], uncertainties: readonly number[]): LinearFit | undefined {
  const width = rows[0]?.length ?? 0;
  if (width === 0 || rows.length < width) return undefined;
  const scaled = rows.map((row, i) => row.map((x) => x / (uncertainties[i] ?? 1)));
  const target = values.map((y, i) => y / (uncertainties[i] ?? 1));
  const lengths = Array.from({ length: width }, (_, k) => Math.hypot(...scaled.map((row) => row[k] ?? 0)));
  if (lengths.some((length) => !(length > 0))) return undefined;
  const unit = scaled.map((row) => row.map((x, k) => x / (lengths[k] ?? 1)));
  const normal = lengths.map((_l, j) => lengths.map((_m, k) => unit.reduce((sum, row) => sum + (row[j] ?? 0) * (row[k] ?? 0), 0)));
  const inverted = inverse(normal);
  if (!inverted) return undefined;
  const right = lengths.map((_l, k) => unit.reduce((sum, row, i) => sum + (row[k] ?? 0) * (target[i] ?? 0), 0));
  const solved = inverted.map((row) => row.reduce((sum, x, k) => sum + x * (right[k] ?? 0), 0));
  const stretches = eigenvalues(normal);
  return {
    coefficients: solved.map((c, k) => c / (lengths[k] ?? 1)),
    covariance: inverted.map((row, j) => row.map((x, k) => x / ((lengths[j] ?? 1) * (lengths[k] ?? 1)))),
    chiSquared: unit.reduce((sum, row, i) => sum + ((target[i] ?? 0) - row.reduce((total, x, k) => total + x * (solved[k] ?? 0), 0)) ** 2, 0),
    conditionNumber: Math.sqrt(Math.max(...stretches) / Math.max(Math.min(...stretches), Number.MIN_VALUE)),
  };
}
