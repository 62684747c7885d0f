import { Inject, Injectable } from '@nestjs/common';
import type { AcknowledgementModel } from '@libs/documents';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { CONFIG, type Config } from '../config/config.js';
import type { Customer } from '../customers/customer.entity.js';
import type { Machine } from '../machines/machine.entity.js';
import { OutboxService } from '../outbox/outbox.service.js';
import { PaperBaseService } from '../papers/paper-base.service.js';
import { PapersService } from '../papers/papers.service.js';
import { ShopService } from '../shop/shop.service.js';
import { acknowledgementMail } from './acknowledgement-mail.js';
import type { Job } from './job.entity.js';

/** What the customer gets for the machine: a paper to take along, and the same by mail. */
@Injectable()
export class AcknowledgementService {
  constructor(
    private readonly papers: PapersService,
    private readonly paperBase: PaperBaseService,
    private readonly outbox: OutboxService,
    private readonly shop: ShopService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  async give(manager: EntityManager, actor: Actor, { job, customer, machine }: { job: Job; customer: Customer; machine: Machine }): Promise<void> {
    const profile = await this.shop.profile();
    const [portal] = await manager.query<{ may: number }[]>('SELECT EXISTS (SELECT 1 FROM users WHERE customerId = ? AND disabledAt IS NULL) AS may', [customer.id]);
    const portalUrl = portal?.may === 1 ? `${this.config.publicUrl}/portal/jobs/${job.id}` : null;
    const model: AcknowledgementModel = {
      ...(await this.paperBase.ofJob(manager, job.id, { number: job.number })),
      kind: 'acknowledgement',
      route: job.route,
      receivedAt: job.receivedAt,
      receivedBy: actor.name,
      complaint: job.complaint,
      accessories: job.accessories,
      contamination: job.contamination as AcknowledgementModel['contamination'],
      contaminationWords: job.contaminationWords,
      promisedOn: job.promisedOn,
      jobUrl: portalUrl,
      conditions: profile.conditions,
    };
    const paperId = await this.papers.issue(manager, { kind: 'acknowledgement', number: job.number, jobId: job.id, customerId: customer.id, subjectId: job.id, model, actor });
    const mail = acknowledgementMail({
      shopName: profile.name,
      shopPhone: profile.phone,
      contactName: customer.contactName,
      jobNumber: job.number,
      machine: machine.description,
      serial: machine.serial,
      complaint: job.complaint,
      accessories: job.accessories,
      customerReference: job.customerReference,
      promisedOn: job.promisedOn,
      portalUrl,
    });
    await this.outbox.addMail(manager, { kind: 'acknowledgement', to: customer.email, ...mail, jobId: job.id, customerId: customer.id, paperIds: [paperId], dedupeKey: `acknowledgement-${job.id}` });
  }
}
