import { Inject, Injectable } from '@nestjs/common';
import type { BookIn, CreatedJob } from '@shared/jobs';
import { ROUTE_STEPS } from '@shared/route';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { shopYear } from '../clock/shop-date.js';
import { CONFIG, type Config } from '../config/config.js';
import { Customer } from '../customers/customer.entity.js';
import { CustomersService } from '../customers/customers.service.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { Machine } from '../machines/machine.entity.js';
import { MachinesService } from '../machines/machines.service.js';
import { NumberSeriesService } from '../series/number-series.service.js';
import { AcknowledgementService } from './acknowledgement.service.js';
import { Job } from './job.entity.js';

const refusedAt = (path: string, code: string, message: string) => new AppError('INPUT_NOT_VALID', message, { fields: [{ path, code, message }] });

/** Booking in: customer, machine, job, paper and mail, all of it or nothing. */
@Injectable()
export class BookingService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly history: HistoryService,
    private readonly series: NumberSeriesService,
    private readonly customers: CustomersService,
    private readonly machines: MachinesService,
    private readonly acknowledgement: AcknowledgementService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  bookIn(actor: Actor, input: BookIn): Promise<CreatedJob> {
    return this.unitOfWork.run(async (manager) => {
      const customer = await this.customer(manager, actor, input);
      const machine = await this.machine(manager, actor, customer, input);
      await assertWarranty(manager, machine, input.warrantyOfJobId);
      const job = await this.insertJob(manager, actor, customer, machine, input);
      await this.history.record(manager, {
        actor,
        subject: { kind: 'job', id: job.id },
        jobId: job.id,
        event: 'job.booked-in',
        words: `Booked in as ${job.number}: ${job.complaint}`,
        data: { route: job.route, promisedOn: job.promisedOn, contamination: job.contamination, accessories: job.accessories, warrantyOfJobId: job.warrantyOfJobId, limitsVersion: job.limitsVersion },
      });
      await this.acknowledgement.give(manager, actor, { job, customer, machine });
      return { id: job.id, number: job.number };
    });
  }

  private async customer(manager: EntityManager, actor: Actor, { customer }: BookIn): Promise<Customer> {
    if (customer.kind === 'new') return this.customers.add(manager, actor, customer.details);
    const known = await manager.findOneBy(Customer, { id: customer.customerId });
    if (!known) throw refusedAt('customer.customerId', 'unknown', 'There is no such customer; look for it again.');
    return known;
  }

  private async machine(manager: EntityManager, actor: Actor, customer: Customer, { machine }: BookIn): Promise<Machine> {
    if (machine.kind === 'new') return this.machines.add(manager, actor, customer.id, machine.details);
    const known = await manager.findOneBy(Machine, { id: machine.machineId });
    if (!known) throw refusedAt('machine.machineId', 'unknown', 'There is no such machine; look for it again.');
    if (known.customerId !== customer.id) throw refusedAt('machine.machineId', 'other-customer', 'This machine belongs to another customer. Choose that customer, or enter the machine anew.');
    return known;
  }

  private async insertJob(manager: EntityManager, actor: Actor, customer: Customer, machine: Machine, input: BookIn): Promise<Job> {
    const [newest] = await manager.query<{ version: number | null }[]>('SELECT MAX(version) AS version FROM limits_versions');
    if (!newest?.version) throw new AppError('STATE_NOT_RIGHT', 'The shop has no acceptance limits yet. A manager publishes them first.');
    const now = this.clock.now();
    const job: Job = {
      id: this.ids.next(),
      number: await this.series.next(manager, 'job', shopYear(now, this.config.timeZone)),
      customerId: customer.id,
      machineId: machine.id,
      route: input.route,
      step: ROUTE_STEPS[input.route][0]!,
      state: 'open',
      holdReason: null,
      waitingFor: null,
      complaint: input.complaint,
      accessories: input.accessories,
      contamination: input.contamination,
      contaminationWords: input.contaminationWords,
      customerReference: input.customerReference,
      promisedOn: input.promisedOn,
      receivedAt: now.toISOString(),
      bookedByUserId: actor.userId!,
      warrantyOfJobId: input.warrantyOfJobId,
      limitsVersion: newest.version,
      releasedAt: null,
      version: 1,
    };
    await manager.insert(Job, job);
    return job;
  }
}

/** A warranty return is a visit of the same machine. */
async function assertWarranty(manager: EntityManager, machine: Machine, firstJobId: string | null): Promise<void> {
  if (firstJobId === null) return;
  const first = await manager.findOneBy(Job, { id: firstJobId });
  if (first?.machineId !== machine.id) throw refusedAt('warrantyOfJobId', 'other-machine', 'The first job must be one of this machine.');
}
