import Stripe from 'stripe';
import { z } from 'zod';
import { EventNotSigned, type PaymentEventHint } from './payment-service.js';

const TOLERANCE_S = 300;
/** What we read of an event; everything else in it is left alone. */
const eventSchema = z.object({
  id: z.string().regex(/^evt_\w{1,250}$/),
  object: z.literal('event'),
  type: z.string().min(1).max(200),
  data: z.object({ object: z.object({ id: z.string().max(255).optional(), object: z.string().max(100), payment_intent: z.unknown().optional() }) }),
});

/**
 * Reads an event only when it carries the service's signature over these very bytes, made within five minutes of now.
 * The SDK looks at the age alone, so a signature from the future is refused here.
 */
export function readSignedEvent(body: Buffer, signature: string | undefined, secret: string, now: Date): PaymentEventHint {
  if (!signature) throw new EventNotSigned('The event carries no signature.');
  for (const [, seconds] of signature.matchAll(/(?:^|,)\s*t=(\d+)/g)) {
    if (Number(seconds) > now.getTime() / 1000 + TOLERANCE_S) throw new EventNotSigned('The event was signed in the future.');
  }
  const event = eventSchema.safeParse(verified(body, signature, secret, now));
  if (!event.success) throw new EventNotSigned('What was signed is not an event.');
  const { id, type, data } = event.data;
  const about = data.object;
  return {
    id,
    type,
    objectId: about.id ?? '',
    sessionId: about.object === 'checkout.session' ? (about.id ?? null) : null,
    intentId: about.object === 'payment_intent' ? (about.id ?? null) : intentIn(about.payment_intent),
  };
}

function verified(body: Buffer, signature: string, secret: string, now: Date): unknown {
  try {
    return Stripe.webhooks.constructEvent(body, signature, secret, TOLERANCE_S, undefined, now.getTime());
  } catch (error) {
    throw new EventNotSigned('The signature does not fit the event.', { cause: error });
  }
}

function intentIn(field: unknown): string | null {
  if (typeof field === 'string') return field;
  const id = (field as { id?: unknown } | null | undefined)?.id;
  return typeof id === 'string' ? id : null;
}
