import { createHmac } from 'node:crypto';

/** The service's signature header: the time and an HMAC-SHA256 of `time.body` (docs.stripe.com/webhooks, "verify manually"). */
export function signatureHeader(body: string, secret: string, unixSeconds: number): string {
  const mac = createHmac('sha256', secret).update(`${unixSeconds}.${body}`, 'utf8').digest('hex');
  return `t=${unixSeconds},v1=${mac}`;
}
