import { Injectable } from '@nestjs/common';
import Stripe from 'stripe';
import type { Config } from '../config/config.js';
import { AmountNotTaken, PaymentService, PaymentServiceDown, type PaymentEventHint, type PaymentPageOrder, type SessionFacts } from './payment-service.js';
import { toServiceAmount } from './service-amount.js';
import { readSignedEvent } from './stripe-events.js';
import { sessionFacts } from './stripe-session.js';

const EXPAND = ['payment_intent', 'payment_intent.latest_charge'];
/** How many of the newest pages are looked through for one whose answer was lost. */
const LOOK_BACK = 500;
const AMOUNT_CODES = new Set(['amount_too_small', 'amount_too_large', 'invalid_charge_amount']);

/** The payment service, through its official SDK. */
@Injectable()
export class StripePayments extends PaymentService {
  private readonly stripe: Stripe;

  constructor(private readonly config: Pick<Config['stripe'], 'secretKey' | 'webhookSecret' | 'apiUrl'>) {
    super();
    this.stripe = new Stripe(config.secretKey, { ...addressOf(config.apiUrl), maxNetworkRetries: 2, timeout: 8_000, telemetry: false });
  }

  async openPage(order: PaymentPageOrder): Promise<SessionFacts> {
    const amount = toServiceAmount(order.amountMinor, order.currency);
    if (amount === null) throw new AmountNotTaken(`${order.amountMinor} ${order.currency}`);
    const metadata = { invoiceId: order.invoiceId, attemptId: order.attemptId };
    const name = `Invoice ${order.invoiceNumber}`;
    return asked(async () =>
      sessionFacts(
        await this.stripe.checkout.sessions.create(
          {
            mode: 'payment',
            allowed_payment_method_types: ['card'],
            line_items: [{ quantity: 1, price_data: { currency: order.currency.toLowerCase(), unit_amount: amount, product_data: { name } } }],
            client_reference_id: order.attemptId,
            metadata,
            payment_intent_data: { description: name, metadata },
            success_url: order.successUrl,
            cancel_url: order.cancelUrl,
          },
          { idempotencyKey: order.idempotencyKey },
        ),
      ),
    );
  }

  session(sessionId: string): Promise<SessionFacts | null> {
    return knownOnly(async () => sessionFacts(await this.stripe.checkout.sessions.retrieve(sessionId, { expand: EXPAND })));
  }

  async sessionOfIntent(intentId: string): Promise<SessionFacts | null> {
    const found = await knownOnly(async () => (await this.stripe.checkout.sessions.list({ payment_intent: intentId, limit: 1 })).data[0] ?? null);
    return found ? this.session(found.id) : null;
  }

  async sessionOfAttempt(attemptId: string): Promise<SessionFacts | null> {
    const found = await asked(async () => {
      let seen = 0;
      for await (const session of this.stripe.checkout.sessions.list({ limit: 100 })) {
        if (session.metadata?.['attemptId'] === attemptId) return session;
        if ((seen += 1) >= LOOK_BACK) break;
      }
      return null;
    });
    return found ? this.session(found.id) : null;
  }

  async closePage(sessionId: string): Promise<SessionFacts | null> {
    // a page that is not open any more refuses to be closed: what counts is how it stands now
    await knownOnly(() => this.stripe.checkout.sessions.expire(sessionId));
    return this.session(sessionId);
  }

  readEvent(body: Buffer, signature: string | undefined, now: Date): PaymentEventHint {
    return readSignedEvent(body, signature, this.config.webhookSecret, now);
  }
}

function addressOf(apiUrl: string | undefined): { host?: string; port?: string; protocol?: 'http' | 'https' } {
  if (!apiUrl) return {};
  const url = new URL(apiUrl);
  const protocol = url.protocol === 'http:' ? 'http' : 'https';
  return { host: url.hostname, port: url.port || (protocol === 'http' ? '80' : '443'), protocol };
}

/** An answer of the service, or in our words why there is none. */
async function asked<T>(call: () => Promise<T>): Promise<T> {
  try {
    return await call();
  } catch (error) {
    if (error instanceof Stripe.errors.StripeInvalidRequestError && AMOUNT_CODES.has(error.code ?? '')) throw new AmountNotTaken(error.message, { cause: error });
    if (error instanceof Stripe.errors.StripeError) throw new PaymentServiceDown(`${error.type}: ${error.message}`, (error.statusCode ?? 0) >= 500, error);
    throw error;
  }
}

/** null where the service refuses the request itself: it does not know the object, or it cannot be done to it any more. */
async function knownOnly<T>(call: () => Promise<T>): Promise<T | null> {
  return asked(() =>
    call().catch((error: unknown) => {
      if (error instanceof Stripe.errors.StripeInvalidRequestError) return null;
      throw error;
    }),
  );
}
