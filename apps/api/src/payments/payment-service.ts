/** What we ask the payment service for: one page on which one amount can be paid. All of it comes from our database. */
export interface PaymentPageOrder {
  readonly attemptId: string;
  readonly invoiceId: string;
  readonly invoiceNumber: string;
  readonly amountMinor: number;
  readonly currency: string;
  readonly successUrl: string;
  readonly cancelUrl: string;
  readonly idempotencyKey: string;
}

/** A payment page as the service knows it at this moment. */
export interface SessionFacts {
  readonly sessionId: string;
  readonly url: string | null;
  readonly status: 'open' | 'complete' | 'expired';
  /** what we wrote on it when it was made */
  readonly attemptId: string | null;
  readonly invoiceId: string | null;
  /** null until somebody tried to pay */
  readonly payment: PaymentFacts | null;
}

export interface PaymentFacts {
  readonly intentId: string;
  /** 'under-way': the bank has not decided yet; 'failed': it will not come in through this page */
  readonly state: 'received' | 'under-way' | 'failed';
  /** in our minor units; null where the service names a part that our money does not have */
  readonly receivedMinor: number | null;
  readonly currency: string;
  readonly receivedAt: string | null;
  /** what a person recognises it by: card brand and last four digits */
  readonly reference: string;
}

/** What an event of the service is about. Only a hint: what happened is asked for afterwards. */
export interface PaymentEventHint {
  readonly id: string;
  readonly type: string;
  readonly objectId: string;
  readonly sessionId: string | null;
  readonly intentId: string | null;
}

/** The service did not answer, or answered that it is in trouble; what we asked for may have been done all the same. */
export class PaymentServiceDown extends Error {
  constructor(
    words: string,
    /** it answered with a failure of its own, and keeps giving that answer to the same key */
    readonly answeredWithFailure: boolean,
    cause: unknown,
  ) {
    super(words, { cause });
  }
}

/** The service does not take this amount. */
export class AmountNotTaken extends Error {}

/** The event does not carry the service's signature, or was signed at another time. */
export class EventNotSigned extends Error {}

/** The payment service the shop is paid through. */
export abstract class PaymentService {
  /** @throws {PaymentServiceDown | AmountNotTaken} */
  abstract openPage(order: PaymentPageOrder): Promise<SessionFacts>;
  /** null when the service does not know it @throws {PaymentServiceDown} */
  abstract session(sessionId: string): Promise<SessionFacts | null>;
  /** The page a payment belongs to; null when there is none. @throws {PaymentServiceDown} */
  abstract sessionOfIntent(intentId: string): Promise<SessionFacts | null>;
  /** The page that was made for an attempt, where its answer did not reach us. @throws {PaymentServiceDown} */
  abstract sessionOfAttempt(attemptId: string): Promise<SessionFacts | null>;
  /** Closes a page; answers how it stands afterwards, since it may have been paid in that moment. @throws {PaymentServiceDown} */
  abstract closePage(sessionId: string): Promise<SessionFacts | null>;
  /** @throws {EventNotSigned} */
  abstract readEvent(body: Buffer, signature: string | undefined, now: Date): PaymentEventHint;
}
