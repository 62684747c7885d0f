import type { LeftOutReason } from '@shared/insight';

/** A strip in the oven with the first test that speaks of it. */
export interface StripRow {
  readonly jobId: string;
  readonly number: string;
  readonly machine: string;
  readonly stripId: string;
  readonly day: string;
  /** the first valid test after, up to the next strip; null where there is none */
  readonly testId: string | null;
  readonly change: number | null;
  /** a repair between the strip and that test hides what the oven did */
  readonly repairId: string | null;
  readonly tests: number;
}
export interface EntryRow {
  readonly id: string;
  readonly day: string;
  readonly change: number;
  readonly remark: string;
  readonly by: string;
}

interface JobName {
  readonly id: string;
  readonly number: string;
  readonly machine: string;
}
export interface SeriesPoint {
  readonly day: string;
  readonly change: number;
  readonly job: JobName | null;
  readonly entry: { readonly id: string; readonly remark: string; readonly by: string } | null;
}
export interface LeftOut {
  readonly job: JobName;
  readonly day: string;
  readonly reason: LeftOutReason;
}

/** What counts of a strip, or why it does not. */
export function pointOf(row: StripRow): { readonly change: number } | { readonly reason: LeftOutReason } {
  if (row.repairId !== null && (row.testId === null || row.repairId < row.testId)) return { reason: 'repaired-first' };
  if (row.testId === null) return { reason: row.tests === 0 ? 'not-tested-yet' : 'not-valid' };
  return row.change === null ? { reason: 'increase-not-established' } : { change: row.change };
}

/** The oven's series by day: what an older book says of a day comes before the jobs of that day. */
export function ovenSeries(strips: readonly StripRow[], entries: readonly EntryRow[]): { points: SeriesPoint[]; leftOut: LeftOut[] } {
  const jobName = ({ jobId, number, machine }: StripRow): JobName => ({ id: jobId, number, machine });
  const placed: { sort: Place; point: SeriesPoint }[] = entries.map(({ id, day, change, remark, by }) => ({ sort: [day, 0, id], point: { day, change, job: null, entry: { id, remark, by } } }));
  const leftOut: LeftOut[] = [];
  for (const row of strips) {
    const found = pointOf(row);
    if ('reason' in found) leftOut.push({ job: jobName(row), day: row.day, reason: found.reason });
    else placed.push({ sort: [row.day, 1, row.stripId], point: { day: row.day, change: found.change, job: jobName(row), entry: null } });
  }
  return { points: placed.sort((a, b) => before(a.sort, b.sort)).map((p) => p.point), leftOut };
}

type Place = readonly [day: string, rank: number, id: string];

/** Days as written sort as they follow; identifiers sort by the time they were made. */
function before(a: Place, b: Place): number {
  if (a[0] !== b[0]) return a[0] < b[0] ? -1 : 1;
  return a[1] - b[1] || (a[2] < b[2] ? -1 : 1);
}
