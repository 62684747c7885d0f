import { Inject, Injectable } from '@nestjs/common';
import type { CertificateModel } from '@libs/documents';
import type { z } from 'zod';
import type { certificateCheckSchema } from '@shared/papers';
import { RateLimiterMemory } from 'rate-limiter-flexible';
import { shopDate } from '../clock/shop-date.js';
import { CONFIG, type Config } from '../config/config.js';
import { ReadDb } from '../database/read-db.js';
import { AppError } from '../http/app-error.js';

export type CertificateCheck = z.infer<typeof certificateCheckSchema>;
const UNKNOWN: CertificateCheck = { known: false, number: null, issuedOn: null, shop: null, machine: null, coreVerdict: null, supersededBy: null };

/** What anybody who holds a certificate may know by its code: that it is ours, and whether it is in force. */
@Injectable()
export class CertificateCheckService {
  private readonly asked = new RateLimiterMemory({ points: 30, duration: 60 });

  constructor(
    private readonly db: ReadDb,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  async check(code: string, address: string): Promise<CertificateCheck> {
    await this.asked.consume(address).catch(() => {
      throw new AppError('TOO_MANY_TRIES', 'Too many tries. Wait a minute, then try again.');
    });
    const row = await this.db.one<{ number: string; issuedAt: string; model: string; supersededBy: string | null }>(
      "SELECT p.number, p.issuedAt, p.model, n.number AS supersededBy FROM papers p LEFT JOIN papers n ON n.id = p.supersededById WHERE p.verificationCode = ? AND p.kind = 'certificate'",
      [code.toUpperCase()],
    );
    if (!row) return UNKNOWN;
    const model = JSON.parse(row.model) as CertificateModel;
    return {
      known: true,
      number: row.number,
      issuedOn: shopDate(new Date(row.issuedAt), this.config.timeZone),
      shop: model.shop.name,
      machine: [model.machine.description, model.machine.nameplate?.serial].filter(Boolean).join(', '),
      coreVerdict: model.coreAfter?.result.verdict ?? null,
      supersededBy: row.supersededBy,
    };
  }
}
