import { Column, Entity, PrimaryColumn } from 'typeorm';

@Entity('instruments')
export class Instrument {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text', unique: true })
  tag: string;

  @Column({ type: 'text' })
  kind: string;

  @Column({ type: 'text' })
  description: string;

  @Column({ type: 'text' })
  serial: string;

  @Column({ type: 'real' })
  percentOfReading: number;

  @Column({ type: 'real' })
  percentOfRange: number;

  @Column({ type: 'text' })
  rangeText: string;

  @Column({ type: 'text' })
  calibratedOn: string;

  @Column({ type: 'text' })
  dueOn: string;

  @Column({ type: 'text' })
  certificateNumber: string;

  @Column({ type: 'integer' })
  version: number;
}
