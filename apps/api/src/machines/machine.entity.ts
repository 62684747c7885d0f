import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { Customer } from '../customers/customer.entity.js';
import type { CoreGeometry } from '@libs/core-loss';
import type { Nameplate } from '@shared/machines';

@Entity('machines')
@Index('machines_by_customer', ['customerId'])
@Index('machines_by_serial', ['serial'])
export class Machine {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Customer)
  customerId: string;

  @Column({ type: 'text' })
  description: string;

  @Column({ type: 'text' })
  serial: string;

  @Column({ type: 'simple-json' })
  nameplate: Nameplate;

  @Column({ type: 'simple-json', nullable: true })
  coreGeometry: CoreGeometry | null;

  @Column({ type: 'text' })
  createdAt: string;

  @Column({ type: 'integer' })
  version: number;
}
