import { Injectable } from '@nestjs/common';
import { RateLimiterMemory, RateLimiterRes } from 'rate-limiter-flexible';
import type { Actor } from '../auth/actor.js';
import { AppError } from '../http/app-error.js';

/** Ten exports a minute for one person: more is no person reading them. */
@Injectable()
export class ExportBrake {
  private readonly exports = new RateLimiterMemory({ points: 10, duration: 60 });

  async step(actor: Actor): Promise<void> {
    await this.exports.consume(actor.userId ?? actor.name).catch((reason: unknown) => {
      if (reason instanceof RateLimiterRes) throw new AppError('TOO_MANY_TRIES', 'That were many exports in a short time. Wait a minute, then try again.');
      throw reason;
    });
  }
}
