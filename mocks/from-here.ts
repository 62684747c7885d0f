import type { FastifyRequest } from 'fastify';

/** A browser names the page that sends; another site's page must not steer the mocks. Programs on this machine name none. */
export function isFromHere(request: FastifyRequest): boolean {
  const { origin, host } = request.headers;
  return origin === undefined || (URL.canParse(origin) && new URL(origin).host === host);
}
