import { createWriteStream } from 'node:fs';
import { rm } from 'node:fs/promises';
import { pipeline } from 'node:stream/promises';
import { LOGGER_FILE_LIMIT_BYTES } from '@shared/burnouts';
import type { FastifyRequest } from 'fastify';
import { AppError } from '../http/app-error.js';

/** What the form puts round the file. */
const ROUND_THE_FILE_BYTES = 64 * 1024;
const tooLarge = () => new AppError('FILE_TOO_LARGE', `A logger's file may have ${LOGGER_FILE_LIMIT_BYTES / 1024 / 1024} MB at most. Export this burnout alone, or with a longer step between the rows.`);

/** Takes the one file of a form straight to disk, and stops at the limit; the name is what its sender called it. */
export async function receiveLoggerFile(request: FastifyRequest, to: string): Promise<{ name: string }> {
  if (!request.isMultipart()) throw new AppError('NOT_MULTIPART', 'Send the file as form data.');
  if (Number(request.headers['content-length'] ?? 0) > LOGGER_FILE_LIMIT_BYTES + ROUND_THE_FILE_BYTES) throw tooLarge();
  try {
    const part = await request.file({ throwFileSizeLimit: false, limits: { fileSize: LOGGER_FILE_LIMIT_BYTES, files: 1 } });
    if (!part) throw new AppError('FILE_NOT_ACCEPTED', 'No file came along. Choose the logger’s file and send it again.');
    const limit = new AbortController();
    part.file.on('limit', () => limit.abort());
    await pipeline(part.file, createWriteStream(to, { flags: 'wx', mode: 0o600 }), { signal: limit.signal }).catch((error: unknown) => {
      throw limit.signal.aborted ? tooLarge() : error;
    });
    if (part.file.truncated) throw tooLarge();
    return { name: part.filename ?? '' };
  } catch (error) {
    // the rest is let past, so that the sender comes to read the answer
    request.raw.unpipe();
    request.raw.resume();
    await rm(to, { force: true });
    throw refusalOf(error);
  }
}

/** A fault of our disk stays one; anything else means that the form was broken or broken off. */
function refusalOf(error: unknown): unknown {
  if (error instanceof AppError || typeof (error as NodeJS.ErrnoException).errno === 'number') return error;
  return new AppError('INPUT_NOT_VALID', 'The file did not arrive whole. Send it again.', { cause: error });
}
