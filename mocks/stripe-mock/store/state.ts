import type {
  BalanceTransaction, Charge, Customer, Dispute, FraudWarning, LineItem, PaymentIntent, PaymentMethod, Refund, Session, StoredEvent, WebhookEndpoint,
} from '../objects/stored.js';
import type { SavedAnswer } from '../http/idempotency.js';
import type { IntentOrder } from '../objects/new-payment-intent.js';
import type { Delivery } from '../webhooks/delivery.js';
import type { AgendaItem } from './agenda.js';
import { Collection } from './collection.js';

/** What stands behind a payment method: the test card or account that was typed. Only test numbers ever get here. */
export interface Behind {
  number: string;
  cvcGiven: boolean;
}

export interface State {
  accountId: string;
  sessions: Collection<Session>;
  /** Line items by session id; the API shows them under the session, one page at a time. */
  lineItems: Record<string, LineItem[]>;
  /** `payment_intent_data` by session id, kept until somebody pays and the intent is made. */
  intentOrders: Record<string, Partial<IntentOrder>>;
  paymentIntents: Collection<PaymentIntent>;
  paymentMethods: Collection<PaymentMethod>;
  behind: Record<string, Behind>;
  charges: Collection<Charge>;
  refunds: Collection<Refund>;
  disputes: Collection<Dispute>;
  fraudWarnings: Collection<FraudWarning>;
  customers: Collection<Customer>;
  deletedCustomers: string[];
  balanceTransactions: Collection<BalanceTransaction>;
  events: Collection<StoredEvent>;
  endpoints: Collection<WebhookEndpoint>;
  /** Signing secrets by endpoint id; the API shows one only when the endpoint is made. */
  secrets: Record<string, string>;
  deliveries: Collection<Delivery>;
  answers: Record<string, SavedAnswer>;
}

type Flat<T> = { [K in keyof T]: T[K] extends Collection<infer Item> ? Item[] : T[K] };
export type StateFile = Flat<State> & { version: 1; offsetMs: number; agenda: AgendaItem[] };

export function newState(accountId: string, from?: StateFile): State {
  return {
    accountId: from?.accountId ?? accountId,
    sessions: new Collection(from?.sessions),
    lineItems: from?.lineItems ?? {},
    intentOrders: from?.intentOrders ?? {},
    paymentIntents: new Collection(from?.paymentIntents),
    paymentMethods: new Collection(from?.paymentMethods),
    behind: from?.behind ?? {},
    charges: new Collection(from?.charges),
    refunds: new Collection(from?.refunds),
    disputes: new Collection(from?.disputes),
    fraudWarnings: new Collection(from?.fraudWarnings),
    customers: new Collection(from?.customers),
    deletedCustomers: from?.deletedCustomers ?? [],
    balanceTransactions: new Collection(from?.balanceTransactions),
    events: new Collection(from?.events),
    endpoints: new Collection(from?.endpoints),
    secrets: from?.secrets ?? {},
    deliveries: new Collection(from?.deliveries),
    answers: from?.answers ?? {},
  };
}
