import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { User } from '../users/user.entity.js';
import { Instrument } from './instrument.entity.js';

/** One calibration of an instrument, as its certificate tells it. Append only: what was wrong is said by the next row. */
@Entity('instrument_calibrations')
@Index('instrument_calibrations_in_order', ['instrumentId', 'calibratedOn'])
export class InstrumentCalibration {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  @ForeignKey(() => Instrument)
  instrumentId: string;

  @Column({ type: 'text' })
  calibratedOn: string;

  @Column({ type: 'text' })
  dueOn: string;

  @Column({ type: 'text' })
  certificateNumber: string;

  /** who calibrated it */
  @Column({ type: 'text' })
  laboratory: string;

  /** how it was found, before anything was adjusted: 'within', 'outside', 'not-stated' */
  @Column({ type: 'text' })
  asFound: string;

  @Column({ type: 'text' })
  asFoundWords: string;

  @Column({ type: 'real' })
  percentOfReading: number;

  @Column({ type: 'real' })
  percentOfRange: number;

  /** null for what the register knew before it kept a history */
  @Column({ type: 'text', nullable: true })
  @ForeignKey(() => User)
  byUserId: string | null;

  @Column({ type: 'text' })
  byName: string;

  @Column({ type: 'text' })
  at: string;
}
