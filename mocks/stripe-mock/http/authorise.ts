import { timingSafeEqual } from 'node:crypto';
import { ApiError } from './api-error.js';

const refused = (message: string) => new ApiError(401, { type: 'invalid_request_error', message }, false);

/** The key comes as a bearer token, or as the user name of basic authentication. Only the one test key opens the door. */
export function authorise(header: string | undefined, secretKey: string): void {
  const key = keyIn(header);
  if (!key) throw refused("You did not provide an API key. You need to provide your API key in the Authorization header, using Bearer auth (e.g. 'Authorization: Bearer YOUR_SECRET_KEY').");
  if (/^[a-z]{2}_live_/.test(key)) throw refused('This is a local demo of the payment service: it takes test keys only and refuses live ones.');
  const given = Buffer.from(key);
  const wanted = Buffer.from(secretKey);
  if (given.length !== wanted.length || !timingSafeEqual(given, wanted)) throw refused(`Invalid API Key provided: ${key.slice(0, 8)}${'*'.repeat(Math.max(0, Math.min(20, key.length - 12)))}${key.length > 12 ? key.slice(-4) : ''}`);
}

function keyIn(header: string | undefined): string | undefined {
  const [scheme, value] = (header ?? '').split(' ', 2);
  if (!value) return undefined;
  if (scheme?.toLowerCase() === 'bearer') return value;
  if (scheme?.toLowerCase() === 'basic') return Buffer.from(value, 'base64').toString('utf8').split(':', 1)[0] || undefined;
  return undefined;
}
