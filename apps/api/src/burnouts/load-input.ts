import type { CorrectLoad, CreateLoad } from '@shared/burnouts';
import type { FieldProblem } from '@shared/errors';
import type { Oven } from '../shop/shop-profile.js';
import { loadingProblem, type Part } from './parts.service.js';

export interface LoadContext {
  readonly parts: readonly Part[];
  readonly ovens: readonly Oven[];
  readonly today: string;
  /** jobs that stand in the load already: one that has ended since is not thrown out */
  readonly already: ReadonlySet<string>;
}

/** What stands against this load, each at its field. */
export function loadProblems(input: Pick<CreateLoad | CorrectLoad, 'ovenId' | 'day' | 'jobs'>, { parts, ovens, today, already }: LoadContext): FieldProblem[] {
  const problems: FieldProblem[] = [];
  if (!ovens.some((o) => o.id === input.ovenId)) problems.push({ path: 'ovenId', code: 'no-such-oven', message: 'The bay has no such oven.' });
  if (input.day > today) problems.push({ path: 'day', code: 'in-the-future', message: 'This day is still to come.' });
  input.jobs.forEach(({ jobId, ringsOff }, i) => {
    const part = parts.find((p) => p.jobId === jobId);
    if (!part) return void problems.push({ path: `jobs.${i}.jobId`, code: 'no-such-job', message: 'There is no such job.' });
    const problem = loadingProblem(part, ringsOff);
    if (!problem || (problem.code === 'ended' && already.has(jobId))) return;
    problems.push({ path: `jobs.${i}.${problem.code === 'rings-on' ? 'ringsOff' : 'jobId'}`, code: problem.code, message: problem.words });
  });
  return problems;
}
