import { Injectable } from '@nestjs/common';
import type { AskWaiver, Countersign, LiftCredit, RecordDecision, ReleaseInconclusive, SignConcession, SignOff as SignOffView, SignRecord } from '@shared/waivers';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { SessionsService } from '../auth/sessions.service.js';
import { Clock } from '../clock/clock.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError, changedMeanwhile, notFound } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import type { JobFacts, RecordFact } from '../jobs/job-facts.js';
import { JobFactsService } from '../jobs/job-facts.service.js';
import { Job } from '../jobs/job.entity.js';
import { sha256 } from '../papers/paper-files.js';
import { concessionProblem, countersignProblem, decisionProblem, inconclusiveProblem, secondPersonProblem, testedProblem, waiverProblem, type SignProblem } from './sign-off-state.js';
import { SignOff, type SignOffKind } from './sign-off.entity.js';

interface NewSignOff {
  readonly kind: SignOffKind;
  readonly jobId: string;
  readonly recordId?: string;
  readonly refersTo?: string;
  readonly reason: string;
  readonly detail?: Record<string, unknown>;
  /** the hash of what is signed; of the words themselves where there is no record */
  readonly contentHash?: string;
  readonly words: string;
}

/** Signatures and recorded answers: who, when, what, and the hash of what was signed. */
@Injectable()
export class SignOffsService {
  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly history: HistoryService,
    private readonly facts: JobFactsService,
    private readonly sessions: SessionsService,
  ) {}

  async askWaiver(actor: Actor, jobId: string, input: AskWaiver): Promise<SignOffView> {
    return this.sign(actor, jobId, (facts) => {
      refuse(waiverProblem(facts));
      return { kind: 'waiver', jobId, reason: input.words, detail: { reason: input.reason }, words: `Waiver of the core test before asked for: ${input.words}` };
    });
  }

  async countersignWaiver(actor: Actor, waiverId: string, input: Countersign): Promise<SignOffView> {
    const waiver = await this.existing(waiverId, 'waiver');
    await this.sessions.assertSigning(actor, input.password);
    return this.sign(actor, waiver.jobId, (facts) => {
      refuse(countersignProblem(facts, waiver.id, actor.userId!));
      return { kind: 'waiver-countersignature', jobId: waiver.jobId, refersTo: waiver.id, reason: input.remark, contentHash: waiver.contentHash, words: 'Waiver of the core test before countersigned; the increase will not be established.' };
    });
  }

  async recordDecision(actor: Actor, jobId: string, input: RecordDecision): Promise<SignOffView> {
    return this.sign(actor, jobId, (facts) => {
      const record = recordIn(facts, input.recordId);
      refuse(decisionProblem(facts, record, input.about));
      const { recordId, words, ...detail } = input;
      return { kind: 'decision', jobId, recordId, reason: words, detail, contentHash: record.contentHash, words: `${input.answeredBy} answered (${input.channel}): ${DECISION_WORDS[input.choice]}.` };
    });
  }

  async signConcession(actor: Actor, jobId: string, input: SignConcession): Promise<SignOffView> {
    await this.sessions.assertSigning(actor, input.password);
    return this.sign(actor, jobId, (facts) => {
      const record = recordIn(facts, input.recordId);
      refuse(concessionProblem(facts, record, input.decisionId));
      return { kind: 'concession', jobId, recordId: record.id, refersTo: input.decisionId, reason: input.reason, detail: {}, contentHash: record.contentHash, words: `Concession signed: ${input.reason}` };
    });
  }

  async releaseInconclusive(actor: Actor, recordId: string, input: ReleaseInconclusive): Promise<SignOffView> {
    await this.sessions.assertSigning(actor, input.password);
    return this.sign(actor, await this.jobOfRecord(recordId), (facts, jobId) => {
      const record = recordIn(facts, recordId);
      refuse(inconclusiveProblem(facts, record));
      return { kind: 'inconclusive-release', jobId, recordId, reason: input.reason, contentHash: record.contentHash, words: `Inconclusive core test released: ${input.reason}` };
    });
  }

  async signTested(actor: Actor, recordId: string, input: SignRecord): Promise<SignOffView> {
    await this.assertVersion(recordId, input.version);
    await this.sessions.assertSigning(actor, input.password);
    return this.sign(actor, await this.jobOfRecord(recordId), (facts, jobId) => {
      const record = recordIn(facts, recordId);
      refuse(testedProblem(facts, record));
      return { kind: 'tested', jobId, recordId, reason: '', detail: { revision: record.revision }, contentHash: record.contentHash, words: 'Final test signed by the technician.' };
    });
  }

  async releaseTested(actor: Actor, recordId: string, input: SignRecord): Promise<SignOffView> {
    await this.assertVersion(recordId, input.version);
    await this.sessions.assertSigning(actor, input.password);
    return this.sign(actor, await this.jobOfRecord(recordId), (facts, jobId) => {
      const record = recordIn(facts, recordId);
      refuse(secondPersonProblem(facts, record, actor.userId!));
      return { kind: 'released-by-second', jobId, recordId, reason: '', detail: { revision: record.revision }, contentHash: record.contentHash, words: 'Final test released by a second person.' };
    });
  }

  async liftCredit(actor: Actor, jobId: string, input: LiftCredit): Promise<SignOffView> {
    await this.sessions.assertSigning(actor, input.password);
    return this.sign(actor, jobId, (facts) => {
      refuse(facts.customer.creditStop ? null : { code: 'STATE_NOT_RIGHT', words: 'This customer is not on credit stop.' });
      return { kind: 'credit-lift', jobId, reason: input.reason, words: `Credit stop lifted for this delivery: ${input.reason}` };
    });
  }

  private sign(actor: Actor, jobId: string, decide: (facts: JobFacts, jobId: string) => NewSignOff): Promise<SignOffView> {
    return this.unitOfWork.run(async (manager) => this.keep(manager, actor, decide(await this.facts.load(manager, jobId), jobId)));
  }

  /** Used by other acts that leave a signature of their own, such as the delivery note. */
  async keep(manager: EntityManager, actor: Actor, sign: NewSignOff): Promise<SignOffView> {
    const row = {
      id: this.ids.next(),
      jobId: sign.jobId,
      recordId: sign.recordId ?? null,
      refersTo: sign.refersTo ?? null,
      kind: sign.kind,
      byUserId: actor.userId!,
      byName: actor.name,
      byRoles: actor.roles.join(', '),
      at: this.clock.iso(),
      reason: sign.reason,
      detail: sign.detail ?? {},
      contentHash: sign.contentHash ?? sha256(JSON.stringify([sign.kind, sign.jobId, sign.reason, sign.detail ?? {}])),
      version: 1,
    };
    await manager.insert(SignOff, row as never);
    const job = await manager.findOneByOrFail(Job, { id: sign.jobId });
    await manager.update(Job, { id: job.id }, { version: job.version + 1 });
    await this.history.record(manager, { actor, subject: { kind: 'sign-off', id: row.id }, jobId: sign.jobId, event: `${sign.kind}.signed`, words: sign.words, data: { ...row.detail, recordId: row.recordId, contentHash: row.contentHash } });
    return { id: row.id, kind: row.kind, recordId: row.recordId, by: row.byName, byRoles: row.byRoles, at: row.at, reason: row.reason, detail: row.detail, contentHash: row.contentHash, version: 1 };
  }

  private async existing(id: string, kind: SignOffKind): Promise<{ id: string; jobId: string; contentHash: string }> {
    const row = await this.db.one<{ id: string; jobId: string; contentHash: string }>('SELECT id, jobId, contentHash FROM sign_offs WHERE id = ? AND kind = ?', [id, kind]);
    if (!row) throw notFound(kind);
    return row;
  }

  private async jobOfRecord(recordId: string): Promise<string> {
    const row = await this.db.one<{ jobId: string }>('SELECT jobId FROM job_records WHERE id = ?', [recordId]);
    if (!row) throw notFound('record');
    return row.jobId;
  }

  private async assertVersion(recordId: string, version: number): Promise<void> {
    const row = await this.db.one<{ version: number }>('SELECT version FROM job_records WHERE id = ?', [recordId]);
    if (!row) throw notFound('record');
    if (row.version !== version) throw changedMeanwhile('record', { version: row.version });
  }
}

const DECISION_WORDS: Record<RecordDecision['choice'], string> = {
  'go-on': 'go on with the repair',
  'repair-and-retest': 'repair the core and test it again',
  'accept-with-concession': 'accept the core as it is, by concession',
  replace: 'replace the machine',
  'return-unrepaired': 'return it unrepaired',
};

function refuse(problem: SignProblem | null): void {
  if (problem) throw new AppError(problem.code, problem.words);
}

function recordIn(facts: JobFacts, recordId: string): RecordFact {
  const record = facts.records.find((r) => r.id === recordId);
  if (!record) throw notFound('record');
  return record;
}
