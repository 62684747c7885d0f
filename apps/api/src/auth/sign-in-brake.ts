import { Injectable } from '@nestjs/common';
import { RateLimiterMemory } from 'rate-limiter-flexible';
import { AppError } from '../http/app-error.js';

/** Ten wrong tries for one name from one address, then a pause of a minute; nobody else is held up. */
@Injectable()
export class SignInBrake {
  private readonly tries = new RateLimiterMemory({ points: 10, duration: 60 });

  async check(name: string, address: string): Promise<void> {
    const so = await this.tries.get(`${name}|${address}`);
    if (so && so.consumedPoints >= 10) throw new AppError('TOO_MANY_TRIES', 'Too many tries. Wait a minute, then try again.');
  }

  async wrong(name: string, address: string): Promise<void> {
    await this.tries.penalty(`${name}|${address}`);
  }

  async right(name: string, address: string): Promise<void> {
    await this.tries.delete(`${name}|${address}`);
  }
}
