import type { ApproveForCustomer } from '@shared/quotes';

export interface ApprovalProblem {
  readonly code: 'INPUT_NOT_VALID' | 'AMOUNT_NOT_RIGHT';
  readonly path: 'approvedAt' | 'purchaseOrder' | 'notToExceedMinor';
  readonly words: string;
}

/** Clocks of a counter's tablet and of the server differ a little. */
const CLOCK_SLACK_MS = 5 * 60_000;

/**
 * What is missing in an approval that the shop takes down for the customer. By phone it needs a limit the customer
 * named, by purchase order its number; a limit below the quote's total approves less than the quote asks for.
 */
export function approvalProblem(input: ApproveForCustomer, quote: { readonly grossMinor: number; readonly createdAt: string }, now: Date, money: (minor: number) => string): ApprovalProblem | null {
  const at = Date.parse(input.approvedAt);
  if (at > now.getTime() + CLOCK_SLACK_MS) return { code: 'INPUT_NOT_VALID', path: 'approvedAt', words: 'The time of the approval has not come yet.' };
  if (at < startOfMinute(quote.createdAt)) return { code: 'INPUT_NOT_VALID', path: 'approvedAt', words: 'The approval cannot be older than the quote itself.' };
  if (input.how === 'purchase-order' && input.purchaseOrder === '') return { code: 'INPUT_NOT_VALID', path: 'purchaseOrder', words: 'Give the number of the purchase order.' };
  if (input.how === 'phone' && input.notToExceedMinor === null) return { code: 'INPUT_NOT_VALID', path: 'notToExceedMinor', words: 'Ask how much it may cost at most, and write it down.' };
  if (input.notToExceedMinor !== null && input.notToExceedMinor < quote.grossMinor) {
    return {
      code: 'AMOUNT_NOT_RIGHT',
      path: 'notToExceedMinor',
      words: `The customer allows ${money(input.notToExceedMinor)}, the quote asks for ${money(quote.grossMinor)} with tax: revise the quote, or ask the customer again.`,
    };
  }
  return null;
}

/** Forms give whole minutes. */
const startOfMinute = (instant: string): number => Math.floor(Date.parse(instant) / 60_000) * 60_000;
