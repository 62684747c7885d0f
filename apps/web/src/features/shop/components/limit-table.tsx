import { DataTable, type Column } from '../../../components/data-table.js';
import { Panel } from '../../../components/panel.js';
import { Quantity } from '../../../components/quantity.js';
import type { LimitRow, LimitValue } from '../limit-rows.js';
import { t } from '../text.js';
import './shop.css';

const shown = (value: LimitValue) => ('words' in value ? value.words : <Quantity si={value.si} kind={value.kind} />);
const COLUMNS: readonly Column<LimitRow>[] = [
  { key: 'name', title: t('limit'), cell: (row) => row.name },
  { key: 'value', title: t('value'), number: true, cell: (row) => shown(row.value) },
  { key: 'source', title: t('source'), cell: (row) => <span className="lb-limit-source">{row.source}</span> },
  { key: 'standing', title: t('standing'), cell: (row) => <span className="muted">{row.standing || '–'}</span> },
];

export function LimitTable({ title, rows }: { readonly title: string; readonly rows: readonly LimitRow[] }) {
  return (
    <Panel title={title}>
      <div className="lb-limit-table">
        <DataTable caption={title} columns={COLUMNS} rows={rows} rowKey={(row) => row.key} />
      </div>
    </Panel>
  );
}
