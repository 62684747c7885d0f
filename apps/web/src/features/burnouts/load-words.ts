import { formatQuantity, formatUsual, type UnitSystem } from '@libs/quantities';
import type { LoadReason, LoadVerdict, PartLimitReason } from '@shared/burnouts';
import { t } from './text.js';

export const celsiusWords = (c: number, system: UnitSystem) => formatQuantity(c, 'temperature', system, { digits: 0 });
export const kelvinWords = (k: number, system: UnitSystem) => formatQuantity(k, 'temperature-difference', system, { digits: 0 });
export const limitReasonWords = (reason: PartLimitReason) => t(`because_${reason}`);
/** `95 min`, or `3 h 20 min` where it is long. */
export const minutesWords = (minutes: number, system: UnitSystem): string => formatUsual(minutes, 'duration', system);

/** Hours and minutes from the start of the record. */
export function sinceStart(minute: number): string {
  const whole = Math.round(minute);
  return `${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, '0')}`;
}

/** Why the load is judged as it is, in the person's units. */
export function reasonWords(reason: LoadReason, system: UnitSystem): string {
  switch (reason.code) {
    case 'over-limit':
      return t('reason_over', { channel: reason.channel, peak: celsiusWords(reason.peakC, system), over: kelvinWords(reason.overK, system) });
    case 'gap-may-hide-it': {
      const gap = { channel: reason.channel, from: sinceStart(reason.fromMinute), to: sinceStart(reason.toMinute) };
      return reason.reachC === null ? t('reason_gapUnknown', gap) : t('reason_gap', { ...gap, reach: celsiusWords(reason.reachC, system) });
    }
    case 'too-few-rows':
      return t('reason_few', { channel: reason.channel });
    case 'never-hot':
      return t('reason_cold', { channel: reason.channel, peak: celsiusWords(reason.peakC, system) });
    case 'nothing-on-the-part':
      return t('reason_nothing');
  }
}

interface Judged {
  readonly verdict: LoadVerdict | null;
  readonly reasons: readonly LoadReason[];
  readonly hottest: string | null;
  readonly peakC: number | null;
  readonly limitC: number;
}

/** Everything that is to be said of the verdict, line by line. */
export function verdictLines({ verdict, reasons, hottest, peakC, limitC }: Judged, system: UnitSystem): string[] {
  const lines = reasons.map((r) => reasonWords(r, system));
  if (verdict === 'conforms' && hottest !== null && peakC !== null) return [t('within', { channel: hottest, peak: celsiusWords(peakC, system), under: kelvinWords(limitC - peakC, system) }), ...lines];
  return verdict === 'does-not-conform' ? [...lines, t('coreDecides')] : lines;
}
