/**
 * A figure that no chart can be drawn from: a NaN among the points, a base period that ends before it starts.
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
