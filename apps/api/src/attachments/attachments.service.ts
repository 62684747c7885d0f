import { createReadStream, existsSync } from 'node:fs';
import { rename } from 'node:fs/promises';
import type { Readable } from 'node:stream';
import { Inject, Injectable, type OnModuleInit } from '@nestjs/common';
import type { AttachmentView } from '@shared/jobs';
import type { FastifyRequest } from 'fastify';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { CONFIG, type Config } from '../config/config.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { HistoryService } from '../history/history.service.js';
import { AppError, notFound } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { Job } from '../jobs/job.entity.js';
import { JobRecord } from '../records/job-record.entity.js';
import { AttachmentFiles } from './attachment-files.js';
import { Attachment } from './attachment.entity.js';
import { FILE_KINDS, isPicture, kindOf, type FileKind } from './file-kinds.js';
import { disposition, tidyFileName } from './file-name.js';
import { redraw, thumb } from './pictures.js';
import { receiveFile } from './receive-file.js';

/** Nobody takes more photos of one machine; a machine might. */
const MOST_OF_A_JOB = 300;

type Row = Pick<Attachment, 'name' | 'mime' | 'storedName' | 'sizeBytes' | 'sha256'>;
export interface ServedFile {
  readonly stream: Readable;
  readonly type: string;
  readonly length?: number;
  readonly disposition: string;
}

/** Photos and papers of a job: what comes in is looked at, drawn anew, and kept as it then is. */
@Injectable()
export class AttachmentsService implements OnModuleInit {
  private readonly files: AttachmentFiles;
  private readonly drawing = new Map<string, Promise<void>>();

  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    private readonly history: HistoryService,
    @Inject(CONFIG) config: Config,
  ) {
    this.files = new AttachmentFiles(config.dataDir);
  }

  onModuleInit(): Promise<void> {
    return this.files.sweep();
  }

  async add(actor: Actor, jobId: string, recordId: string | null, request: FastifyRequest): Promise<AttachmentView> {
    if (!(await this.db.one('SELECT id FROM jobs WHERE id = ?', [jobId]))) throw notFound('job');
    const file = await this.takeIn(request);
    try {
      return await this.unitOfWork.run(async (manager) => {
        const job = await manager.findOneBy(Job, { id: jobId });
        if (!job) throw notFound('job');
        if (recordId !== null && !(await manager.existsBy(JobRecord, { id: recordId, jobId }))) throw notFound('record');
        if ((await manager.countBy(Attachment, { jobId })) >= MOST_OF_A_JOB) throw new AppError('FILE_NOT_ACCEPTED', `A job keeps ${MOST_OF_A_JOB} files at most.`);
        const row: Attachment = { id: this.ids.next(), jobId, customerId: job.customerId, recordId, ...file, addedByUserId: actor.userId!, addedByName: actor.name, addedAt: this.clock.iso() };
        await manager.insert(Attachment, row);
        await this.history.record(manager, { actor, subject: { kind: 'attachment', id: row.id }, jobId, event: 'attachment.added', words: `${isPicture(row.mime) ? 'Photo' : 'Document'} added: ${row.name}`, data: { name: row.name, mime: row.mime, sizeBytes: row.sizeBytes, sha256: row.sha256, recordId } });
        return { id: row.id, name: row.name, mime: row.mime, sizeBytes: row.sizeBytes, addedBy: row.addedByName, addedAt: row.addedAt, recordId };
      });
    } catch (error) {
      await this.files.remove(this.files.path(file.storedName));
      throw error;
    }
  }

  private async takeIn(request: FastifyRequest): Promise<Row> {
    const [received, redrawn] = [this.files.newPart(), this.files.newPart()];
    try {
      const { name } = await receiveFile(request, received);
      const mime = await kindOf(await this.files.beginning(received));
      if (!mime) throw new AppError('FILE_NOT_ACCEPTED', 'Photos (PNG, JPEG, WebP) and PDF are taken; this is neither, whatever it is called.');
      const kept = FILE_KINDS[mime].picture ? await this.redrawn(mime, received, redrawn) : received;
      const storedName = this.files.newName(FILE_KINDS[mime].extension);
      return { name: tidyFileName(name, mime), mime, storedName, ...(await this.files.keep(kept, storedName)) };
    } finally {
      await this.files.remove(received);
      await this.files.remove(redrawn);
    }
  }

  private async redrawn(mime: FileKind, from: string, to: string): Promise<string> {
    await redraw(mime, from, to);
    return to;
  }

  /** For a customer only the pictures of their own jobs: papers of suppliers hang here too. */
  async open(id: string, customerId: string | null = null): Promise<ServedFile> {
    const row = await this.row(id, customerId);
    await this.assertWhole(row);
    return { stream: createReadStream(this.files.path(row.storedName)), type: row.mime, length: row.sizeBytes, disposition: disposition(isPicture(row.mime) ? 'inline' : 'attachment', row.name) };
  }

  /** A small picture for lists, drawn once. */
  async openThumb(id: string, customerId: string | null = null): Promise<ServedFile> {
    const row = await this.row(id, customerId);
    if (!isPicture(row.mime)) throw notFound('picture');
    const path = this.files.thumbPath(row.storedName);
    if (!existsSync(path)) await this.drawThumb(row, path);
    return { stream: createReadStream(path), type: 'image/webp', disposition: 'inline' };
  }

  private async drawThumb(row: Row, path: string): Promise<void> {
    const running = this.drawing.get(path);
    if (running) return running;
    const draw = async (): Promise<void> => {
      await this.assertWhole(row);
      await thumb(this.files.path(row.storedName), `${path}.part`);
      await rename(`${path}.part`, path);
    };
    const promise = draw().finally(() => this.drawing.delete(path));
    this.drawing.set(path, promise);
    return promise;
  }

  private async row(id: string, customerId: string | null): Promise<Row> {
    const columns = 'SELECT name, mime, storedName, sizeBytes, sha256 FROM attachments WHERE id = ?';
    const row = customerId === null ? await this.db.one<Row>(columns, [id]) : await this.db.one<Row>(`${columns} AND customerId = ? AND mime LIKE 'image/%'`, [id, customerId]);
    if (!row) throw notFound('file');
    return row;
  }

  private async assertWhole(row: Row): Promise<void> {
    if (await this.files.isWhole(row.storedName, row.sizeBytes, row.sha256)) return;
    throw new AppError('INTERNAL', 'This file is missing or damaged on the shop’s disk. Bring it back from the backup.', { cause: new Error(`Attachment file ${row.storedName} is not what was taken in`) });
  }
}
