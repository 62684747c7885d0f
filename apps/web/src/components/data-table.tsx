import { Button } from '@blueprintjs/core';
import type { ReactNode } from 'react';
import { useSearchParams } from 'react-router-dom';
import { defineText } from '../lib/text.js';
import './data-table.css';

const t = defineText({ previous: 'Previous', next: 'Next', range: '{from} to {to} of {total}', sortBy: 'Sort by {column}', pages: 'Pages of the list' });

export interface Column<Row> {
  readonly key: string;
  readonly title: string;
  readonly cell: (row: Row) => ReactNode;
  /** the server sorts by this */
  readonly sort?: string;
  readonly number?: boolean;
}

interface DataTableProps<Row> {
  readonly caption: string;
  readonly columns: readonly Column<Row>[];
  readonly rows: readonly Row[];
  readonly rowKey: (row: Row) => string;
  readonly total?: number;
  readonly page?: number;
  readonly size?: number;
  /** the order the list has while the address names none */
  readonly sortedBy?: { readonly sort: string; readonly order: 'asc' | 'desc' };
}

/** A list that the server sorts and pages; its state stands in the address. */
export function DataTable<Row>({ caption, columns, rows, rowKey, total, page = 1, size = 50, sortedBy }: DataTableProps<Row>) {
  const [params, setParams] = useSearchParams();
  const set = (changes: Record<string, string>) =>
    setParams((old) => {
      const next = new URLSearchParams(old);
      for (const [key, value] of Object.entries(changes)) next.set(key, value);
      return next;
    });
  const sorted = params.get('sort') ?? sortedBy?.sort;
  const descending = (params.get('order') ?? sortedBy?.order) === 'desc';
  // on a phone the rows become cards by style, and style takes the table's meaning away: the roles keep it
  return (
    <div className="lb-table-wrap">
      <table className="lb-table" role="table">
        <caption className="visually-hidden">{caption}</caption>
        <thead role="rowgroup">
          <tr role="row">
            {columns.map((c) => (
              <th key={c.key} scope="col" role="columnheader" className={c.number ? 'number' : ''} aria-sort={c.sort && sorted === c.sort ? (descending ? 'descending' : 'ascending') : undefined}>
                {c.sort ? (
                  <button type="button" aria-label={t('sortBy', { column: c.title })} onClick={() => set({ sort: c.sort!, order: sorted === c.sort && !descending ? 'desc' : 'asc', page: '1' })}>
                    {c.title}
                    <span aria-hidden="true">{sorted === c.sort ? (descending ? ' ↓' : ' ↑') : ''}</span>
                  </button>
                ) : (
                  c.title
                )}
              </th>
            ))}
          </tr>
        </thead>
        <tbody role="rowgroup">
          {rows.map((row) => (
            <tr key={rowKey(row)} role="row">
              {columns.map((c) => (
                <td key={c.key} role="cell" data-title={c.title} className={c.number ? 'number num' : ''}>
                  {c.cell(row)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      {total !== undefined && total > size && (
        <nav className="row spread lb-pager" aria-label={t('pages')}>
          <span className="muted num">{t('range', { from: (page - 1) * size + 1, to: Math.min(page * size, total), total })}</span>
          <div className="row">
            <Button text={t('previous')} disabled={page <= 1} onClick={() => set({ page: String(page - 1) })} />
            <Button text={t('next')} disabled={page * size >= total} onClick={() => set({ page: String(page + 1) })} />
          </div>
        </nav>
      )}
    </div>
  );
}
