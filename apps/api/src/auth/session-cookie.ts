import type { FastifyReply } from 'fastify';

export const SESSION_COOKIE = 'loopbay_sid';
export const TOKEN_ISSUER = 'loopbay';
export const TOKEN_AUDIENCE = 'loopbay-web';
/** A working day; the session row decides, the cookie only carries. */
export const SESSION_MS = 12 * 3_600_000;

export function setSessionCookie(reply: FastifyReply, token: string, secure: boolean): void {
  reply.setCookie(SESSION_COOKIE, token, { httpOnly: true, sameSite: 'lax', path: '/', secure, maxAge: SESSION_MS / 1000 });
}

export function clearSessionCookie(reply: FastifyReply, secure: boolean): void {
  reply.clearCookie(SESSION_COOKIE, { httpOnly: true, sameSite: 'lax', path: '/', secure });
}
