export interface CurvePoint {
  readonly seconds: number;
  readonly celsius: number;
}
interface Bucket {
  readonly key: number;
  low: CurvePoint;
  high: CurvePoint;
}
/** Each bucket gives two points, so that a curve has 2000 at most. */
export const MOST_BUCKETS = 1000;

export interface DecimatedCurve {
  add(seconds: number, celsius: number): void;
  /** in order of time */
  points(): CurvePoint[];
}

/**
 * A curve for drawing that never grows past 2000 points and never loses a peak: equal stretches of time keep their lowest and
 * highest reading, and where there are too many stretches each two become one.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `firstWidthS` | s | more than 0; the width to begin with |
 *
 * Source: own.
 */
export function createDecimatedCurve(firstWidthS: number): DecimatedCurve {
  let width = firstWidthS;
  let buckets: Bucket[] = [];

  /** Where the bucket stands or would stand: almost always at one of the two ends. */
  const place = (key: number): number => {
    if (buckets.length === 0 || key > buckets.at(-1)!.key) return buckets.length;
    let [from, to] = [0, buckets.length - 1];
    if (key === buckets[to]!.key) return to;
    while (from < to) {
      const middle = (from + to) >> 1;
      if (buckets[middle]!.key < key) from = middle + 1;
      else to = middle;
    }
    return from;
  };
  const widen = () => {
    width *= 2;
    const wider: Bucket[] = [];
    for (const bucket of buckets) {
      const key = Math.floor(bucket.key / 2);
      const last = wider.at(-1);
      if (last?.key === key) {
        last.low = lower(last.low, bucket.low);
        last.high = higher(last.high, bucket.high);
      } else wider.push({ key, low: bucket.low, high: bucket.high });
    }
    buckets = wider;
  };
  return {
    add(seconds, celsius) {
      const point = { seconds, celsius };
      const key = Math.floor(seconds / width);
      const at = place(key);
      const bucket = buckets[at];
      if (bucket?.key === key) {
        bucket.low = lower(bucket.low, point);
        bucket.high = higher(bucket.high, point);
      } else {
        buckets.splice(at, 0, { key, low: point, high: point });
        while (buckets.length > MOST_BUCKETS) widen();
      }
    },
    points: () => buckets.flatMap(({ low, high }) => (low === high ? [low] : low.seconds < high.seconds ? [low, high] : [high, low])),
  };
}

const lower = (a: CurvePoint, b: CurvePoint) => (b.celsius < a.celsius || (b.celsius === a.celsius && b.seconds < a.seconds) ? b : a);
const higher = (a: CurvePoint, b: CurvePoint) => (b.celsius > a.celsius || (b.celsius === a.celsius && b.seconds < a.seconds) ? b : a);
