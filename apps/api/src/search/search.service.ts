import { Injectable } from '@nestjs/common';
import type { SearchHit, SearchResult } from '@shared/jobs';
import type { Actor } from '../auth/actor.js';
import { ReadDb } from '../database/read-db.js';
import { jobOfAddress, searchStatement, type SearchRow } from './search-query.js';

const PLACE: Record<SearchHit['kind'], string> = { job: '/jobs', customer: '/counter/customers', machine: '/counter/machines', invoice: '/accounts/invoices' };

/** One box for everything: job number, scanned tag, serial, customer, machine, and invoice number for who may read those. */
@Injectable()
export class SearchService {
  constructor(private readonly db: ReadDb) {}

  async find(actor: Actor, typed: string): Promise<SearchResult> {
    const scanned = jobOfAddress(typed);
    if (scanned) return { hits: await this.scanned(scanned) };
    const { sql, parameters } = searchStatement(typed, actor.permissions.includes('invoices.read'));
    return { hits: (await this.db.all<SearchRow>(sql, parameters)).map(toHit) };
  }

  private async scanned(jobId: string): Promise<SearchHit[]> {
    const rows = await this.db.all<SearchRow>(
      `SELECT 'job' AS kind, j.id, j.number AS title, c.name || ' · ' || m.description AS detail, 0 AS rank
       FROM jobs j JOIN customers c ON c.id = j.customerId JOIN machines m ON m.id = j.machineId WHERE j.id = ?`,
      [jobId],
    );
    return rows.map(toHit);
  }
}

const toHit = ({ kind, id, title, detail }: SearchRow): SearchHit => ({ kind, id, title, detail, path: `${PLACE[kind]}/${id}` });
