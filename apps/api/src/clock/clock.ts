/** The one place that knows what time it is. */
export abstract class Clock {
  abstract now(): Date;
  iso(): string {
    return this.now().toISOString();
  }
}

export class SystemClock extends Clock {
  now(): Date {
    return new Date();
  }
}

/** For the sample shop and for tests: time moves when told. */
export class SteppingClock extends Clock {
  constructor(private current: Date) {
    super();
  }
  now(): Date {
    return new Date(this.current.getTime());
  }
  set(to: Date): void {
    this.current = to;
  }
  forward(ms: number): void {
    this.current = new Date(this.current.getTime() + ms);
  }
}
