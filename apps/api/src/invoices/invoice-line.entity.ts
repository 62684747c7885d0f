import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { Invoice } from './invoice.entity.js';

@Entity('invoice_lines')
@Index('invoice_lines_in_order', ['invoiceId', 'position'], { unique: true })
export class InvoiceLineRow {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Invoice)
  invoiceId: string;

  @Column({ type: 'integer' })
  position: number;

  @Column({ type: 'text' })
  kind: string;

  @Column({ type: 'text' })
  description: string;

  @Column({ type: 'integer' })
  quantityThousandths: number;

  @Column({ type: 'text' })
  unit: string;

  @Column({ type: 'integer' })
  unitPriceMinor: number;

  @Column({ type: 'integer' })
  taxRateBasisPoints: number;

  @Column({ type: 'integer' })
  netMinor: number;

  @Column({ type: 'integer' })
  taxMinor: number;
}
