import { createReadStream } from 'node:fs';
import type { Readable } from 'node:stream';
import { Inject, Injectable } from '@nestjs/common';
import type { LoggerSummary } from '@libs/logger-files';
import type { LoggerFileQuery } from '@shared/burnouts';
import type { FieldProblem } from '@shared/errors';
import type { FastifyRequest } from 'fastify';
import { AttachmentFiles } from '../attachments/attachment-files.js';
import { CONFIG, type Config } from '../config/config.js';
import { AppError } from '../http/app-error.js';
import { WINDOW_LIMIT_C } from './judge-load.js';
import { keptRead, type KeptRead } from './kept-read.js';
import { readLoggerFile } from './read-logger-file.js';
import { receiveLoggerFile } from './receive-logger-file.js';

export type ReadingHints = Pick<LoggerFileQuery, 'elapsedUnit' | 'dateOrder' | 'unit'>;
export interface KeptFile {
  readonly fileName: string;
  readonly storedName: string;
  readonly sizeBytes: number;
  readonly sha256: string;
  readonly hints: ReadingHints;
}
export interface HowToRead {
  readonly limitC: number;
  readonly offsetK: number;
  readonly hints: ReadingHints;
}

/** Loggers' files on disk, beside the photos and in the same backup: taken in, read, kept as they came. */
@Injectable()
export class LoggerFilesService {
  private readonly files: AttachmentFiles;

  constructor(@Inject(CONFIG) config: Config) {
    this.files = new AttachmentFiles(config.dataDir);
  }

  /** A file that cannot be read leaves nothing behind. */
  async takeIn(request: FastifyRequest, how: HowToRead): Promise<{ file: KeptFile; read: KeptRead }> {
    const part = this.files.newPart();
    try {
      const { name } = await receiveLoggerFile(request, part);
      const read = readable(await this.read(part, how));
      const storedName = this.files.newName('csv');
      return { file: { fileName: plainName(name), storedName, hints: how.hints, ...(await this.files.keep(part, storedName)) }, read };
    } finally {
      await this.files.remove(part);
    }
  }

  async readAgain(file: KeptFile, how: Omit<HowToRead, 'hints'>): Promise<KeptRead> {
    await this.assertWhole(file);
    return readable(await this.read(this.files.path(file.storedName), { ...how, hints: file.hints }));
  }

  async open(file: KeptFile): Promise<Readable> {
    await this.assertWhole(file);
    return createReadStream(this.files.path(file.storedName));
  }

  remove(storedName: string): Promise<void> {
    return this.files.remove(this.files.path(storedName));
  }

  private read(path: string, { limitC, offsetK, hints }: HowToRead): Promise<LoggerSummary> {
    const { elapsedUnit, dateOrder, unit } = hints;
    return readLoggerFile(path, { limitsC: [...new Set([WINDOW_LIMIT_C, limitC])], thermocoupleOffsetK: offsetK, ...(elapsedUnit ? { elapsedUnit } : {}), ...(dateOrder ? { dateOrder } : {}), ...(unit ? { unit } : {}) });
  }

  private async assertWhole({ storedName, sizeBytes, sha256 }: KeptFile): Promise<void> {
    if (await this.files.isWhole(storedName, sizeBytes, sha256)) return;
    throw new AppError('INTERNAL', 'This file is missing or damaged on the shop’s disk. Bring it back from the backup.', { cause: new Error(`Logger file ${storedName} is not what was taken in`) });
  }
}

/** What may be said with the file to make it readable stands at its own field. */
const FIELD_OF: Record<string, string> = { 'elapsed-unit-unknown': 'elapsedUnit', 'date-order-contradicted': 'dateOrder' };

function readable(summary: LoggerSummary): KeptRead {
  if (summary.outcome === 'read') return keptRead(summary);
  const lines: FieldProblem[] = summary.problems.map((p) => ({ path: 'file', code: p.code, message: p.message }));
  throw new AppError('FILE_NOT_ACCEPTED', summary.message, { fields: [{ path: FIELD_OF[summary.code] ?? 'file', code: summary.code, message: summary.message }, ...lines] });
}

/** Folders and characters that break a header or hide the ending stay out. */
function plainName(given: string): string {
  const last = given.normalize('NFC').split(/[/\\]/).at(-1) ?? '';
  const clean = last.replace(/[\p{C}\p{Zl}\p{Zp}"*/:<>?\\|]/gu, '').trim();
  return [...(clean || 'logger.csv')].slice(0, 120).join('');
}
