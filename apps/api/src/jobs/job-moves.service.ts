import { Injectable } from '@nestjs/common';
import type { EndJob, HoldJob, JobSheet, MoveJob, MoveLimits, ResumeJob, UpdateJob } from '@shared/jobs';
import { stepIndex } from '@shared/route';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError, changedMeanwhile, notFound } from '../http/app-error.js';
import { changedFields } from './changed-fields.js';
import { conditionsBefore } from './gates.js';
import { JobFactsService } from './job-facts.service.js';
import { JobSheetService } from './job-sheet.service.js';
import { moveProblem, stateAt } from './job-state.js';
import { editProblem, endProblem, holdProblem, limitsProblem, refusalOfMove, resumeProblem } from './job-refusals.js';
import { Job } from './job.entity.js';
import { END_WORDS, FIELD_WORDS, STEP_WORDS, WAITING_WORDS } from './job-words.js';

interface Change {
  readonly to: Partial<Job>;
  readonly event: string;
  readonly words: string;
  readonly data: Record<string, unknown>;
}

/** What is done to a job: each change is checked, counted as a version, and told in its history. */
@Injectable()
export class JobMovesService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly history: HistoryService,
    private readonly facts: JobFactsService,
    private readonly sheets: JobSheetService,
  ) {}

  move(actor: Actor, id: string, { version, to, why }: MoveJob): Promise<JobSheet> {
    if (to === 'released' && !actor.permissions.includes('jobs.release')) throw new AppError('FORBIDDEN', 'The counter or a manager releases a job.');
    return this.change(actor, id, version, async (job, manager) => {
      const facts = await this.facts.load(manager, id);
      const problem = moveProblem(job, to, why, (step) => conditionsBefore(step, facts));
      if (problem) throw refusalOfMove(problem);
      const state = stateAt(job.route, to);
      const back = stepIndex(job.route, to) < stepIndex(job.route, job.step);
      const words = `${back ? 'Back to' : 'Moved to'} ${STEP_WORDS[to]}${why ? `: ${why}` : '.'}`;
      return { to: { step: to, state, ...(state === 'released' ? { releasedAt: this.clock.iso() } : {}) }, event: 'job.moved', words, data: { from: job.step, to, why } };
    });
  }

  hold(actor: Actor, id: string, { version, reason, waitingFor }: HoldJob): Promise<JobSheet> {
    return this.change(actor, id, version, (job) => {
      refuse(holdProblem(job.state));
      return { to: { state: 'on-hold', holdReason: reason, waitingFor }, event: 'job.held', words: `On hold, waits for ${WAITING_WORDS[waitingFor]}: ${reason}`, data: { reason, waitingFor } };
    });
  }

  resume(actor: Actor, id: string, { version, why }: ResumeJob): Promise<JobSheet> {
    return this.change(actor, id, version, (job) => {
      refuse(resumeProblem(job.state));
      return { to: { state: 'open', holdReason: null, waitingFor: null }, event: 'job.resumed', words: `Goes on${why ? `: ${why}` : '.'}`, data: { heldBecause: job.holdReason, waitedFor: job.waitingFor, why } };
    });
  }

  end(actor: Actor, id: string, { version, ...end }: EndJob): Promise<JobSheet> {
    return this.change(actor, id, version, (job) => {
      refuse(endProblem(job.state));
      return { to: { state: end.end, holdReason: null, waitingFor: null }, event: 'job.ended', words: `${END_WORDS[end.end]}. ${end.consentBy} agreed (${end.consentHow})${end.words ? `: ${end.words}` : '.'}`, data: { ...end, atStep: job.step } };
    });
  }

  update(actor: Actor, id: string, { version, ...input }: UpdateJob): Promise<JobSheet> {
    return this.change(actor, id, version, (job) => {
      const changed = changedFields<Pick<Job, keyof typeof input>>(job, input);
      if (!changed) return null;
      const fields = Object.keys(changed.to) as (keyof typeof input)[];
      refuse(editProblem(job.state, fields));
      return { to: input, event: 'job.changed', words: `Changed: ${fields.map((field) => FIELD_WORDS[field]).join(', ')}.`, data: { ...changed } };
    });
  }

  /** An old record stays judged by its own version; the gates and new records go by the newer one. */
  moveLimits(actor: Actor, id: string, { version, reason }: MoveLimits): Promise<JobSheet> {
    return this.change(actor, id, version, async (job, manager) => {
      const [newest] = await manager.query<{ version: number }[]>('SELECT MAX(version) AS version FROM limits_versions');
      const to = newest?.version ?? job.limitsVersion;
      refuse(limitsProblem(job, to));
      return { to: { limitsVersion: to }, event: 'job.limits-moved', words: `Judged by acceptance limits no. ${to} from now on (before: no. ${job.limitsVersion}): ${reason}`, data: { from: job.limitsVersion, to, reason } };
    });
  }

  private async change(actor: Actor, id: string, version: number, decide: (job: Job, manager: EntityManager) => Change | null | Promise<Change | null>): Promise<JobSheet> {
    await this.unitOfWork.run(async (manager) => {
      const job = await manager.findOneBy(Job, { id });
      if (!job) throw notFound('job');
      if (job.version !== version) throw changedMeanwhile('job', asItIsNow(job));
      const change = await decide(job, manager);
      if (!change) return;
      await manager.update(Job, { id }, { ...change.to, version: job.version + 1 });
      await this.history.record(manager, { actor, subject: { kind: 'job', id }, jobId: id, event: change.event, words: change.words, data: change.data });
    });
    return this.sheets.sheet(id);
  }
}

/** What the screen shows beside what was typed when somebody else was faster. */
export const asItIsNow = (job: Job): Pick<Job, keyof UpdateJob | 'step' | 'state' | 'holdReason' | 'waitingFor' | 'limitsVersion'> => ({
  complaint: job.complaint,
  accessories: job.accessories,
  contamination: job.contamination,
  contaminationWords: job.contaminationWords,
  promisedOn: job.promisedOn,
  customerReference: job.customerReference,
  step: job.step,
  state: job.state,
  holdReason: job.holdReason,
  waitingFor: job.waitingFor,
  limitsVersion: job.limitsVersion,
  version: job.version,
});

function refuse(words: string | null): void {
  if (words) throw new AppError('STATE_NOT_RIGHT', words);
}
