import type Stripe from 'stripe';

/** The SDK leaves its enums open (`'paid' | string & {}`); the fake closes them, so that no invented word can slip in. */
type OtherString = string & Record<never, never>;
type Same<A, B> = (<G>() => G extends A ? 1 : 2) extends <G>() => G extends B ? 1 : 2 ? true : false;

type Value<T> = T extends string
  ? Same<T, OtherString> extends true
    ? never
    : T
  : T extends Stripe.Decimal
    ? string
    : T extends number | boolean | null | undefined
      ? T
      : T extends readonly (infer U)[]
      ? Value<U>[]
      : T extends object
        ? Stored<T>
        : T;

/** A field that may hold an id or the whole object is kept as the id; the object is put in when a caller expands it. */
type Field<T> = string extends T ? Value<Exclude<T, { object: string }>> : Value<T>;

/** An SDK object as the fake keeps it: same fields, closed enums, references as ids. Decimals are text, as on the wire. */
export type Stored<T> = { [K in keyof T]: Field<T[K]> };

/** Line items are kept beside the session and shown under it on request. */
export type Session = Omit<Stored<Stripe.Checkout.Session>, 'line_items'>;
export type LineItem = Stored<Stripe.LineItem>;
export type PaymentIntent = Stored<Stripe.PaymentIntent>;
export type PaymentError = Stored<Stripe.PaymentIntent.LastPaymentError>;
export type PaymentMethod = Stored<Stripe.PaymentMethod>;
export type Charge = Stored<Stripe.Charge>;
export type Refund = Stored<Stripe.Refund>;
export type Dispute = Stored<Stripe.Dispute>;
export type Customer = Stored<Stripe.Customer>;
export type BalanceTransaction = Stored<Stripe.BalanceTransaction>;
export type WebhookEndpoint = Stored<Stripe.WebhookEndpoint>;
export type FraudWarning = Stored<Stripe.Radar.EarlyFraudWarning>;

export type EventType = Stripe.Event['type'];
export type EventObject<T extends EventType> = Stored<Extract<Stripe.Event, { type: T }>['data']['object']>;

/** The envelope is the SDK's; `data.object` is a snapshot taken when the event happened, typed where it is emitted. */
export type StoredEvent = Omit<Stripe.EventBase, 'data' | 'type' | 'request'> & {
  type: EventType;
  data: { object: unknown; previous_attributes?: Record<string, unknown> };
  request: { id: string | null; idempotency_key: string | null };
};
