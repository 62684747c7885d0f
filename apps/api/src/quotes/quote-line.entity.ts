import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { Quote } from './quote.entity.js';

@Entity('quote_lines')
@Index('quote_lines_in_order', ['quoteId', 'position'], { unique: true })
export class QuoteLineRow {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Quote)
  quoteId: string;

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
