import { randomBytes } from 'node:crypto';
import { Inject, Injectable, type OnApplicationShutdown } from '@nestjs/common';
import type { PaperModel } from '@libs/documents';
import type { PaperKind, PaperView } from '@shared/papers';
import type { EntityManager } from 'typeorm';
import type { Actor } from '../auth/actor.js';
import { Clock } from '../clock/clock.js';
import { CONFIG, type Config } from '../config/config.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { notFound } from '../http/app-error.js';
import { Ids } from '../ids/ids.js';
import { PaperPress } from './draw-paper.js';
import { PaperFiles, sha256 } from './paper-files.js';
import { Paper } from './paper.entity.js';

/** Layouts change by a new edition; an old paper keeps the one it was issued under. */
export const TEMPLATE_EDITION = '2026-12';

export interface NewPaper {
  readonly kind: PaperKind;
  readonly number: string;
  readonly jobId: string;
  readonly customerId: string;
  readonly subjectId: string;
  readonly model: PaperModel;
  readonly actor: Actor;
  readonly verificationCode?: string;
  readonly supersedesId?: string;
}

/** Eight groups nobody can guess, without letters that are mistaken for each other. */
export function verificationCode(random: (bytes: number) => Buffer = randomBytes): string {
  const alphabet = '23456789ABCDEFGHJKMNPQRSTVWXYZ';
  const letters = [...random(16)].map((byte) => alphabet[byte % alphabet.length]).join('');
  return letters.replace(/(.{4})(?=.)/g, '$1-');
}

/** Issued papers: the model is kept, the bytes are drawn from it off the main thread and never change. */
@Injectable()
export class PapersService implements OnApplicationShutdown {
  private readonly press = new PaperPress();
  private readonly files: PaperFiles;
  private readonly drawing = new Map<string, Promise<Buffer>>();

  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
    private readonly ids: Ids,
    @Inject(CONFIG) config: Config,
  ) {
    this.files = new PaperFiles(config.dataDir);
  }

  async onApplicationShutdown(): Promise<void> {
    await this.press.close();
  }

  /** Writes the paper's model inside the unit of the act that issues it. */
  async issue(manager: EntityManager, paper: NewPaper): Promise<string> {
    const id = this.ids.next();
    await manager.insert(Paper, {
      id,
      kind: paper.kind,
      number: paper.number,
      jobId: paper.jobId,
      customerId: paper.customerId,
      subjectId: paper.subjectId,
      issuedAt: this.clock.iso(),
      model: paper.model as never,
      templateVersion: TEMPLATE_EDITION,
      sha256: null,
      verificationCode: paper.verificationCode ?? null,
      supersededById: null,
      issuedByUserId: paper.actor.userId,
      version: 1,
    });
    if (paper.supersedesId) await manager.update(Paper, { id: paper.supersedesId }, { supersededById: id });
    return id;
  }

  async ofJob(jobId: string): Promise<PaperView[]> {
    return this.db.all<PaperView>(
      `SELECT p.id, p.kind, p.number, p.issuedAt, p.sha256, p.verificationCode, n.number AS supersededBy
       FROM papers p LEFT JOIN papers n ON n.id = p.supersededById WHERE p.jobId = ? ORDER BY p.id`,
      [jobId],
    );
  }

  /** The bytes of a paper; for a customer only their own, as if others did not exist. The tag is the shop's own. */
  async bytes(paperId: string, customerId: string | null = null): Promise<{ name: string; bytes: Buffer }> {
    const row = await this.db.one<{ number: string; kind: string; customerId: string }>('SELECT number, kind, customerId FROM papers WHERE id = ?', [paperId]);
    if (!row || (customerId !== null && (row.customerId !== customerId || row.kind === 'tag'))) throw notFound('paper');
    return { name: `${row.kind}-${row.number}.pdf`, bytes: await this.drawn(paperId) };
  }

  async asAttachments(paperIds: readonly string[]): Promise<{ filename: string; content: Buffer; contentType: string }[]> {
    const attachments = [];
    for (const id of paperIds) {
      const { name, bytes } = await this.bytes(id);
      attachments.push({ filename: name, content: bytes, contentType: 'application/pdf' });
    }
    return attachments;
  }

  private drawn(paperId: string): Promise<Buffer> {
    const running = this.drawing.get(paperId);
    if (running) return running;
    const promise = this.drawOnce(paperId).finally(() => this.drawing.delete(paperId));
    this.drawing.set(paperId, promise);
    return promise;
  }

  private async drawOnce(paperId: string): Promise<Buffer> {
    const row = await this.db.one<{ model: string; sha256: string | null }>('SELECT model, sha256 FROM papers WHERE id = ?', [paperId]);
    if (!row) throw notFound('paper');
    const kept = await this.files.read(paperId);
    if (kept && row.sha256 === sha256(kept)) return kept;
    const bytes = Buffer.from(await this.press.draw(JSON.parse(row.model) as PaperModel));
    const hash = await this.files.write(paperId, bytes);
    if (row.sha256 === null) await this.unitOfWork.run((manager) => manager.update(Paper, { id: paperId }, { sha256: hash }));
    else if (row.sha256 !== hash) throw new Error(`Paper ${paperId} does not print to the bytes it was issued with`);
    return bytes;
  }
}
