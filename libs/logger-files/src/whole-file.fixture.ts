/** A logger's file held whole, for the specs of this library only: what the streaming reader must agree with. */
export interface WholeFile {
  /** seconds, in the order of the file */
  readonly times: readonly number[];
  /** °C by row, null where there is no reading */
  readonly celsius: readonly (number | null)[];
  /** rows that have a reading in any channel set the pace */
  readonly pacing: readonly number[];
}

const sorted = (values: readonly number[]) => [...values].sort((a, b) => a - b);

export function wholeSummary({ times, celsius, pacing }: WholeFile, limitC: number) {
  const byTime = new Map<number, number>();
  times.forEach((t, i) => {
    const c = celsius[i]!;
    if (c !== null) byTime.set(t, Math.max(c, byTime.get(t) ?? -Infinity));
  });
  const readings = [...byTime.entries()].sort((a, b) => a[0] - b[0]);
  const unique = sorted([...new Set(pacing)]);
  const steps = sorted(unique.slice(1).map((t, i) => t - unique[i]!));
  const gapAfter = steps.length < 2 ? Infinity : 3 * steps[Math.floor((steps.length - 1) / 2)]!;
  const edges = [[sorted(times)[0]!, null] as const, ...readings, [sorted(times).at(-1)!, null] as const];
  let [above, unknown, gaps] = [0, 0, 0];
  const stretches: (readonly [number, number])[][] = [[]];
  edges.slice(1).forEach(([t1, c1], i) => {
    const [t0, c0] = edges[i]!;
    if (t1 - t0 > gapAfter) {
      gaps += t1 - t0;
      if (Math.max(c0 ?? -Infinity, c1 ?? -Infinity) > limitC) unknown += t1 - t0;
      stretches.push([]);
    } else if (c0 !== null && c1 !== null) {
      // a thousand small pieces of the straight line, and no formula
      for (let k = 0; k < 1000; k += 1) if (c0 + ((c1 - c0) * (k + 0.5)) / 1000 > limitC) above += (t1 - t0) / 1000;
    }
    if (c1 !== null) stretches.at(-1)!.push([t1, c1]);
  });
  return { peakC: Math.max(...celsius.filter((c) => c !== null)), above, unknown, gaps, rates: ratesOf(stretches) };
}

function ratesOf(stretches: readonly (readonly (readonly [number, number])[])[]) {
  const rates = stretches.flatMap((stretch) => {
    const minutes = [...new Set(stretch.map(([t]) => Math.floor(t / 60)))].map((minute) => {
      const inside = stretch.filter(([t]) => Math.floor(t / 60) === minute);
      return { t: inside.reduce((s, [t]) => s + t, 0) / inside.length, c: inside.reduce((s, [, c]) => s + c, 0) / inside.length };
    });
    const far = (a: { t: number }, b: { t: number }) => b.t - a.t > 599.9999;
    return minutes.flatMap((a) => minutes.filter((b) => far(a, b) && (b === minutes.find((x) => far(a, x)) || a === minutes.findLast((x) => far(x, b)))).map((b) => ((b.c - a.c) / (b.t - a.t)) * 3600));
  });
  return rates.length === 0 ? null : { heating: Math.max(0, ...rates), cooling: Math.max(0, ...rates.map((r) => -r)) };
}
