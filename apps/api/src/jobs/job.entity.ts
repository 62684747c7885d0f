import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { Customer } from '../customers/customer.entity.js';
import { Machine } from '../machines/machine.entity.js';
import { User } from '../users/user.entity.js';
import type { JobState, Route, Step } from '@shared/route';

/** A visit of one machine. */
@Entity('jobs')
@Index('jobs_by_state_step', ['state', 'step', 'id'])
@Index('jobs_by_promise', ['state', 'promisedOn', 'id'])
@Index('jobs_by_number', ['state', 'number'])
@Index('jobs_by_receipt', ['state', 'receivedAt', 'id'])
@Index('jobs_by_customer', ['customerId'])
@Index('jobs_by_machine', ['machineId'])
export class Job {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text', unique: true })
  number: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Customer)
  customerId: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Machine)
  machineId: string;

  @Column({ type: 'text' })
  route: Route;

  @Column({ type: 'text' })
  step: Step;

  @Column({ type: 'text' })
  state: JobState;

  @Column({ type: 'text', nullable: true })
  holdReason: string | null;

  @Column({ type: 'text', nullable: true })
  waitingFor: string | null;

  @Column({ type: 'text' })
  complaint: string;

  @Column({ type: 'text' })
  accessories: string;

  @Column({ type: 'text' })
  contamination: string;

  @Column({ type: 'text' })
  contaminationWords: string;

  @Column({ type: 'text' })
  customerReference: string;

  @Column({ type: 'text', nullable: true })
  promisedOn: string | null;

  @Column({ type: 'text' })
  receivedAt: string;

  @Column({ type: 'text' })
  @ForeignKey(() => User)
  bookedByUserId: string;

  @Column({ type: 'text', nullable: true })
  @ForeignKey(() => Job)
  warrantyOfJobId: string | null;

  @Column({ type: 'integer' })
  limitsVersion: number;

  @Column({ type: 'text', nullable: true })
  releasedAt: string | null;

  @Column({ type: 'integer' })
  version: number;
}
