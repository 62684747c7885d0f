import { createHmac, generateKeyPairSync, sign } from 'node:crypto';

const b64 = (value: object | string) => Buffer.from(typeof value === 'string' ? value : JSON.stringify(value)).toString('base64url');
const HASH = { HS256: 'sha256', HS384: 'sha384', HS512: 'sha512' } as const;

/** A JSON Web Token made by hand (RFC 7519, RFC 7515), right or wrong as a test wants it. */
export function token(claims: object, { secret, alg = 'HS256', header = {} }: { secret: string; alg?: keyof typeof HASH; header?: object }): string {
  const signed = `${b64({ alg, typ: 'JWT', ...header })}.${b64(claims)}`;
  return `${signed}.${createHmac(HASH[alg], secret).update(signed).digest('base64url')}`;
}

export const unsigned = (claims: object, alg: string, signature = ''): string => `${b64({ alg, typ: 'JWT' })}.${b64(claims)}.${signature}`;

/** Signed by a key of the sender's own, which the token brings along. */
export function selfSigned(claims: object): string {
  const { privateKey, publicKey } = generateKeyPairSync('rsa', { modulusLength: 2048 });
  const signed = `${b64({ alg: 'RS256', typ: 'JWT', jwk: publicKey.export({ format: 'jwk' }), jku: 'http://evil.test/keys' })}.${b64(claims)}`;
  return `${signed}.${sign('sha256', Buffer.from(signed), privateKey).toString('base64url')}`;
}

/** What a session's token says, without a look at its signature. */
export const claimsOf = (jwt: string): Record<string, unknown> => JSON.parse(Buffer.from(jwt.split('.')[1]!, 'base64url').toString('utf8')) as Record<string, unknown>;
