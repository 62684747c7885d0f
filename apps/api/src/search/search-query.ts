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

const JOB = `SELECT 'job' AS kind, j.id AS id, j.number AS title, c.name || ' · ' || m.description AS detail`;
const JOB_FROM = 'FROM jobs j JOIN customers c ON c.id = j.customerId JOIN machines m ON m.id = j.machineId';
const MACHINE = `SELECT 'machine' AS kind, m.id AS id, m.description AS title, c.name || CASE WHEN m.serial = '' THEN '' ELSE ' · ' || m.serial END AS detail`;
const MACHINE_FROM = 'FROM machines m JOIN customers c ON c.id = m.customerId';
const CUSTOMER = `SELECT 'customer' AS kind, c.id AS id, c.name AS title, c.city AS detail`;
const INVOICE = `SELECT 'invoice' AS kind, i.id AS id, i.number AS title, c.name AS detail`;
const INVOICE_FROM = 'FROM invoices i JOIN customers c ON c.id = i.customerId';

/**
 * Looks where a person at the counter would: the number on the tag first, then the serial, then names from their
 * beginning, then names somewhere inside. Newer ones first where nothing else decides.
 */
export function searchStatement(typed: string, mayReadInvoices: boolean): { sql: string; parameters: readonly unknown[] } {
  const parameters = [{ typed, start: startsWith(typed), word: `% ${startsWith(typed)}`, inside: contains(typed) }];
  const piece = (rank: number, select: string, from: string, where: string) => `SELECT * FROM (${select}, ${rank} AS rank ${from} WHERE ${where} ORDER BY id DESC LIMIT ${MOST_HITS})`;
  const like = (column: string, how: 'start' | 'word' | 'inside') => `${column} LIKE :${how} ESCAPE '\\'`;
  const pieces = [
    piece(0, JOB, JOB_FROM, 'j.number = :typed COLLATE NOCASE'),
    piece(1, MACHINE, MACHINE_FROM, "m.serial = :typed COLLATE NOCASE AND m.serial <> ''"),
    piece(2, JOB, JOB_FROM, like('j.number', 'start')),
    piece(3, MACHINE, MACHINE_FROM, like('m.serial', 'start')),
    piece(4, CUSTOMER, 'FROM customers c', like('c.name', 'start')),
    piece(5, CUSTOMER, 'FROM customers c', like('c.name', 'word')),
    piece(5, MACHINE, MACHINE_FROM, `(${like('m.description', 'start')} OR ${like('m.description', 'word')})`),
    piece(6, JOB, JOB_FROM, `(${like('j.number', 'inside')} OR ${like('j.customerReference', 'start')})`),
    piece(7, CUSTOMER, 'FROM customers c', like('c.name', 'inside')),
    piece(7, MACHINE, MACHINE_FROM, `(${like('m.description', 'inside')} OR ${like('m.serial', 'inside')})`),
    ...(mayReadInvoices ? [piece(0, INVOICE, INVOICE_FROM, 'i.number = :typed COLLATE NOCASE'), piece(2, INVOICE, INVOICE_FROM, like('i.number', 'start')), piece(6, INVOICE, INVOICE_FROM, like('i.number', 'inside'))] : []),
  ];
  return {
    sql: `SELECT kind, id, title, detail, MIN(rank) AS rank FROM (${pieces.join(' UNION ALL ')}) GROUP BY kind, id ORDER BY rank, id DESC LIMIT ${MOST_HITS}`,
    parameters,
  };
}
