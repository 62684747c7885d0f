import { Injectable } from '@nestjs/common';
import type { EntityManager } from 'typeorm';
import { NumberSeries } from './number-series.entity.js';

const PREFIX = { job: 'J', quote: 'Q', invoice: 'R', certificate: 'C', receipt: 'P', 'delivery-note': 'L' } as const;
export type Series = keyof typeof PREFIX;

/** Gap-free numbers by year: given inside the unit that uses them, so a unit that fails gives its number back. */
@Injectable()
export class NumberSeriesService {
  async next(manager: EntityManager, series: Series, year: number): Promise<string> {
    const id = `${series}-${year}`;
    const row = await manager.findOneBy(NumberSeries, { id });
    const last = (row?.last ?? 0) + 1;
    if (row) await manager.update(NumberSeries, { id }, { last });
    else await manager.insert(NumberSeries, { id, last });
    return `${PREFIX[series]}${year}-${String(last).padStart(4, '0')}`;
  }
}
