/** Account numbers for a bank debit in test mode; money from an account arrives, or fails, some days after the order. */
export interface TestAccount {
  number: string;
  failure?: { code: string; message: string };
  listed: string;
}
export const TEST_ROUTING_NUMBER = '110000000';
export const TEST_ACCOUNTS: readonly TestAccount[] = [
  { number: '000123456789', listed: 'Arrives later' },
  { number: '000222222227', failure: { code: 'insufficient_funds', message: "The customer's account has insufficient funds to cover this payment." }, listed: 'Fails later: not enough money' },
  { number: '000111111113', failure: { code: 'account_closed', message: "The customer's bank account has been closed." }, listed: 'Fails later: account closed' },
];
export const testAccount = (number: string): TestAccount | undefined => TEST_ACCOUNTS.find((account) => account.number === number);
