/** The service's clock: real time plus what the control API has added, so that a test can let a day pass at once. */
export class Clock {
  constructor(public offsetMs = 0) {}

  nowMs(): number {
    return Date.now() + this.offsetMs;
  }

  /** Whole seconds since 1970, the form every `created` has. */
  seconds(): number {
    return Math.floor(this.nowMs() / 1000);
  }
}
