import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

@Entity('customers')
@Index('customers_by_name', ['name'])
export class Customer {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  name: string;

  @Column({ type: 'text' })
  contactName: string;

  @Column({ type: 'text' })
  email: string;

  @Column({ type: 'text' })
  phone: string;

  @Column({ type: 'text' })
  addressLine1: string;

  @Column({ type: 'text' })
  addressLine2: string;

  @Column({ type: 'text' })
  postcode: string;

  @Column({ type: 'text' })
  city: string;

  @Column({ type: 'text' })
  country: string;

  @Column({ type: 'text' })
  taxNumber: string;

  @Column({ type: 'text' })
  terms: 'prepayment' | 'account';

  @Column({ type: 'integer' })
  netDays: number;

  @Column({ type: 'boolean' })
  creditStop: boolean;

  @Column({ type: 'text' })
  createdAt: string;

  @Column({ type: 'integer' })
  version: number;
}
