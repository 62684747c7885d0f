import type { QueryRunner } from 'typeorm';

/** Tables whose rows never change once written. */
export const APPEND_ONLY = ['history', 'record_revisions', 'sign_offs', 'payments', 'limits_versions', 'invoice_lines', 'instrument_calibrations', 'instrument_certificates'] as const;

/** Columns of an issued invoice or paper that never change. */
const FROZEN: Record<string, readonly string[]> = {
  invoices: ['number', 'jobId', 'customerId', 'quoteId', 'currency', 'netMinor', 'taxMinor', 'grossMinor', 'issuedAt', 'issuedOn', 'dueOn'],
  papers: ['kind', 'number', 'jobId', 'customerId', 'subjectId', 'issuedAt', 'model', 'templateVersion', 'verificationCode'],
};

/**
 * Makes the database itself refuse a change of what has been issued or recorded.
 * A rebuilt table loses its triggers, so every migration that rebuilds one calls this again, as does one that brings a
 * new table: the first migrations run before it is there.
 */
export async function createTriggers(runner: QueryRunner): Promise<void> {
  const there = new Set(((await runner.query("SELECT name FROM sqlite_master WHERE type = 'table'")) as { name: string }[]).map((row) => row.name));
  for (const table of APPEND_ONLY.filter((name) => there.has(name))) {
    for (const act of ['UPDATE', 'DELETE'] as const) {
      await runner.query(
        `CREATE TRIGGER IF NOT EXISTS ${table}_refuses_${act.toLowerCase()} BEFORE ${act} ON ${table} BEGIN SELECT RAISE(ABORT, '${table} is append only'); END`,
      );
    }
  }
  for (const [table, columns] of Object.entries(FROZEN)) {
    const changed = columns.map((c) => `OLD."${c}" IS NOT NEW."${c}"`).join(' OR ');
    await runner.query(
      `CREATE TRIGGER IF NOT EXISTS ${table}_stays_as_issued BEFORE UPDATE ON ${table} WHEN ${changed} BEGIN SELECT RAISE(ABORT, '${table} stays as issued'); END`,
    );
    await runner.query(`CREATE TRIGGER IF NOT EXISTS ${table}_refuses_delete BEFORE DELETE ON ${table} BEGIN SELECT RAISE(ABORT, '${table} is never deleted'); END`);
  }
}
