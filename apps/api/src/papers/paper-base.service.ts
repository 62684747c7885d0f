import { Inject, Injectable } from '@nestjs/common';
import type { JobPaperBase, PaperSize, PaperUnits, ShopOnPaper } from '@libs/documents';
import type { Nameplate } from '@shared/machines';
import { Clock } from '../clock/clock.js';
import { CONFIG, type Config } from '../config/config.js';
import type { QuerySource } from '../database/query-source.js';
import { notFound } from '../http/app-error.js';
import type { ShopProfile } from '../shop/shop-profile.js';
import { ShopService } from '../shop/shop.service.js';

interface Row {
  number: string;
  customerReference: string;
  name: string;
  contactName: string;
  addressLine1: string;
  addressLine2: string;
  postcode: string;
  city: string;
  country: string;
  taxNumber: string;
  description: string;
  nameplate: string;
}

export const shopOnPaper = (p: ShopProfile): ShopOnPaper => ({ name: p.name, addressLines: [...p.addressLines], phone: p.phone, email: p.email, website: p.website, taxNumber: p.taxNumber, registration: p.registration });

/** What the head of every paper about a job says, frozen as it is now. */
@Injectable()
export class PaperBaseService {
  constructor(
    private readonly shop: ShopService,
    private readonly clock: Clock,
    @Inject(CONFIG) private readonly config: Config,
  ) {}

  async ofJob(source: QuerySource, jobId: string, paper: { number: string; paperSize?: PaperSize; units?: PaperUnits }): Promise<JobPaperBase> {
    const [row] = await source.query<Row[]>(
      `SELECT j.number, j.customerReference, c.name, c.contactName, c.addressLine1, c.addressLine2, c.postcode, c.city, c.country, c.taxNumber, m.description, m.nameplate
       FROM jobs j JOIN customers c ON c.id = j.customerId JOIN machines m ON m.id = j.machineId WHERE j.id = ?`,
      [jobId],
    );
    if (!row) throw notFound('job');
    const profile = await this.shop.profile();
    return {
      edition: 1,
      number: paper.number,
      issuedAt: this.clock.iso(),
      timeZone: this.config.timeZone,
      paperSize: paper.paperSize ?? profile.paperSize,
      units: paper.units ?? 'si',
      shop: shopOnPaper(profile),
      job: { number: row.number, customerReference: row.customerReference },
      customer: {
        name: row.name,
        contactName: row.contactName,
        addressLines: [row.addressLine1, row.addressLine2, `${row.postcode} ${row.city}`.trim(), row.country].filter((line) => line !== ''),
        taxNumber: row.taxNumber,
      },
      machine: { description: row.description, nameplate: JSON.parse(row.nameplate) as Nameplate },
    };
  }
}
