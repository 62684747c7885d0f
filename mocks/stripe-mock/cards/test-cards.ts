/** What a test card does once its details have been accepted. */
export type CardOutcome =
  | { kind: 'succeeds'; availableAtOnce?: true; then?: AfterPayment }
  | { kind: 'declined'; code: string; declineCode?: string; message: string; advice?: 'try_again_later' | 'do_not_try_again' | 'confirm_card_data'; onlyWithCvc?: true; blocked?: true };

export type AfterPayment =
  | { kind: 'dispute'; reason: 'fraudulent' | 'product_not_received'; inquiry?: true; times?: 2 }
  | { kind: 'fraud-warning' }
  | { kind: 'refund-waits' }
  | { kind: 'refund-fails' };

export interface TestCard {
  number: string;
  brand: 'visa' | 'mastercard' | 'amex' | 'discover' | 'diners' | 'jcb' | 'unionpay';
  funding: 'credit' | 'debit' | 'prepaid';
  /** The tail of `pm_card_…` and `tok_…`. */
  alias: string;
  /** The cardholder's bank asks for a further step before it answers. */
  threeDs?: true;
  outcome: CardOutcome;
  /** One line for the list on the pay page; a card without it is honoured but not listed. */
  listed?: string;
}

const good: CardOutcome = { kind: 'succeeds' };
const then = (after: AfterPayment): CardOutcome => ({ kind: 'succeeds', then: after });
const declined = (declineCode: string, message = 'Your card was declined.', more: object = {}): CardOutcome => ({
  kind: 'declined',
  code: 'card_declined',
  declineCode,
  message,
  advice: 'try_again_later',
  ...more,
});
const refused = (code: string, message: string, more: object = {}): CardOutcome => ({ kind: 'declined', code, message, advice: 'confirm_card_data', ...more });
const visa = (number: string, alias: string, outcome: CardOutcome, more: Partial<TestCard> = {}): TestCard => ({
  number, alias, outcome, brand: 'visa', funding: 'credit', ...more,
});

/**
 * The numbers the service publishes for its test mode (docs.stripe.com/testing) and the outcome it gives each.
 * They pay nothing anywhere.
 */
export const TEST_CARDS: readonly TestCard[] = [
  visa('4242424242424242', 'visa', good, { listed: 'Pays' }),
  visa('4000056655665556', 'visa_debit', good, { funding: 'debit' }),
  { number: '5555555555554444', brand: 'mastercard', funding: 'credit', alias: 'mastercard', outcome: good, listed: 'Pays (another brand)' },
  { number: '2223003122003222', brand: 'mastercard', funding: 'credit', alias: 'mastercard_2series', outcome: good },
  { number: '5200828282828210', brand: 'mastercard', funding: 'debit', alias: 'mastercard_debit', outcome: good },
  { number: '5105105105105100', brand: 'mastercard', funding: 'prepaid', alias: 'mastercard_prepaid', outcome: good },
  { number: '378282246310005', brand: 'amex', funding: 'credit', alias: 'amex', outcome: good, listed: 'Pays (15 digits, 4-digit code)' },
  { number: '6011111111111117', brand: 'discover', funding: 'credit', alias: 'discover', outcome: good },
  { number: '3056930009020004', brand: 'diners', funding: 'credit', alias: 'diners', outcome: good },
  { number: '3566002020360505', brand: 'jcb', funding: 'credit', alias: 'jcb', outcome: good },
  { number: '6200000000000005', brand: 'unionpay', funding: 'credit', alias: 'unionpay', outcome: good },
  visa('4000002760003184', 'authenticationRequired', good, { threeDs: true, listed: 'Asks for the bank’s extra step, then pays' }),
  visa('4000002500003155', 'authenticationRequiredOnSetup', good, { threeDs: true }),
  visa('4000000000003220', 'threeDSecure2Required', good, { threeDs: true }),
  visa('4000008400001629', 'threeDSecureRequiredChargeDeclined', declined('generic_decline'), { threeDs: true, listed: 'Extra step, then declined' }),
  visa('4000008260003178', 'authenticationRequiredChargeDeclinedInsufficientFunds', declined('insufficient_funds', 'Your card has insufficient funds.'), { threeDs: true }),
  visa('4000000000000002', 'chargeDeclined', declined('generic_decline'), { listed: 'Declined' }),
  visa('4000000000009995', 'chargeDeclinedInsufficientFunds', declined('insufficient_funds', 'Your card has insufficient funds.'), { listed: 'Declined: not enough money' }),
  visa('4000000000009987', 'chargeDeclinedLostCard', declined('lost_card', undefined, { advice: 'do_not_try_again' })),
  visa('4000000000009979', 'chargeDeclinedStolenCard', declined('stolen_card', undefined, { advice: 'do_not_try_again' })),
  visa('4000000000006975', 'chargeDeclinedVelocityLimitExceeded', declined('card_velocity_exceeded', 'Your card was declined for making repeated attempts too frequently or exceeding its amount limit.')),
  visa('4000000000000069', 'chargeDeclinedExpiredCard', refused('expired_card', 'Your card has expired.'), { listed: 'Declined: expired' }),
  visa('4000000000000127', 'chargeDeclinedIncorrectCvc', refused('incorrect_cvc', "Your card's security code is incorrect.", { onlyWithCvc: true }), { listed: 'Declined: wrong security code' }),
  visa('4000000000000119', 'chargeDeclinedProcessingError', refused('processing_error', 'An error occurred while processing your card. Try again in a little bit.', { advice: 'try_again_later' })),
  visa('4000000000000341', 'chargeCustomerFail', declined('generic_decline')),
  visa('4100000000000019', 'radarBlock', declined('fraudulent', undefined, { blocked: true }), { listed: 'Blocked as fraud' }),
  visa('4000000000000259', 'createDispute', then({ kind: 'dispute', reason: 'fraudulent' }), { listed: 'Pays, then the holder disputes it' }),
  visa('4000000000002685', 'createDisputeProductNotReceived', then({ kind: 'dispute', reason: 'product_not_received' })),
  visa('4000000000001976', 'createDisputeInquiry', then({ kind: 'dispute', reason: 'fraudulent', inquiry: true }), { listed: 'Pays, then the bank asks questions' }),
  visa('4000000000005423', 'createIssuerFraudRecord', then({ kind: 'fraud-warning' })),
  visa('4000000404000079', 'createMultipleDisputes', then({ kind: 'dispute', reason: 'fraudulent', times: 2 })),
  visa('4000000000007726', 'pendingRefund', then({ kind: 'refund-waits' }), { listed: 'Pays; a refund takes a while' }),
  visa('4000000000005126', 'refundFail', then({ kind: 'refund-fails' }), { listed: 'Pays; a refund fails later' }),
  visa('4000000000000077', 'bypassPending', { kind: 'succeeds', availableAtOnce: true }),
];

const byNumber = new Map(TEST_CARDS.map((card) => [card.number, card]));

export const testCard = (number: string): TestCard | undefined => byNumber.get(number);

/** `pm_card_visa_chargeDeclined`, `pm_card_chargeDeclined` and `tok_chargeDeclined` all name one card. */
export function cardByAlias(id: string): TestCard | undefined {
  const tail = /^(?:pm_card_|tok_)(.+)$/.exec(id)?.[1];
  if (tail === undefined) return undefined;
  return TEST_CARDS.find((card) => card.alias === tail || (tail.startsWith('visa_') && card.alias === tail.slice('visa_'.length)));
}
