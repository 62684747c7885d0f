import { Column, Entity, PrimaryColumn } from 'typeorm';

/** The last number given in a series and year; the next one is given inside the unit that uses it. */
@Entity('number_series')
export class NumberSeries {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'integer' })
  last: number;
}
