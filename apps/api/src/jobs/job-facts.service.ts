import { Injectable } from '@nestjs/common';
import type { LimitsSet } from '@shared/limits';
import type { QuoteState } from '@shared/quotes';
import type { RecordKind } from '@shared/records';
import type { JobState, Route, Step } from '@shared/route';
import type { QuerySource } from '../database/query-source.js';
import { notFound } from '../http/app-error.js';
import type { SignOffKind } from '../sign-offs/sign-off.entity.js';
import type { JobFacts, RecordFact, SignOffFact } from './job-facts.js';

/** What the gates need of the job itself, its customer and the shop; joins jobs j, customers c, limits_versions l. */
export const FACT_COLUMNS = `j.route, j.step, j.state, l."set" AS "set", c.terms, c.creditStop,
  EXISTS (SELECT 1 FROM papers p WHERE p.jobId = j.id AND p.kind = 'certificate' AND p.supersededById IS NULL) AS certificateInForce,
  COALESCE((SELECT json_extract(s.value, '$.onePersonMayRelease') FROM settings s WHERE s.id = 'profile'), 0) AS onePersonMayRelease`;

export interface JobFactRow {
  route: Route;
  step: Step;
  state: JobState;
  set: string;
  terms: 'prepayment' | 'account';
  creditStop: number;
  certificateInForce: number;
  onePersonMayRelease: number;
}
interface RecordRow {
  id: string;
  kind: RecordKind;
  ordinal: number;
  revision: number;
  verdict: string | null;
  readings: string;
  result: string;
  instruments: string;
  contentHash: string;
  byUserId: string;
}

/** Loads what the gates of a job decide on: five statements, whatever the job's size. */
@Injectable()
export class JobFactsService {
  async load(source: QuerySource, jobId: string): Promise<JobFacts> {
    const [job] = await source.query<JobFactRow[]>(
      `SELECT ${FACT_COLUMNS} FROM jobs j JOIN customers c ON c.id = j.customerId JOIN limits_versions l ON l.version = j.limitsVersion WHERE j.id = ?`,
      [jobId],
    );
    if (!job) throw notFound('job');
    return this.around(source, jobId, job);
  }

  /** The same for a job whose row is read already. */
  async around(source: QuerySource, jobId: string, job: JobFactRow): Promise<JobFacts> {
    return {
      route: job.route,
      step: job.step,
      state: job.state,
      limits: JSON.parse(job.set) as LimitsSet,
      records: await this.records(source, jobId),
      signOffs: await this.signOffs(source, jobId),
      quotes: await source.query<{ id: string; state: QuoteState; revision: number }[]>('SELECT id, state, revision FROM quotes WHERE jobId = ? ORDER BY number, revision', [jobId]),
      certificateInForce: job.certificateInForce === 1,
      invoices: await source.query<{ number: string; balanceMinor: number }[]>(
        'SELECT i.number, i.grossMinor - COALESCE((SELECT SUM(p.amountMinor) FROM payments p WHERE p.invoiceId = i.id), 0) AS balanceMinor FROM invoices i WHERE i.jobId = ?',
        [jobId],
      ),
      customer: { terms: job.terms, creditStop: job.creditStop === 1 },
      onePersonMayRelease: job.onePersonMayRelease === 1,
    };
  }

  private async records(source: QuerySource, jobId: string): Promise<RecordFact[]> {
    const rows = await source.query<RecordRow[]>(
      `SELECT r.id, r.kind, r.ordinal, r.revision, r.verdict, v.readings, v.result, v.instruments, v.contentHash, v.byUserId
       FROM job_records r JOIN record_revisions v ON v.recordId = r.id AND v.revision = r.revision WHERE r.jobId = ? ORDER BY r.kind, r.ordinal`,
      [jobId],
    );
    return rows.map((r) => ({
      id: r.id,
      kind: r.kind,
      ordinal: r.ordinal,
      revision: r.revision,
      verdict: r.verdict,
      readings: JSON.parse(r.readings) as Record<string, unknown>,
      result: JSON.parse(r.result) as Record<string, unknown>,
      contentHash: r.contentHash,
      byUserId: r.byUserId,
      overdueInstruments: (JSON.parse(r.instruments) as { tag: string; overdueOnTheDay: boolean }[]).filter((i) => i.overdueOnTheDay).map((i) => i.tag),
    }));
  }

  private async signOffs(source: QuerySource, jobId: string): Promise<SignOffFact[]> {
    const rows = await source.query<(Omit<SignOffFact, 'detail' | 'kind'> & { kind: SignOffKind; detail: string })[]>(
      'SELECT id, kind, recordId, refersTo, byUserId, byName, byRoles, at, reason, contentHash, detail, version FROM sign_offs WHERE jobId = ? ORDER BY id',
      [jobId],
    );
    return rows.map((r) => ({ ...r, detail: JSON.parse(r.detail) as Record<string, unknown> }));
  }
}
