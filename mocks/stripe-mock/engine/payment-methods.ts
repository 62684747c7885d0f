import { faultOf, type CardInput } from '../cards/card-details.js';
import { cardByAlias, testCard, type TestCard } from '../cards/test-cards.js';
import { ApiError } from '../http/api-error.js';
import { newBankMethod, newCardMethod, NO_BILLING, type BillingDetails } from '../objects/new-payment-method.js';
import type { PaymentMethod } from '../objects/stored.js';
import type { World } from '../world.js';

/** A payment method from typed details; details that no bank need be asked about are refused with a card error. */
export function methodFromCard(world: World, input: CardInput, billing: BillingDetails): PaymentMethod {
  const now = new Date(world.clock.nowMs());
  const fault = faultOf(input, { year: now.getUTCFullYear(), month: now.getUTCMonth() + 1 });
  const card = testCard(input.number);
  if (fault || !card) {
    throw new ApiError(402, {
      type: 'card_error',
      code: fault?.code ?? 'incorrect_number',
      message: fault?.message ?? 'Your card number is incorrect.',
      ...(fault?.declineCode ? { decline_code: fault.declineCode } : {}),
      ...(fault ? { param: fault.field } : {}),
    });
  }
  return keep(world, card, { month: input.expMonth, year: input.expYear < 100 ? 2000 + input.expYear : input.expYear }, billing, input.cvc !== undefined);
}

/** `pm_card_visa`, `tok_chargeDeclined` ...: a fresh payment method of that test card, as the service makes one. */
export function methodFromAlias(world: World, id: string): PaymentMethod | undefined {
  const card = cardByAlias(id);
  const year = new Date(world.clock.nowMs()).getUTCFullYear() + 1;
  return card && keep(world, card, { month: 12, year }, NO_BILLING, true);
}

export function methodFromAccount(world: World, accountNumber: string, routingNumber: string, billing: BillingDetails): PaymentMethod {
  const method = world.state.paymentMethods.add(newBankMethod(accountNumber, routingNumber, billing, world.clock.seconds()));
  world.state.behind[method.id] = { number: accountNumber, cvcGiven: false };
  return method;
}

function keep(world: World, card: TestCard, expiry: { month: number; year: number }, billing: BillingDetails, cvcGiven: boolean): PaymentMethod {
  const method = world.state.paymentMethods.add(newCardMethod(card, expiry, billing, cvcGiven, world.clock.seconds()));
  world.state.behind[method.id] = { number: card.number, cvcGiven };
  return method;
}
