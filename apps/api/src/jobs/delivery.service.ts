import { Inject, Injectable } from '@nestjs/common';
import type { DeliveryItem, DeliveryNoteModel } from '@libs/documents';
import type { Delivery, RecordDelivery } from '@shared/jobs';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { shopYear } from '../clock/shop-date.js';
import { CONFIG, type Config } from '../config/config.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { AppError, changedMeanwhile, notFound } from '../http/app-error.js';
import { PaperBaseService } from '../papers/paper-base.service.js';
import { sha256 } from '../papers/paper-files.js';
import { PapersService } from '../papers/papers.service.js';
import { NumberSeriesService } from '../series/number-series.service.js';
import { SignOffsService } from '../sign-offs/sign-offs.service.js';
import { deliveryProblem, type DeliveryProblem } from './delivery-rules.js';
import type { JobFacts } from './job-facts.js';
import { JobFactsService } from './job-facts.service.js';
import { asItIsNow } from './job-moves.service.js';
import { Job } from './job.entity.js';

/** The machine goes out: a delivery note, and the record of who took it. */
@Injectable()
export class DeliveryService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly facts: JobFactsService,
    private readonly series: NumberSeriesService,
    private readonly papers: PapersService,
    private readonly paperBase: PaperBaseService,
    private readonly signOffs: SignOffsService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  record(actor: Actor, jobId: string, { version, receivedBy, words }: RecordDelivery): Promise<Delivery> {
    return this.unitOfWork.run(async (manager) => {
      const job = await manager.findOneBy(Job, { id: jobId });
      if (!job) throw notFound('job');
      if (job.version !== version) throw changedMeanwhile('job', asItIsNow(job));
      const facts = await this.facts.load(manager, jobId);
      const problem = deliveryProblem(facts);
      if (problem) throw refusal(problem);
      const model = await this.note(manager, actor, job, facts, { receivedBy, words });
      const paperId = await this.papers.issue(manager, { kind: 'delivery-note', number: model.number, jobId, customerId: job.customerId, subjectId: jobId, model, actor });
      const signOff = await this.signOffs.keep(manager, actor, {
        kind: 'delivery',
        jobId,
        reason: words,
        detail: { receivedBy, paperId, number: model.number },
        contentHash: sha256(JSON.stringify(model)),
        words: `Collected by ${receivedBy}, delivery note ${model.number}${words ? `: ${words}` : '.'}`,
      });
      return { signOff, paperId, number: model.number };
    });
  }

  private async note(manager: EntityManager, actor: Actor, job: Job, facts: JobFacts, taken: { receivedBy: string; words: string }): Promise<DeliveryNoteModel> {
    const now = this.clock.now();
    const number = await this.series.next(manager, 'delivery-note', shopYear(now, this.config.timeZone));
    const base = await this.paperBase.ofJob(manager, job.id, { number });
    const [certificate] = await manager.query<{ number: string }[]>("SELECT number FROM papers WHERE jobId = ? AND kind = 'certificate' AND supersededById IS NULL ORDER BY id DESC LIMIT 1", [job.id]);
    const released = facts.signOffs.filter((s) => s.kind === 'released-by-second').at(-1);
    const serial = base.machine.nameplate?.serial ?? '';
    const items: DeliveryItem[] = [
      { description: base.machine.description, quantity: '1', remark: serial ? `Serial ${serial}` : '' },
      ...(job.accessories ? [{ description: job.accessories, quantity: '', remark: 'Came with it' }] : []),
    ];
    return {
      ...base,
      kind: 'delivery-note',
      items,
      releasedAt: released?.at ?? now.toISOString(),
      releasedBy: released?.byName ?? actor.name,
      collectedBy: taken.receivedBy,
      certificateNumber: certificate?.number ?? null,
      remark: taken.words,
    };
  }
}

function refusal(problem: DeliveryProblem): AppError {
  switch (problem.code) {
    case 'already':
      return new AppError('ALREADY_DONE', 'The delivery is recorded already.');
    case 'not-ready':
      return new AppError('STATE_NOT_RIGHT', 'A machine goes out when its job is ready.');
    case 'gate-shut':
      return new AppError('GATE_SHUT', `It cannot go out yet. ${problem.conditions.find((c) => !c.met)?.words ?? ''}`, { conditions: problem.conditions });
  }
}
