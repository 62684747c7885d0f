/** An amount, quantity or rate that no sum of money can be made of. */
export class MoneyError extends Error {
  readonly code = 'money';
  constructor(
    readonly field: string,
    message: string,
  ) {
    super(message);
    this.name = 'MoneyError';
  }
}
