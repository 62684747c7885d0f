/**
 * A value that no measurement of this kind can have: a negative turn count, a slot deeper than its core, a NaN.
 * `field` is the argument's name, so that a form can put the words beside the right box.
 */
export class OutOfRangeError extends Error {
  readonly code = 'out-of-range';
  constructor(
    readonly field: string,
    message: string,
  ) {
    super(message);
    this.name = 'OutOfRangeError';
  }
}
