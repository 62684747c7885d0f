import type { QuerySource } from '../database/query-source.js';
import { notFound } from '../http/app-error.js';

/** Whom a quote, an invoice or a receipt of a job goes to, and what the mail says about the job. */
export interface Addressee {
  readonly email: string;
  readonly contactName: string;
  readonly terms: 'prepayment' | 'account';
  readonly netDays: number;
  readonly jobNumber: string;
  readonly machine: string;
  readonly releasedAt: string | null;
  /** somebody of the customer can sign in: only then is a link into the portal worth sending */
  readonly hasPortal: boolean;
}

export async function addresseeOf(source: QuerySource, jobId: string): Promise<Addressee> {
  const [row] = await source.query<(Omit<Addressee, 'hasPortal'> & { hasPortal: number })[]>(
    `SELECT c.email, c.contactName, c.terms, c.netDays, j.number AS jobNumber, m.description AS machine, j.releasedAt,
            EXISTS (SELECT 1 FROM users u WHERE u.customerId = c.id AND u.disabledAt IS NULL) AS hasPortal
     FROM jobs j JOIN customers c ON c.id = j.customerId JOIN machines m ON m.id = j.machineId WHERE j.id = ?`,
    [jobId],
  );
  if (!row) throw notFound('job');
  return { ...row, hasPortal: row.hasPortal === 1 };
}
