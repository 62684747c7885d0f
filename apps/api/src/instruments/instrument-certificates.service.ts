import { createReadStream } from 'node:fs';
import { Inject, Injectable } from '@nestjs/common';
import type { InstrumentDetail } from '@shared/calibrations';
import type { FastifyRequest } from 'fastify';
import { AttachmentFiles } from '../attachments/attachment-files.js';
import type { ServedFile } from '../attachments/attachments.service.js';
import { kindOf } from '../attachments/file-kinds.js';
import { disposition, tidyFileName } from '../attachments/file-name.js';
import { receiveFile } from '../attachments/receive-file.js';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { CONFIG, type Config } from '../config/config.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError, notFound } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { CalibrationsService } from './calibrations.service.js';
import { InstrumentCalibration } from './instrument-calibration.entity.js';
import { InstrumentCertificate } from './instrument-certificate.entity.js';
import { Instrument } from './instrument.entity.js';

/** A scan that is no better than the one before is no reason for another twenty. */
const MOST_OF_A_CALIBRATION = 20;
const PDF = 'application/pdf';
type Kept = Pick<InstrumentCertificate, 'name' | 'storedName' | 'sizeBytes' | 'sha256'>;

/** Certificates of calibrations as files: taken in as carefully as the papers of a job. */
@Injectable()
export class InstrumentCertificatesService {
  private readonly files: AttachmentFiles;

  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly history: HistoryService,
    private readonly calibrations: CalibrationsService,
    @Inject(CONFIG) config: Config,
  ) {
    this.files = new AttachmentFiles(config.dataDir);
  }

  async add(actor: Actor, instrumentId: string, calibrationId: string, request: FastifyRequest): Promise<InstrumentDetail> {
    if (!(await this.db.one('SELECT id FROM instrument_calibrations WHERE id = ? AND instrumentId = ?', [calibrationId, instrumentId]))) throw notFound('calibration');
    const file = await this.takeIn(request);
    try {
      await this.unitOfWork.run(async (manager) => {
        const calibration = await manager.findOneBy(InstrumentCalibration, { id: calibrationId, instrumentId });
        const instrument = await manager.findOneBy(Instrument, { id: instrumentId });
        if (!calibration || !instrument) throw notFound('calibration');
        if ((await manager.countBy(InstrumentCertificate, { calibrationId })) >= MOST_OF_A_CALIBRATION) throw new AppError('FILE_NOT_ACCEPTED', `A calibration keeps ${MOST_OF_A_CALIBRATION} files at most.`);
        await manager.insert(InstrumentCertificate, { id: this.ids.next(), calibrationId, ...file, byUserId: actor.userId!, byName: actor.name, at: this.clock.iso() });
        await this.history.record(manager, {
          actor,
          subject: { kind: 'instrument', id: instrumentId },
          event: 'instrument.certificate-added',
          words: `Certificate of ${instrument.tag}’s calibration of ${calibration.calibratedOn} added: ${file.name}`,
          data: { calibrationId, name: file.name, sizeBytes: file.sizeBytes, sha256: file.sha256 },
        });
      });
    } catch (error) {
      await this.files.remove(this.files.path(file.storedName));
      throw error;
    }
    return this.calibrations.detail(instrumentId);
  }

  private async takeIn(request: FastifyRequest): Promise<Kept> {
    const received = this.files.newPart();
    try {
      const { name } = await receiveFile(request, received);
      if ((await kindOf(await this.files.beginning(received))) !== PDF) throw new AppError('FILE_NOT_ACCEPTED', 'A certificate is taken as PDF; this is none, whatever it is called.');
      const storedName = this.files.newName('pdf');
      return { name: tidyFileName(name, PDF), storedName, ...(await this.files.keep(received, storedName)) };
    } finally {
      await this.files.remove(received);
    }
  }

  async open(instrumentId: string, certificateId: string): Promise<ServedFile> {
    const row = await this.db.one<Kept>('SELECT f.name, f.storedName, f.sizeBytes, f.sha256 FROM instrument_certificates f JOIN instrument_calibrations c ON c.id = f.calibrationId WHERE f.id = ? AND c.instrumentId = ?', [certificateId, instrumentId]);
    if (!row) throw notFound('file');
    if (!(await this.files.isWhole(row.storedName, row.sizeBytes, row.sha256))) {
      throw new AppError('INTERNAL', 'This file is missing or damaged on the shop’s disk. Bring it back from the backup.', { cause: new Error(`Certificate file ${row.storedName} is not what was taken in`) });
    }
    return { stream: createReadStream(this.files.path(row.storedName)), type: PDF, length: row.sizeBytes, disposition: disposition('attachment', row.name) };
  }
}
