import { Inject, Injectable } from '@nestjs/common';
import type { TagModel } from '@libs/documents';
import type { Tag } from '@shared/jobs';
import { IsNull, type EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { CONFIG, type Config } from '../config/config.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { notFound } from '../http/app-error.js';
import { PaperBaseService } from '../papers/paper-base.service.js';
import { Paper } from '../papers/paper.entity.js';
import { PapersService } from '../papers/papers.service.js';
import { Job } from './job.entity.js';
import { tagCaution } from './tag-caution.js';

/** The label tied to the machine; printed again as it is, until something on it has changed. */
@Injectable()
export class TagsService {
  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly history: HistoryService,
    private readonly papers: PapersService,
    private readonly paperBase: PaperBaseService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  async latest(jobId: string): Promise<Tag> {
    const tag = await this.db.one<Tag>("SELECT id AS paperId, number, issuedAt FROM papers WHERE jobId = ? AND kind = 'tag' AND supersededById IS NULL ORDER BY id DESC LIMIT 1", [jobId]);
    if (!tag) throw notFound('tag');
    return tag;
  }

  async print(actor: Actor, jobId: string): Promise<Tag> {
    await this.unitOfWork.run(async (manager) => {
      const job = await manager.findOneBy(Job, { id: jobId });
      if (!job) throw notFound('job');
      const model = await this.model(manager, job);
      const inForce = await manager.findOneBy(Paper, { jobId, kind: 'tag', supersededById: IsNull() });
      if (inForce && sameTag(inForce.model as TagModel, model)) return;
      const paperId = await this.papers.issue(manager, { kind: 'tag', number: job.number, jobId, customerId: job.customerId, subjectId: jobId, model, actor, ...(inForce ? { supersedesId: inForce.id } : {}) });
      await this.history.record(manager, { actor, subject: { kind: 'paper', id: paperId }, jobId, event: 'tag.issued', words: 'Tag printed.', data: { paperId, step: job.step } });
    });
    return this.latest(jobId);
  }

  private async model(manager: EntityManager, job: Job): Promise<TagModel> {
    const { job: _job, customer, machine, ...base } = await this.paperBase.ofJob(manager, job.id, { number: job.number });
    return {
      ...base,
      kind: 'tag',
      jobNumber: job.number,
      customerName: customer.name,
      machineDescription: machine.description,
      serial: machine.nameplate?.serial ?? '',
      route: job.route,
      step: job.step,
      receivedAt: job.receivedAt,
      promisedOn: job.promisedOn,
      part: '',
      jobUrl: `${this.config.publicUrl}/jobs/${job.id}`,
      caution: tagCaution(job.contamination as Parameters<typeof tagCaution>[0], job.contaminationWords, machine.nameplate?.explosiveAtmosphere ?? false),
    };
  }
}

/** The same but for the moment of printing. */
function sameTag(printed: TagModel, now: TagModel): boolean {
  return JSON.stringify({ ...printed, issuedAt: '' }) === JSON.stringify({ ...now, issuedAt: '' });
}
