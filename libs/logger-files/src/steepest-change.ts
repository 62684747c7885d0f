import { OutOfRangeError } from './out-of-range-error.js';

interface Mean {
  readonly key: number;
  sumSeconds: number;
  sumC: number;
  count: number;
  paired: boolean;
}

export interface SteepestChange {
  add(seconds: number, celsius: number): void;
  /** what comes next does not continue what was: a gap */
  interrupt(): void;
  /** K/h; null where no two means lie far enough apart */
  result(): { readonly heatingKPerH: number; readonly coolingKPerH: number } | null;
}

/**
 * Fastest heating and cooling of a stream of readings, over spans long enough that the last digit of the logger does not count.
 *
 * `rate = (T̄_B − T̄_A)/(t̄_B − t̄_A)` between means of a tenth of the span each; B is the first mean at least one span after A,
 * or A the last at least one span before B
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | span | `spanS` | s | more than 0 |
 * | t, T | `add(seconds, celsius)` | s, °C | finite; times only rising, or only falling |
 *
 * A logger slower than the span is read from reading to reading. The same readings backwards give the same rates.
 *
 * @throws OutOfRangeError when the span is not more than 0
 *
 * Source: own; common practice looks at the rise over some minutes, not from reading to reading.
 */
export function createSteepestChange(spanS: number): SteepestChange {
  if (!(Number.isFinite(spanS) && spanS > 0)) throw new OutOfRangeError('spanS', 'The time a rate is taken over must be more than 0.');
  const width = spanS / 10;
  let means: Mean[] = [];
  let open: Mean | undefined;
  let heating = 0;
  let cooling = 0;
  let found = false;

  const pair = (a: Mean, b: Mean) => {
    const perHour = ((b.sumC / b.count - a.sumC / a.count) / (b.sumSeconds / b.count - a.sumSeconds / a.count)) * 3600;
    found = true;
    a.paired = true;
    heating = Math.max(heating, perHour);
    cooling = Math.max(cooling, -perHour);
  };
  const close = (mean: Mean) => {
    const at = mean.sumSeconds / mean.count;
    const farEnough = means.filter((m) => Math.abs(at - m.sumSeconds / m.count) >= spanS * (1 - 1e-9));
    farEnough.forEach((m, i) => {
      if (!m.paired || i === farEnough.length - 1) pair(m, mean);
    });
    means = [...means.slice(Math.max(0, farEnough.length - 1)), mean];
  };
  return {
    add(seconds, celsius) {
      const key = Math.floor(seconds / width);
      if (open && open.key !== key) {
        close(open);
        open = undefined;
      }
      open ??= { key, sumSeconds: 0, sumC: 0, count: 0, paired: false };
      open.sumSeconds += seconds;
      open.sumC += celsius;
      open.count += 1;
    },
    interrupt() {
      if (open) close(open);
      open = undefined;
      means = [];
    },
    result() {
      if (open) close(open);
      open = undefined;
      return found ? { heatingKPerH: heating, coolingKPerH: cooling } : null;
    },
  };
}
