import { Inject, Injectable } from '@nestjs/common';
import type { CertificateModel } from '@libs/documents';
import type { IssueCertificate, PaperView } from '@shared/papers';
import { hasReached, type Route, type Step } from '@shared/route';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { AcceptanceService } from '../acceptance/acceptance.service.js';
import { LimitsVersion } from '../acceptance/limits-version.entity.js';
import { Clock } from '../clock/clock.js';
import { shopYear } from '../clock/shop-date.js';
import { CONFIG, type Config } from '../config/config.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError, changedMeanwhile, notFound } from '../http/app-error.js';
import { Job } from '../jobs/job.entity.js';
import { PaperBaseService } from '../papers/paper-base.service.js';
import { Paper } from '../papers/paper.entity.js';
import { PapersService, verificationCode } from '../papers/papers.service.js';
import { NumberSeriesService } from '../series/number-series.service.js';
import { IsNull } from 'typeorm';
import { certificateContent } from './certificate-content.js';
import { certifiedRecords, certifiedSignOffs } from './certificate-source.js';

/** Why a certificate cannot be issued now, in words; null when it can. */
export function issueProblem(job: { readonly route: Route; readonly step: Step }, inForce: { readonly number: string } | null, reason: string): { code: 'STEP_NOT_OPEN' | 'STATE_NOT_RIGHT'; words: string } | null {
  if (!hasReached(job.route, job.step, 'ready')) return { code: 'STEP_NOT_OPEN', words: 'A certificate is issued when the job is ready: tested, signed and released by a second person.' };
  if (inForce && reason === '') return { code: 'STATE_NOT_RIGHT', words: `Certificate ${inForce.number} is in force. A new one replaces it: say why.` };
  return null;
}

/** Certificates: what they say is frozen at issue; a correction is a new issue that names the old one. */
@Injectable()
export class CertificatesService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly history: HistoryService,
    private readonly papers: PapersService,
    private readonly base: PaperBaseService,
    private readonly series: NumberSeriesService,
    private readonly acceptance: AcceptanceService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  async issue(actor: Actor, jobId: string, input: IssueCertificate): Promise<PaperView> {
    const paperId = await this.unitOfWork.run(async (manager) => {
      const job = await manager.findOneBy(Job, { id: jobId });
      if (!job) throw notFound('job');
      if (job.version !== input.jobVersion) throw changedMeanwhile('job', { step: job.step, state: job.state, version: job.version });
      const inForce = await manager.findOneBy(Paper, { jobId, kind: 'certificate', supersededById: IsNull() });
      const problem = issueProblem(job, inForce, input.reason);
      if (problem) throw new AppError(problem.code, problem.words);
      const number = await this.series.next(manager, 'certificate', shopYear(this.clock.now(), this.config.timeZone));
      const code = verificationCode();
      const model = await this.model(manager, job, input, number, code, inForce);
      const id = await this.papers.issue(manager, { kind: 'certificate', number, jobId, customerId: job.customerId, subjectId: jobId, model, actor, verificationCode: code, ...(inForce ? { supersedesId: inForce.id } : {}) });
      await manager.update(Job, { id: jobId }, { version: job.version + 1 });
      await this.history.record(manager, { actor, subject: { kind: 'certificate', id }, jobId, event: 'certificate.issued', words: inForce ? `Certificate ${number} issued; it replaces ${inForce.number}: ${input.reason}` : `Certificate ${number} issued.`, data: { number, replaces: inForce?.number ?? null } });
      return id;
    });
    return (await this.papers.ofJob(jobId)).find((p) => p.id === paperId)!;
  }

  private async model(manager: EntityManager, job: Job, input: IssueCertificate, number: string, code: string, inForce: Paper | null): Promise<CertificateModel> {
    const limits = await this.acceptance.setOf(manager, job.limitsVersion);
    const published = await manager.findOneByOrFail(LimitsVersion, { version: job.limitsVersion });
    const head = await this.base.ofJob(manager, job.id, { number, paperSize: input.paperSize, units: input.units });
    return {
      ...head,
      kind: 'certificate',
      route: job.route,
      receivedAt: job.receivedAt,
      replaces: inForce ? { number: inForce.number, issuedAt: inForce.issuedAt, reason: input.reason } : null,
      supersededBy: null,
      verification: { code, checkUrl: `${this.config.publicUrl}/check/${code}` },
      limits: { version: job.limitsVersion, publishedAt: published.publishedAt, decisionRule: limits.core.decisionRule, coverageFactor: limits.core.coverageFactor },
      ...certificateContent(await certifiedRecords(manager, job.id), await certifiedSignOffs(manager, job.id)),
      remark: '',
    };
  }
}
