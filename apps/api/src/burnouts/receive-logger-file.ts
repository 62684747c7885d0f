import { LOGGER_FILE_LIMIT_BYTES } from '@shared/burnouts';
import type { FastifyRequest } from 'fastify';
import { receiveFile, type FileTerms } from '../attachments/receive-file.js';

const LOGGER_FILE: FileTerms = {
  limitBytes: LOGGER_FILE_LIMIT_BYTES,
  tooLarge: `A logger's file may have ${LOGGER_FILE_LIMIT_BYTES / 1024 / 1024} MB at most. Export this burnout alone, or with a longer step between the rows.`,
  missing: 'No file came along. Choose the logger’s file and send it again.',
};

/** Takes a logger's file straight to disk; the name is what its sender called it. */
export const receiveLoggerFile = (request: FastifyRequest, to: string): Promise<{ name: string }> => receiveFile(request, to, LOGGER_FILE);
