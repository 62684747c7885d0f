import { createDecimatedCurve, type CurvePoint } from './decimated-curve.js';
import { createSteepestChange } from './steepest-change.js';

/** A stretch without readings, in seconds of the file's clock. */
export interface Gap {
  readonly fromS: number;
  readonly toS: number;
}
export interface Peak {
  readonly celsius: number;
  readonly seconds: number;
  readonly line: number;
  readonly clock: string;
}
/** So many gaps are kept one by one; all are counted. */
export const KEPT_GAPS = 100;

export interface TallySettings {
  readonly limitsC: readonly number[];
  /** longer steps than this are gaps; null where the pace is not known */
  readonly gapAfterS: number | null;
  readonly rateOverS: number;
  readonly curveWidthS: number;
}
export interface TallyResult {
  readonly samples: number;
  readonly peak: Peak | null;
  readonly above: readonly { readonly limitC: number; readonly seconds: number; readonly unknownS: number }[];
  readonly rates: { readonly heatingKPerH: number; readonly coolingKPerH: number } | null;
  readonly gaps: readonly Gap[];
  readonly gapCount: number;
  readonly gapS: number;
  readonly curve: readonly CurvePoint[];
}

/**
 * Share of a straight step from a to b that lies above a limit.
 *
 * `share = (max(a, b) − L)/|b − a|` where the step crosses L, else 1 or 0
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | a, b | `a`, `b` | °C | finite |
 * | L | `limit` | °C | finite |
 *
 * @returns 0 to 1; a step along the limit itself is not above it
 *
 * Source: straight line between two readings. Standing: own.
 * @example
 * shareAbove(340, 350, 345)
 * // → 0.5
 */
export function shareAbove(a: number, b: number, limit: number): number {
  const [low, high] = a < b ? [a, b] : [b, a];
  if (high <= limit) return 0;
  return low >= limit ? 1 : (high - limit) / (high - low);
}

/**
 * What one channel shows, reading by reading. `step` takes readings in order of time, rising or falling; `loose` takes one
 * that came too late to be put in order: it counts for the peak and the curve, not for times and rates.
 */
export function createChannelTally(settings: TallySettings) {
  const { limitsC, gapAfterS } = settings;
  const rates = createSteepestChange(settings.rateOverS);
  const curve = createDecimatedCurve(settings.curveWidthS);
  const above = limitsC.map((limitC) => ({ limitC, seconds: 0, unknownS: 0 }));
  const gaps: Gap[] = [];
  let [gapCount, gapS, samples] = [0, 0, 0];
  let peak: Peak | null = null;
  let before: CurvePoint | undefined;
  let now: CurvePoint | undefined;
  let first: CurvePoint | undefined;

  const note = (seconds: number, celsius: number, line: number, clock: string) => {
    samples += 1;
    if (peak === null || celsius > peak.celsius || (celsius === peak.celsius && seconds < peak.seconds)) peak = { celsius, seconds, line, clock };
    curve.add(seconds, celsius);
  };
  const addGap = (fromS: number, toS: number, ends: readonly number[]) => {
    gapCount += 1;
    gapS += toS - fromS;
    if (gaps.length < KEPT_GAPS) gaps.push({ fromS, toS });
    for (const each of above) if (ends.some((c) => c > each.limitC)) each.unknownS += toS - fromS;
  };
  /** The reading is settled once the next time has come: until then another of the same time may be higher. */
  const settle = () => {
    if (!now) return;
    first ??= now;
    if (before) {
      const seconds = Math.abs(now.seconds - before.seconds);
      if (gapAfterS !== null && seconds > gapAfterS) {
        addGap(Math.min(before.seconds, now.seconds), Math.max(before.seconds, now.seconds), [before.celsius, now.celsius]);
        rates.interrupt();
      } else for (const each of above) each.seconds += seconds * shareAbove(before.celsius, now.celsius, each.limitC);
    }
    rates.add(now.seconds, now.celsius);
    before = now;
    now = undefined;
  };
  return {
    /** @returns true where the channel already had a reading at this time; of the two the higher counts */
    step(seconds: number, celsius: number, line: number, clock: string): boolean {
      note(seconds, celsius, line, clock);
      if (now?.seconds === seconds) {
        if (celsius > now.celsius) now = { seconds, celsius };
        return true;
      }
      settle();
      now = { seconds, celsius };
      return false;
    },
    loose: note,
    /** A channel that starts after the file or ends before it has a gap there. */
    result(fileFromS: number, fileToS: number): TallyResult {
      settle();
      if (first && before && gapAfterS !== null) {
        const [early, late] = first.seconds <= before.seconds ? [first, before] : [before, first];
        if (early.seconds - fileFromS > gapAfterS) addGap(fileFromS, early.seconds, [early.celsius]);
        if (fileToS - late.seconds > gapAfterS) addGap(late.seconds, fileToS, [late.celsius]);
      }
      return { samples, peak, above, rates: rates.result(), gaps: [...gaps].sort((a, b) => a.fromS - b.fromS), gapCount, gapS, curve: curve.points() };
    },
  };
}
export type ChannelTally = ReturnType<typeof createChannelTally>;
