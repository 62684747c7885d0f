import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { Answer, Empty } from '../../../components/faces.js';
import { PageHeader, Panel } from '../../../components/panel.js';
import { invoicePageQuery } from '../../../features/accounts/api/accounts-queries.js';
import { InvoiceFilters } from '../../../features/accounts/components/invoice-filters.js';
import { InvoiceTable } from '../../../features/accounts/components/invoice-table.js';
import { WaitingQuotes } from '../../../features/accounts/components/waiting-quotes.js';
import { filterOf, isFiltered, paramsOf } from '../../../features/accounts/invoice-filter.js';
import { owedWords } from '../../../features/accounts/invoice-sums.js';
import { t } from '../../../features/accounts/invoice-text.js';
import { useMay } from '../../../lib/me.js';

/** What is quoted and waits, what is billed and is owed. */
export function AccountsPage() {
  const mayInvoices = useMay('invoices.read');
  return (
    <div className="stack">
      <PageHeader title={t('title')} />
      <WaitingQuotes />
      {mayInvoices && <Invoices />}
    </div>
  );
}

function Invoices() {
  const [params] = useSearchParams();
  const filter = filterOf(params);
  const page = useQuery(invoicePageQuery(paramsOf(filter)));
  const filtered = isFiltered(filter);
  return (
    <Panel title={t('invoices')}>
      <div className="stack">
        <InvoiceFilters filter={filter} />
        <p className="muted num" role="status">
          {page.data && <Sums data={page.data} />}
        </p>
        <Answer query={page} isEmpty={(data) => data.rows.length === 0} empty={filtered ? <Empty title={t('noMatch')}>{t('noMatchHelp')}</Empty> : <Empty title={t('none')}>{t('noneHelp')}</Empty>}>
          {(data) => <InvoiceTable page={data} />}
        </Answer>
      </div>
    </Panel>
  );
}

function Sums({ data }: { readonly data: { readonly total: number; readonly rows: Parameters<typeof owedWords>[0] } }) {
  const owed = owedWords(data.rows);
  const words = owed === null ? t('nothingOwed') : t(data.total > data.rows.length ? 'owedHere' : 'owed', { money: owed });
  return data.total === 0 ? null : `${data.total === 1 ? t('countOne') : t('count', { total: data.total })}, ${words}`;
}
