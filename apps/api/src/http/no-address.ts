import type { ErrorBody } from '@shared/errors';
import type { FastifyError, FastifyReply, FastifyRequest } from 'fastify';

/** What stands in an address cannot be read, or is too long: told before any hook has run, so the headers are given here. */
export function answerNoAddress(error: FastifyError, request: FastifyRequest, reply: FastifyReply): void {
  const statusCode = error.statusCode ?? 400;
  const body: ErrorBody = { statusCode, code: 'INPUT_NOT_VALID', message: 'This address cannot be read.', requestId: request.id };
  void reply
    .status(statusCode)
    .headers({
      'x-request-id': request.id,
      'content-type': 'application/json; charset=utf-8',
      'cache-control': 'no-store',
      'x-content-type-options': 'nosniff',
      'content-security-policy': "default-src 'none'; frame-ancestors 'none'",
      'referrer-policy': 'same-origin',
    })
    .send(body);
}
