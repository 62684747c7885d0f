import { Injectable } from '@nestjs/common';
import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';
import { AppError } from '../http/app-error.js';

/** Ten wrong tries for one name from one address, then a pause of a minute; nobody else is held up. */
@Injectable()
export class SignInBrake {
  private readonly tries = new RateLimiterMemory({ points: 10, duration: 60 });

  /** Counts the try before the password is looked at: a hundred sent at once are a hundred tries. */
  async step(name: string, address: string): Promise<void> {
    await this.tries.consume(`${name}|${address}`).catch((reason: unknown) => {
      if (reason instanceof RateLimiterRes) throw new AppError('TOO_MANY_TRIES', 'Too many tries. Wait a minute, then try again.');
      throw reason;
    });
  }

  /** A right one wipes the slate. */
  async right(name: string, address: string): Promise<void> {
    await this.tries.delete(`${name}|${address}`);
  }
}
