import { testCard } from './test-cards.js';

export interface CardInput {
  number: string;
  expMonth: number;
  expYear: number;
  cvc?: string | undefined;
}
export interface CardFault {
  field: 'number' | 'exp_month' | 'exp_year' | 'cvc';
  code: string;
  declineCode?: string;
  message: string;
}

/** The check digit every card number carries (ISO/IEC 7812-1, annex B). */
export function checkDigitFits(number: string): boolean {
  const digits = [...number].reverse().map(Number);
  const sum = digits.reduce((total, digit, at) => total + (at % 2 === 0 ? digit : digit > 4 ? digit * 2 - 9 : digit * 2), 0);
  return /^\d{12,19}$/.test(number) && sum % 10 === 0;
}

/** The first thing wrong with typed card details, before any bank is asked; undefined when they may go on. */
export function faultOf(card: CardInput, now: { year: number; month: number }): CardFault | undefined {
  if (!checkDigitFits(card.number)) return { field: 'number', code: 'incorrect_number', message: 'Your card number is incorrect.' };
  if (card.expMonth < 1 || card.expMonth > 12) return { field: 'exp_month', code: 'invalid_expiry_month', message: "Your card's expiration month is invalid." };
  const year = card.expYear < 100 ? 2000 + card.expYear : card.expYear;
  if (year < now.year || year > now.year + 50) return { field: 'exp_year', code: 'invalid_expiry_year', message: "Your card's expiration year is invalid." };
  if (year === now.year && card.expMonth < now.month) return { field: 'exp_month', code: 'invalid_expiry_month', message: "Your card's expiration month is invalid." };
  const length = testCard(card.number)?.brand === 'amex' ? 4 : 3;
  if (card.cvc !== undefined && !new RegExp(`^\\d{${length}}$`).test(card.cvc)) return { field: 'cvc', code: 'invalid_cvc', message: "Your card's security code is invalid." };
  if (!testCard(card.number)) {
    return {
      field: 'number',
      code: 'card_declined',
      declineCode: 'test_mode_live_card',
      message: 'Your card was declined. Your request was in test mode, but used a non test card. Only test cards are taken here.',
    };
  }
  return undefined;
}
