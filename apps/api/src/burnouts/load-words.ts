import type { LoadReason, LoadVerdict } from '@shared/burnouts';

const whole = (value: number) => value.toFixed(0);

/** What the history of each job says of its load. */
export function loadWords(load: { readonly number: number; readonly ovenName: string; readonly limitC: number; readonly peakC: number | null; readonly verdict: LoadVerdict | null; readonly reasons: readonly LoadReason[] }): string {
  const head = `Load ${load.number} in ${load.ovenName}`;
  const over = load.reasons.find((r) => r.code === 'over-limit');
  switch (load.verdict) {
    case null:
      return `${head}: limit ${whole(load.limitC)} °C. The logger's file is still to come.`;
    case 'does-not-conform':
      return `${head} went over its limit of ${whole(load.limitC)} °C: ${over?.code === 'over-limit' ? `${over.channel} came to ${whole(over.peakC)} °C, ${whole(over.overK)} K over` : 'see the load'}. The core test decides.`;
    case 'conforms':
      return `${head} kept within its limit of ${whole(load.limitC)} °C: ${whole(load.peakC ?? 0)} °C at most.`;
    case 'inconclusive':
      return `${head}: ${whole(load.peakC ?? 0)} °C at most where it was read, limit ${whole(load.limitC)} °C; a gap in the record may hide more.`;
    case 'not-valid':
      return `${head}: the temperature of the part is not known from this record.`;
  }
}
