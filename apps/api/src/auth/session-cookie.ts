import type { FastifyReply } from 'fastify';

/** Over TLS a name that a browser takes from this very host alone, and never from a neighbour of it. */
export const sessionCookie = (secure: boolean): string => (secure ? '__Host-loopbay_sid' : 'loopbay_sid');
export const isSecure = (publicUrl: string): boolean => publicUrl.startsWith('https:');
export const TOKEN_ISSUER = 'loopbay';
export const TOKEN_AUDIENCE = 'loopbay-web';
/** A working day; the session row decides, the cookie only carries. */
export const SESSION_MS = 12 * 3_600_000;

export function setSessionCookie(reply: FastifyReply, token: string, secure: boolean): void {
  reply.setCookie(sessionCookie(secure), token, { httpOnly: true, sameSite: 'lax', path: '/', secure, maxAge: SESSION_MS / 1000 });
}

export function clearSessionCookie(reply: FastifyReply, secure: boolean): void {
  reply.clearCookie(sessionCookie(secure), { httpOnly: true, sameSite: 'lax', path: '/', secure });
}
