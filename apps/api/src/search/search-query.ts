import type { SearchHit } from '@shared/jobs';
import { contains, startsWith } from './like-pattern.js';

export interface SearchRow extends Omit<SearchHit, 'path'> {
  rank: number;
}
export const MOST_HITS = 12;

/** The address a tag's code opens; a scanner types it into the search box like a keyboard. */
export function jobOfAddress(typed: string): string | null {
  return /\/jobs\/([0-9a-z-]{8,40})(?:[/?#].*)?$/.exec(typed)?.[1] ?? null;
}

const like = (column: string, how: 'start' | 'word' | 'inside') => `${column} LIKE :${how} ESCAPE '\\'`;
const either = (...conditions: string[]) => conditions.join(' OR ');

/** The best of one table, read once: what matches anywhere, ranked by where it matches. */
const best = (kind: SearchHit['kind'], table: string, where: string, ranks: readonly (readonly [string, number])[], otherwise: number) =>
  `SELECT * FROM (SELECT '${kind}' AS kind, id, CASE ${ranks.map(([when, rank]) => `WHEN ${when} THEN ${rank}`).join(' ')} ELSE ${otherwise} END AS rank FROM ${table} WHERE ${where} ORDER BY rank, id DESC LIMIT ${MOST_HITS})`;

const is = (column: string) => `${column} = :typed COLLATE NOCASE`;
const JOBS = best('job', 'jobs', either(like('number', 'inside'), like('customerReference', 'start')), [[is('number'), 0], [like('number', 'start'), 2]], 6);
const MACHINES = best(
  'machine',
  'machines',
  either(like('serial', 'inside'), like('description', 'inside')),
  [[is('serial'), 1], [like('serial', 'start'), 3], [either(like('description', 'start'), like('description', 'word')), 5]],
  7,
);
const CUSTOMERS = best('customer', 'customers', like('name', 'inside'), [[like('name', 'start'), 4], [like('name', 'word'), 5]], 7);
const INVOICES = best('invoice', 'invoices', like('number', 'inside'), [[is('number'), 0], [like('number', 'start'), 2]], 6);

/** What a hit shows; read for the dozen that are shown, not for all that match. */
const SHOWN = `SELECT f.kind, f.id, f.rank,
    CASE f.kind WHEN 'job' THEN j.number WHEN 'machine' THEN m.description WHEN 'customer' THEN c.name ELSE i.number END AS title,
    CASE f.kind WHEN 'job' THEN jc.name || ' · ' || jm.description WHEN 'machine' THEN mc.name || CASE WHEN m.serial = '' THEN '' ELSE ' · ' || m.serial END WHEN 'customer' THEN c.city ELSE ic.name END AS detail
  FROM found f
    LEFT JOIN jobs j ON f.kind = 'job' AND j.id = f.id LEFT JOIN customers jc ON jc.id = j.customerId LEFT JOIN machines jm ON jm.id = j.machineId
    LEFT JOIN machines m ON f.kind = 'machine' AND m.id = f.id LEFT JOIN customers mc ON mc.id = m.customerId
    LEFT JOIN customers c ON f.kind = 'customer' AND c.id = f.id
    LEFT JOIN invoices i ON f.kind = 'invoice' AND i.id = f.id LEFT JOIN customers ic ON ic.id = i.customerId
  ORDER BY f.rank, f.id DESC`;

/**
 * Looks where a person at the counter would: the number on the tag first, then the serial, then names from their
 * beginning, then names somewhere inside. Newer ones first where nothing else decides.
 */
export function searchStatement(typed: string, mayReadInvoices: boolean): { sql: string; parameters: readonly unknown[] } {
  const tables = [JOBS, MACHINES, CUSTOMERS, ...(mayReadInvoices ? [INVOICES] : [])];
  return {
    sql: `WITH found AS MATERIALIZED (SELECT kind, id, rank FROM (${tables.join(' UNION ALL ')}) ORDER BY rank, id DESC LIMIT ${MOST_HITS}) ${SHOWN}`,
    parameters: [{ typed, start: startsWith(typed), word: `% ${startsWith(typed)}`, inside: contains(typed) }],
  };
}
