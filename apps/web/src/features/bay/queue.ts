import type { FloorRow } from '@shared/jobs';
import type { RecordKind } from '@shared/records';
import type { Step } from '@shared/route';
import { STEP_RECORDS } from '../../lib/record-names.js';

/** A job that waits for the bay, and the records that its step is made of: the first is the next to make. */
export interface QueueEntry {
  readonly job: FloorRow;
  readonly work: readonly RecordKind[];
}

export interface Queue {
  readonly now: readonly QueueEntry[];
  /** on hold: nothing to do until somebody answers, but not forgotten */
  readonly held: readonly QueueEntry[];
  /** how many wait at each step, in the order of the route */
  readonly counts: readonly { readonly step: Step; readonly jobs: number }[];
}

/** What a step asks of the bay on this job; a core that came out inconclusive or not valid is tested again before it is repaired. */
function workOf(job: FloorRow): readonly RecordKind[] {
  const work = STEP_RECORDS[job.step];
  const failed = job.step === 'core-test-after' && job.coreVerdict === 'does-not-conform';
  return failed ? [...work].reverse() : work;
}

/** Jobs whose step is work of the bay, late ones first, then by their promise; those without a promise last. */
export function queueOf(rows: readonly FloorRow[], step: Step | null): Queue {
  const entries = rows
    .map((job) => ({ job, work: workOf(job) }))
    .filter(({ job, work }) => work.length > 0 && (job.state === 'open' || job.state === 'on-hold'))
    .sort((a, b) => Number(b.job.late) - Number(a.job.late) || (a.job.promisedOn ?? '9999').localeCompare(b.job.promisedOn ?? '9999') || a.job.number.localeCompare(b.job.number));
  const open = entries.filter(({ job }) => job.state === 'open');
  const at = (entry: QueueEntry) => step === null || entry.job.step === step;
  const steps = (Object.keys(STEP_RECORDS) as Step[]).filter((s) => STEP_RECORDS[s].length > 0);
  return {
    now: open.filter(at),
    held: entries.filter((entry) => entry.job.state === 'on-hold' && at(entry)),
    counts: steps.map((s) => ({ step: s, jobs: open.filter(({ job }) => job.step === s).length })).filter(({ jobs }) => jobs > 0),
  };
}
