/**
 * A setting that no file can be read with: a limit that is no number, an averaging time of nothing.
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
