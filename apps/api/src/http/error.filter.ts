import { Catch, HttpException, Logger, type ArgumentsHost, type ExceptionFilter } from '@nestjs/common';
import type { ErrorBody, ErrorCode, FieldProblem } from '@shared/errors';
import type { FastifyReply } from 'fastify';
import type { ActorRequest } from '../auth/needs.js';
import { AppError } from './app-error.js';
import { HTTP_STATUS } from './error-status.js';
import { isOpenedByAPerson, plainPage } from './plain-page.js';
import { InputNotValid } from './schema.pipe.js';

const BY_STATUS: Record<number, ErrorCode> = { 400: 'INPUT_NOT_VALID', 401: 'NOT_SIGNED_IN', 403: 'FORBIDDEN', 404: 'NOT_FOUND', 413: 'FILE_TOO_LARGE', 415: 'NOT_MULTIPART', 429: 'TOO_MANY_TRIES' };
const WORDS: Partial<Record<ErrorCode, string>> = {
  INPUT_NOT_VALID: 'The request could not be read.',
  NOT_SIGNED_IN: 'Sign in to go on. What you typed is kept.',
  FORBIDDEN: 'Your roles do not allow this.',
  NOT_FOUND: 'There is nothing at this address.',
  FILE_TOO_LARGE: 'That is too large to be taken.',
  NOT_MULTIPART: 'Send the file as form data.',
  TOO_MANY_TRIES: 'Too many tries. Wait a minute, then try again.',
};

/** What a person should find in the log: somebody tries what they may not. */
const WATCHED: ReadonlySet<ErrorCode> = new Set(['FORBIDDEN', 'CROSS_SITE_REQUEST', 'WRONG_NAME_OR_PASSWORD', 'WRONG_SIGNATURE', 'TOO_MANY_TRIES', 'SIGNATURE_NOT_VALID']);

interface Answer {
  status: number;
  code: ErrorCode;
  message: string;
  fields?: readonly FieldProblem[];
  current?: unknown;
  conditions?: ErrorBody['conditions'];
}

/** One place that turns what went wrong into an answer; what is not foreseen says nothing of the inside. */
@Catch()
export class ErrorFilter implements ExceptionFilter {
  private readonly log = new Logger('Refusal');

  catch(exception: unknown, host: ArgumentsHost): void {
    const request = host.switchToHttp().getRequest<ActorRequest>();
    const reply = host.switchToHttp().getResponse<FastifyReply>();
    const answer = this.answerFor(exception);
    if (answer.code === 'INTERNAL') this.log.error(exception instanceof Error ? exception : new Error(String(exception)));
    if (WATCHED.has(answer.code)) this.log.warn(`${answer.code} ${request.method} ${request.url.split('?')[0]} from ${request.ip}, user ${request.user?.userId ?? 'none'}`);
    const { status, ...rest } = answer;
    if (isOpenedByAPerson(request)) {
      void reply.status(status).header('content-type', 'text/html; charset=utf-8').header('cache-control', 'no-store').send(plainPage(answer.message, request.id));
      return;
    }
    const body = { statusCode: status, ...rest, requestId: request.id } as ErrorBody;
    void reply.status(status).header('content-type', 'application/json; charset=utf-8').header('cache-control', 'no-store').send(body);
  }

  private answerFor(exception: unknown): Answer {
    if (exception instanceof AppError) {
      const { fields, current, conditions } = exception.details;
      return {
        status: HTTP_STATUS[exception.code],
        code: exception.code,
        message: exception.message,
        ...(fields ? { fields } : {}),
        ...(current === undefined ? {} : { current }),
        ...(conditions ? { conditions: [...conditions] } : {}),
      };
    }
    if (exception instanceof InputNotValid) {
      return { status: 400, code: 'INPUT_NOT_VALID', message: 'Some of what was sent cannot be taken; see the fields.', fields: exception.fields };
    }
    const status = exception instanceof HttpException ? exception.getStatus() : statusOf(exception);
    const code = BY_STATUS[status];
    if (code) return { status, code, message: WORDS[code] ?? 'This was refused.' };
    if (status >= 400 && status < 500) return { status, code: 'INPUT_NOT_VALID', message: WORDS.INPUT_NOT_VALID! };
    return { status: status === 503 ? 503 : 500, code: 'INTERNAL', message: 'Something failed here, not with you. Nothing was half done; try again, and tell the shop the request number if it stays.' };
  }
}

function statusOf(exception: unknown): number {
  const status = (exception as { statusCode?: unknown } | null)?.statusCode;
  return typeof status === 'number' ? status : 500;
}
