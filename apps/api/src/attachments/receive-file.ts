import { createWriteStream } from 'node:fs';
import { rm } from 'node:fs/promises';
import { pipeline } from 'node:stream/promises';
import type { FastifyRequest } from 'fastify';
import { AppError } from '../http/app-error.js';
import { UPLOAD_LIMIT_BYTES } from '../http/setup.js';

/** What the form puts round the file: boundaries, names, a few fields. */
const ROUND_THE_FILE_BYTES = 64 * 1024;

/** How large a file may be, and what is said to whoever sends a larger one, or none. */
export interface FileTerms {
  readonly limitBytes: number;
  readonly tooLarge: string;
  readonly missing: string;
}
const ATTACHMENT: FileTerms = {
  limitBytes: UPLOAD_LIMIT_BYTES,
  tooLarge: `A file may have ${Math.floor(UPLOAD_LIMIT_BYTES / 1024 / 1024)} MB at most. Take the picture smaller, or scan with fewer dots.`,
  missing: 'No file came along. Choose one and send it again.',
};
const tooLarge = (terms: FileTerms) => new AppError('FILE_TOO_LARGE', terms.tooLarge);

/** Refused by what it says of itself, before a byte of it is read. */
function assertSendable(request: FastifyRequest, terms: FileTerms): void {
  if (!request.isMultipart()) throw new AppError('NOT_MULTIPART', 'Send the file as form data.');
  if (Number(request.headers['content-length'] ?? 0) > terms.limitBytes + ROUND_THE_FILE_BYTES) throw tooLarge(terms);
}

/** Takes the one file of a form straight to disk, and stops at the limit; the name is what its sender called it. */
export async function receiveFile(request: FastifyRequest, to: string, terms = ATTACHMENT): Promise<{ name: string }> {
  assertSendable(request, terms);
  try {
    const part = await request.file({ throwFileSizeLimit: false, limits: { fileSize: terms.limitBytes, files: 1 } });
    if (!part) throw new AppError('FILE_NOT_ACCEPTED', terms.missing);
    const limit = new AbortController();
    part.file.on('limit', () => limit.abort());
    await pipeline(part.file, createWriteStream(to, { flags: 'wx', mode: 0o600 }), { signal: limit.signal }).catch((error: unknown) => {
      throw limit.signal.aborted ? tooLarge(terms) : error;
    });
    if (part.file.truncated) throw tooLarge(terms);
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
