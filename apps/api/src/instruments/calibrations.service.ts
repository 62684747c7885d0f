import { Inject, Injectable } from '@nestjs/common';
import type { AddCalibration, CalibrationView, CertificateFileView, InstrumentDetail, InstrumentDue } from '@shared/calibrations';
import type { InstrumentView } from '@shared/instruments';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { daysApart, shopDate } from '../clock/shop-date.js';
import { CONFIG, type Config } from '../config/config.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError, changedMeanwhile, notFound } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { doubtFrom, inOrder, isSuperseded } from './calibration-history.js';
import { pastGrace } from './calibration-state.js';
import { InstrumentCalibration } from './instrument-calibration.entity.js';
import { Instrument } from './instrument.entity.js';
import { InstrumentsService } from './instruments.service.js';

type CalibrationRow = Omit<InstrumentCalibration, 'asFound' | 'byUserId' | 'instrumentId'> & { readonly asFound: CalibrationView['asFound'] };
interface CertificateRow extends CertificateFileView {
  readonly calibratedOn: string;
}

/** Calibrations of the instruments: what was done, what it found, and when the next one is due. */
@Injectable()
export class CalibrationsService {
  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly history: HistoryService,
    private readonly instruments: InstrumentsService,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  private today(): string {
    return shopDate(this.clock.now(), this.config.timeZone);
  }

  private dueOf(instrument: InstrumentView, today: string): InstrumentDue {
    return { ...instrument, daysLeft: daysApart(today, instrument.dueOn), notCounted: pastGrace(instrument.dueOn, today) };
  }

  /** Overdue, or due within thirty days: the most urgent first. */
  async due(): Promise<InstrumentDue[]> {
    const today = this.today();
    const waiting = (await this.instruments.list()).filter((i) => i.standing !== 'in-calibration');
    return waiting.map((i) => this.dueOf(i, today)).sort((a, b) => a.daysLeft - b.daysLeft);
  }

  async detail(id: string): Promise<InstrumentDetail> {
    const instrument = await this.instruments.one(id);
    const rows = inOrder(await this.db.all<CalibrationRow>('SELECT id, calibratedOn, dueOn, certificateNumber, laboratory, asFound, asFoundWords, percentOfReading, percentOfRange, byName, at FROM instrument_calibrations WHERE instrumentId = ?', [id]));
    const certificates = await this.db.all<CertificateRow>(
      'SELECT f.id, f.name, f.sizeBytes, f.byName AS "by", f.at, c.calibratedOn FROM instrument_certificates f JOIN instrument_calibrations c ON c.id = f.calibrationId WHERE c.instrumentId = ? ORDER BY f.at DESC, f.id DESC',
      [id],
    );
    return { instrument: this.dueOf(instrument, this.today()), calibrations: rows.map((row) => viewOf(row, rows, certificates)) };
  }

  /** The newest calibration also sets the register; an older one that is written down late only fills the history. */
  async add(actor: Actor, id: string, { version, ...input }: AddCalibration): Promise<InstrumentDetail> {
    if (input.calibratedOn > this.today()) {
      throw new AppError('INPUT_NOT_VALID', 'A calibration is written down when it has been made.', { fields: [{ path: 'calibratedOn', code: 'ahead', message: 'Not a day to come.' }] });
    }
    await this.unitOfWork.run(async (manager) => {
      const before = await manager.findOneBy(Instrument, { id });
      if (!before) throw notFound('instrument');
      if (before.version !== version) throw changedMeanwhile('instrument', { ...before });
      await this.keep(manager, actor, id, input);
      const { asFound, asFoundWords, laboratory: _laboratory, ...newest } = input;
      const counts = input.calibratedOn >= before.calibratedOn;
      if (counts) await manager.update(Instrument, { id }, { ...newest, version: before.version + 1 });
      const found = asFound === 'outside' ? ` Found outside its limits of error: ${asFoundWords}` : '';
      await this.history.record(manager, {
        actor,
        subject: { kind: 'instrument', id },
        event: 'instrument.calibrated',
        words: `${before.tag} calibrated on ${input.calibratedOn}, due again on ${input.dueOn}.${found}`,
        data: { ...input, from: counts ? { calibratedOn: before.calibratedOn, dueOn: before.dueOn, certificateNumber: before.certificateNumber } : null },
      });
    });
    return this.detail(id);
  }

  private async keep(manager: EntityManager, actor: Actor, instrumentId: string, input: Omit<AddCalibration, 'version'>): Promise<void> {
    await manager.insert(InstrumentCalibration, { id: this.ids.next(), instrumentId, ...input, byUserId: actor.userId, byName: actor.name, at: this.clock.iso() });
  }
}

function viewOf(row: CalibrationRow, all: readonly CalibrationRow[], certificates: readonly CertificateRow[]): CalibrationView {
  const { byName, ...rest } = row;
  const certificate = certificates.find((c) => c.calibratedOn === row.calibratedOn);
  return {
    ...rest,
    by: byName,
    superseded: isSuperseded(row, all),
    doubtFrom: doubtFrom(row, all),
    certificate: certificate ? { id: certificate.id, name: certificate.name, sizeBytes: certificate.sizeBytes, by: certificate.by, at: certificate.at } : null,
  };
}
