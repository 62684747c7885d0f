import { hasReached, type JobState, type Route, type Step } from '@shared/route';
import { ONCE_A_JOB, RECORD_FROM_STEP, type RecordKind } from '@shared/records';
import { isEnded } from '../jobs/job-state.js';

/** Why a record of this kind cannot be made now, in words; null when it can. */
export function recordingProblem(job: { readonly route: Route; readonly step: Step; readonly state: JobState }, kind: RecordKind, already: number): string | null {
  if (isEnded(job.state)) return 'The job has ended; a record is corrected by a revision, not made anew.';
  if (!hasReached(job.route, job.step, RECORD_FROM_STEP[kind])) return 'The job has not come to this step yet.';
  if (already > 0 && ONCE_A_JOB.includes(kind)) return 'This is recorded already: correct it by a revision.';
  return null;
}
