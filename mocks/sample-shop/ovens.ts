import type { Stage } from './stage.js';

/**
 * Change of core loss in percent as the shop's paper book has it, job by job, from before the five weeks that are played.
 * The second oven was sound for twenty jobs and drifted in the eight that followed. All invented.
 */
export const OLDER_BOOK = {
  O1: [-3.1, -0.4, -1.9, 0.8, -2.6, -0.9, -3.4, 0.3, -1.2, -2.0, 0.6, -1.7, -2.9, -0.6, -2.3],
  O2: [-2.2, -0.8, -3.0, 0.4, -1.4, -2.7, -0.3, -1.8, 0.9, -2.1, -1.1, -3.3, -0.5, -1.6, 0.2, -2.4, -0.9, -1.3, 0.7, -2.0, 0.9, 1.8, 0.6, 2.4, 3.1, 4.9, 6.8, 9.7],
} as const;
const LAST_PAGE = -41;
const DAYS_BETWEEN = 5;

/** The manager copies the older book: each oven's figures, the newest on the last page. */
export async function copyOlderBook(stage: Stage): Promise<void> {
  for (const [oven, figures] of Object.entries(OLDER_BOOK)) {
    const rows = figures.map((percent, i) => ({ day: stage.date(LAST_PAGE - (figures.length - 1 - i) * DAYS_BETWEEN), change: percent / 100, remark: 'paper book' }));
    await stage.cast.manager.post(`/insight/ovens/${oven}/history`, { rows });
  }
}

/** What one thermocouple of a load saw. */
interface Couple {
  readonly name: string;
  readonly peakC: number;
  readonly minutesAbove345C: number;
}
interface SampleLoad {
  readonly day: number;
  readonly oven: 'O1' | 'O2';
  /** by machine */
  readonly jobs: readonly number[];
  readonly ringsOff?: boolean;
  readonly couples: readonly Couple[];
  readonly remark?: string;
}

/** The loads of the five weeks, as the logger of each oven wrote them. */
export const LOADS: readonly SampleLoad[] = [
  { day: -33, oven: 'O1', jobs: [6], couples: [{ name: 'Core drive end', peakC: 371, minutesAbove345C: 240 }] },
  { day: -27, oven: 'O1', jobs: [1, 3], couples: [{ name: 'TC1 SQ-20031', peakC: 356, minutesAbove345C: 95 }, { name: 'TC2 OW-77-02', peakC: 351, minutesAbove345C: 80 }] },
  { day: -22, oven: 'O2', jobs: [2], couples: [{ name: 'Core', peakC: 446, minutesAbove345C: 210 }], remark: 'Control thermocouple found out of contact after the load.' },
  { day: -17, oven: 'O1', jobs: [11], ringsOff: true, couples: [{ name: 'Core', peakC: 344, minutesAbove345C: 0 }] },
  { day: -12, oven: 'O1', jobs: [9], couples: [{ name: 'Core', peakC: 349, minutesAbove345C: 70 }] },
  { day: -10, oven: 'O2', jobs: [12], couples: [{ name: 'Core', peakC: 368, minutesAbove345C: 150 }] },
];

const FIVE_HOURS = 300;
const HOLD_BELOW = 60;

/** A part heats evenly to 345 °C, arches to its peak, and cools; one that stays below is held at its peak for an hour. */
function celsiusAt(minute: number, { peakC, minutesAbove345C }: Couple): number {
  const top = Math.min(peakC, 345);
  const arch = peakC > 345 ? minutesAbove345C : HOLD_BELOW;
  if (minute < FIVE_HOURS) return 20 + ((top - 20) * minute) / FIVE_HOURS;
  if (minute <= FIVE_HOURS + arch) {
    const along = (minute - FIVE_HOURS) / arch;
    return top + (peakC - top) * 4 * along * (1 - along);
  }
  return Math.max(60, top - (minute - FIVE_HOURS - arch) * 0.8);
}

/** A logger's file of one night, a row a minute, with the air of the oven beside the parts. */
export function loggerFile(date: string, couples: readonly Couple[]): string {
  const rows = Array.from({ length: 1020 }, (_, minute) => {
    const parts = couples.map((c) => celsiusAt(minute, c));
    const air = Math.max(...parts) + (minute < FIVE_HOURS ? 22 : 6);
    const clock = `${date} ${String(2 + Math.floor(minute / 60)).padStart(2, '0')}:${String(minute % 60).padStart(2, '0')}:00`;
    return [clock, ...[...parts, air].map((c) => c.toFixed(1).replace('.', ','))].join(';');
  });
  return `Time;${couples.map((c) => `${c.name} (°C)`).join(';')};Oven air (°C)\r\n${rows.join('\r\n')}\r\n`;
}

interface KeptLoad {
  readonly id: string;
  readonly version: number;
}

/** Writes a load down and hands in its logger's file the same evening. */
export async function burn(stage: Stage, load: SampleLoad, jobIds: readonly string[]): Promise<KeptLoad> {
  const { technician } = stage.cast;
  const made = await technician.post<KeptLoad>('/burnouts', { ovenId: load.oven, day: stage.date(load.day), jobs: jobIds.map((jobId) => ({ jobId, ringsOff: load.ringsOff ?? false })), remark: load.remark ?? '', countedAndSampled: true });
  stage.minutes(30);
  return technician.upload<KeptLoad>(`/burnouts/${made.id}/file?version=${made.version}`, `${load.oven}-${stage.date(load.day)}.csv`, loggerFile(stage.date(load.day), load.couples));
}

/** Two days after the last load the sensor of the second oven was found to read 11 K low: the load is judged again. */
export async function sensorFoundLow(stage: Stage, kept: KeptLoad, load: SampleLoad, jobIds: readonly string[]): Promise<void> {
  await stage.cast.technician.put(`/burnouts/${kept.id}`, {
    version: kept.version,
    reason: 'The sensor of O2 was found to read 11 K low.',
    ovenId: load.oven,
    day: stage.date(load.day),
    jobs: jobIds.map((jobId) => ({ jobId, ringsOff: load.ringsOff ?? false })),
    remark: load.remark ?? '',
    partChannels: load.couples.map((c) => c.name),
    offsetK: 11,
  });
}
