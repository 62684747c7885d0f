import { Injectable } from '@nestjs/common';
import type { QuerySource } from '../database/query-source.js';
import { changedMeanwhile, notFound } from '../http/app-error.js';
import type { BurnoutLoad } from './burnout-load.entity.js';
import { LoadReadService } from './load-read.service.js';
import type { KeptFile } from './logger-files.service.js';

/** A load without its curves. */
export type LoadHead = Omit<BurnoutLoad, 'read'>;
type Row = Omit<LoadHead, 'partChannels' | 'reasons' | 'hints'> & { partChannels: string | null; reasons: string; hints: string };

const COLUMNS = 'id, number, ovenId, ovenName, day, remark, limitC, limitReason, limitSource, limitStanding, offsetK, partChannels, verdict, reasons, hottest, peakC, minutesAboveLimit, minutesAbove345C, fileName, storedName, sizeBytes, sha256, readAt, hints, byUserId, byName, createdAt, version';

/** A load as it stands before it is changed. */
@Injectable()
export class LoadHeadsService {
  constructor(private readonly loads: LoadReadService) {}

  /** At the version the person saw, or a word that somebody else changed it. */
  async at(source: QuerySource, id: string, version: number): Promise<LoadHead> {
    const head = await this.one(source, id);
    if (head.version !== version) throw changedMeanwhile('load', await this.loads.one(id, source));
    return head;
  }

  async one(source: QuerySource, id: string): Promise<LoadHead> {
    const [row] = await source.query<Row[]>(`SELECT ${COLUMNS} FROM burnout_loads WHERE id = ?`, [id]);
    if (!row) throw notFound('load');
    return {
      ...row,
      partChannels: row.partChannels === null ? null : (JSON.parse(row.partChannels) as string[]),
      reasons: JSON.parse(row.reasons) as LoadHead['reasons'],
      hints: JSON.parse(row.hints) as LoadHead['hints'],
    };
  }

  async nextNumber(source: QuerySource): Promise<number> {
    const [last] = await source.query<{ number: number | null }[]>('SELECT MAX(number) AS number FROM burnout_loads');
    return (last?.number ?? 0) + 1;
  }
}

export function fileOf({ fileName, storedName, sizeBytes, sha256, hints }: LoadHead): KeptFile | null {
  return fileName === null || storedName === null || sizeBytes === null || sha256 === null ? null : { fileName, storedName, sizeBytes, sha256, hints };
}
