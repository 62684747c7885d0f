import type { QuerySource } from '../database/query-source.js';
import type { RecordKind } from '@shared/records';
import type { SignOffKind } from '../sign-offs/sign-off.entity.js';

/** What a certificate is made from, as it stands in the database: flat rows, parsed once. */
export interface CertifiedRecord {
  readonly id: string;
  readonly kind: RecordKind;
  readonly ordinal: number;
  readonly verdict: string | null;
  readonly readings: Record<string, unknown>;
  readonly result: Record<string, unknown>;
  readonly instruments: readonly { readonly id: string; readonly tag: string; readonly description: string; readonly serial: string; readonly calibratedOn: string; readonly dueOn: string }[];
  readonly byName: string;
  readonly at: string;
}
export interface CertifiedSignOff {
  readonly id: string;
  readonly kind: SignOffKind;
  readonly recordId: string | null;
  readonly refersTo: string | null;
  readonly byName: string;
  readonly byRoles: string;
  readonly at: string;
  readonly reason: string;
  readonly detail: Record<string, unknown>;
  readonly contentHash: string;
}

export async function certifiedRecords(source: QuerySource, jobId: string): Promise<CertifiedRecord[]> {
  const rows = await source.query<{ id: string; kind: RecordKind; ordinal: number; verdict: string | null; readings: string; result: string; instruments: string; byName: string; at: string }[]>(
    `SELECT r.id, r.kind, r.ordinal, r.verdict, v.readings, v.result, v.instruments, v.byName, v.at
     FROM job_records r JOIN record_revisions v ON v.recordId = r.id AND v.revision = r.revision WHERE r.jobId = ? ORDER BY r.id`,
    [jobId],
  );
  return rows.map((r) => ({
    ...r,
    readings: JSON.parse(r.readings) as Record<string, unknown>,
    result: JSON.parse(r.result) as Record<string, unknown>,
    instruments: JSON.parse(r.instruments) as CertifiedRecord['instruments'],
  }));
}

export async function certifiedSignOffs(source: QuerySource, jobId: string): Promise<CertifiedSignOff[]> {
  const rows = await source.query<(Omit<CertifiedSignOff, 'detail'> & { detail: string })[]>(
    'SELECT id, kind, recordId, refersTo, byName, byRoles, at, reason, detail, contentHash FROM sign_offs WHERE jobId = ? ORDER BY id',
    [jobId],
  );
  return rows.map((r) => ({ ...r, detail: JSON.parse(r.detail) as Record<string, unknown> }));
}
