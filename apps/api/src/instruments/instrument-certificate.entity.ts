import { Column, Entity, ForeignKey, Index, PrimaryColumn } from 'typeorm';
import { User } from '../users/user.entity.js';
import { InstrumentCalibration } from './instrument-calibration.entity.js';

/** The scanned certificate of a calibration. Append only: a better scan is the next row, and the newest counts. */
@Entity('instrument_certificates')
@Index('instrument_certificates_by_calibration', ['calibrationId'])
export class InstrumentCertificate {
  @PrimaryColumn({ type: 'text' })
  id: string;

  @Column({ type: 'text' })
  @ForeignKey(() => InstrumentCalibration)
  calibrationId: string;

  @Column({ type: 'text' })
  name: string;

  @Column({ type: 'text', unique: true })
  storedName: string;

  @Column({ type: 'integer' })
  sizeBytes: number;

  @Column({ type: 'text' })
  sha256: string;

  @Column({ type: 'text' })
  @ForeignKey(() => User)
  byUserId: string;

  @Column({ type: 'text' })
  byName: string;

  @Column({ type: 'text' })
  at: string;
}
