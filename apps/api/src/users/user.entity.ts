import { Column, Entity, ForeignKey, PrimaryColumn } from 'typeorm';
import { Customer } from '../customers/customer.entity.js';
import type { Role } from '@shared/roles';

/** Somebody who signs in: staff with roles, or a customer’s own user. */
@Entity('users')
export class User {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text', unique: true })
  email: string;

  @Column({ type: 'text' })
  name: string;

  @Column({ type: 'text' })
  passwordHash: string;

  @Column({ type: 'simple-json' })
  roles: Role[];

  @Column({ type: 'text', nullable: true })
  @ForeignKey(() => Customer)
  customerId: string | null;

  @Column({ type: 'text' })
  units: 'si' | 'inch-pound';

  @Column({ type: 'text' })
  theme: 'system' | 'light' | 'dark';

  @Column({ type: 'text', nullable: true })
  disabledAt: string | null;

  @Column({ type: 'text' })
  createdAt: string;

  @Column({ type: 'integer' })
  version: number;
}
