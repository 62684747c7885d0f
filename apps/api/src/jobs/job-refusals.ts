import type { UpdateJob } from '@shared/jobs';
import type { JobState } from '@shared/route';
import { AppError } from '../http/app-error.js';
import { isEnded, type MoveProblem } from './job-state.js';

/** Why something cannot be done to a job in its state, in words; null when it can. */
const ENDED = 'The job has ended; nothing is done to it any more.';

export function refusalOfMove(problem: MoveProblem): AppError {
  switch (problem.code) {
    case 'ended':
      return new AppError('MOVE_NOT_ALLOWED', ENDED);
    case 'on-hold':
      return new AppError('MOVE_NOT_ALLOWED', 'The job is on hold: let it go on first.');
    case 'not-on-route':
      return new AppError('MOVE_NOT_ALLOWED', 'This step is not on the route of this job.');
    case 'same-step':
      return new AppError('MOVE_NOT_ALLOWED', 'The job stands at this step already.');
    case 'skips-steps':
      return new AppError('MOVE_NOT_ALLOWED', 'A job goes forward one step at a time.');
    case 'reason-missing': {
      const message = 'Say why it goes back; what was recorded is kept.';
      return new AppError('INPUT_NOT_VALID', message, { fields: [{ path: 'why', code: 'reason-missing', message }] });
    }
    case 'gate-shut': {
      const missing = problem.conditions.filter((c) => !c.met);
      const more = missing.length > 1 ? ` And ${missing.length - 1} more.` : '';
      return new AppError('GATE_SHUT', `Not yet. ${missing[0]?.words ?? ''}${more}`, { conditions: problem.conditions });
    }
  }
}

export const holdProblem = (state: JobState): string | null => (state === 'on-hold' ? 'The job is on hold already.' : isEnded(state) ? ENDED : null);
export const resumeProblem = (state: JobState): string | null => (state === 'open' ? 'The job is not on hold.' : isEnded(state) ? ENDED : null);
export const endProblem = (state: JobState): string | null => (isEnded(state) ? ENDED : null);

/** An order number may come late, even after collection; what was taken in stays as it was. */
export const editProblem = (state: JobState, fields: readonly (keyof UpdateJob)[]): string | null =>
  isEnded(state) && fields.some((field) => field !== 'customerReference') ? 'The job has ended: only the customer’s reference can still be changed.' : null;

export function limitsProblem(job: { readonly state: JobState; readonly limitsVersion: number }, newest: number): string | null {
  if (isEnded(job.state)) return ENDED;
  return job.limitsVersion >= newest ? 'The job is judged by the newest limits already.' : null;
}
