import type { LoadReason, LoadVerdict } from '@shared/burnouts';
import type { KeptChannel, KeptRead } from './kept-read.js';

type ReadChannel = Extract<KeptChannel, { outcome: 'read' }>;

/** A part that was never hotter than this was not burnt out: the file is another one, or the thermocouple hung elsewhere. Common practice. */
export const COLDEST_BURNOUT_C = 200;
export const WINDOW_LIMIT_C = 345;

export interface LoadJudgement {
  readonly verdict: LoadVerdict;
  readonly reasons: LoadReason[];
  readonly hottest: string | null;
  readonly peakC: number | null;
  readonly minutesAboveLimit: number | null;
  readonly minutesAbove345C: number | null;
}

/** The load by the thermocouples on its parts: over its limit, within it, or not to be told. */
export function judgeLoad({ channels }: Pick<KeptRead, 'channels'>, limitC: number, partChannels: readonly string[]): LoadJudgement {
  const parts = channels.filter((c): c is ReadChannel => c.outcome === 'read' && partChannels.includes(c.name));
  if (parts.length === 0) {
    return { verdict: 'not-valid', reasons: [{ code: 'nothing-on-the-part' }], hottest: null, peakC: null, minutesAboveLimit: null, minutesAbove345C: null };
  }
  const hottest = parts.reduce((best, c) => (c.peakC > best.peakC ? c : best));
  const figures = { hottest: hottest.name, peakC: hottest.peakC, minutesAboveLimit: longest(parts, limitC), minutesAbove345C: longest(parts, WINDOW_LIMIT_C) };
  const over = parts.filter((c) => c.peakC > limitC);
  if (over.length > 0) {
    return { verdict: 'does-not-conform', reasons: over.map((c) => ({ code: 'over-limit', channel: c.name, peakC: c.peakC, overK: c.peakC - limitC })), ...figures };
  }
  if (hottest.peakC < COLDEST_BURNOUT_C) return { verdict: 'not-valid', reasons: [{ code: 'never-hot', channel: hottest.name, peakC: hottest.peakC }], ...figures };
  const untold = parts.flatMap((c) => untoldIn(c, limitC));
  return { verdict: untold.length > 0 ? 'inconclusive' : 'conforms', reasons: untold, ...figures };
}

function longest(parts: readonly ReadChannel[], limitC: number): number | null {
  const minutes = parts.flatMap((c) => c.minutesAbove.filter((a) => a.limitC === limitC).map((a) => a.minutes));
  return minutes.length > 0 ? Math.max(...minutes) : null;
}

/** Stretches without readings in which the part may have gone over its limit unseen. */
function untoldIn(channel: ReadChannel, limitC: number): LoadReason[] {
  if (channel.gaps === null) return [{ code: 'too-few-rows', channel: channel.name }];
  return channel.gaps.flatMap((gap): LoadReason[] => {
    const reachC = reachInGap(channel, gap);
    return reachC !== null && reachC <= limitC ? [] : [{ code: 'gap-may-hide-it', channel: channel.name, fromMinute: gap.fromMinute, toMinute: gap.toMinute, reachC }];
  });
}

/**
 * The highest temperature a part can have come to while nothing was read: heated from the gap's start, and cooled to its
 * end, no faster than anywhere else in the record.
 *
 * `t* = (b − a + c·L)/(r + c)` `reach = a + r·t*`, t* kept within 0 to L; with one end only, `a + r·L` or `b + c·L`
 * where that end is hot; a part that was plugged in cold, or unplugged cold, was not burnt out meanwhile
 *
 * | symbol | meaning | unit |
 * |---|---|---|
 * | a, b | readings at the gap's ends | °C |
 * | r, c | fastest heating and cooling of the record | K/min |
 * | L | length of the gap | min |
 *
 * @returns null where the record is too short to show how fast the part heats
 *
 * Source: own.
 */
export function reachInGap({ rampKPerH, coolKPerH, curve }: Pick<ReadChannel, 'rampKPerH' | 'coolKPerH' | 'curve'>, gap: { readonly fromMinute: number; readonly toMinute: number }): number | null {
  if (rampKPerH === null || coolKPerH === null) return null;
  const [r, c, length] = [rampKPerH / 60, coolKPerH / 60, gap.toMinute - gap.fromMinute];
  const a = curve.filter(([minute]) => minute <= gap.fromMinute + ROUNDED_MINUTES).at(-1)?.[1];
  const b = curve.find(([minute]) => minute >= gap.toMinute - ROUNDED_MINUTES)?.[1];
  if (a === undefined) return b === undefined ? null : b < COLDEST_BURNOUT_C ? b : b + c * length;
  if (b === undefined) return a < COLDEST_BURNOUT_C ? a : a + r * length;
  if (r + c === 0) return Math.max(a, b);
  const t = Math.min(length, Math.max(0, (b - a + c * length) / (r + c)));
  return Math.max(a, b, a + r * t);
}

/** The curve is kept to a tenth of a minute. */
const ROUNDED_MINUTES = 0.06;
