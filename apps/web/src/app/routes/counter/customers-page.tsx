import { Button } from '@blueprintjs/core';
import { useQuery } from '@tanstack/react-query';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { Answer, Empty } from '../../../components/faces.js';
import { PageHeader, Panel } from '../../../components/panel.js';
import { CustomerList } from '../../../features/customers/components/customer-list.js';
import { FindBox } from '../../../features/customers/components/find-box.js';
import { t } from '../../../features/customers/text.js';
import { customersQuery } from '../../../lib/customer-queries.js';
import { useMay } from '../../../lib/me.js';

/** Everybody whose machines come here. */
export function CustomersPage() {
  const [params] = useSearchParams();
  const navigate = useNavigate();
  const mayEdit = useMay('customers.edit');
  const q = params.get('q') ?? '';
  const customers = useQuery(customersQuery({ q, page: params.get('page') ?? '1' }));
  return (
    <div className="stack">
      <PageHeader title={t('customers')} actions={mayEdit ? <Button text={t('newCustomer')} onClick={() => void navigate('/counter/customers/new')} /> : undefined} />
      <FindBox />
      <Answer query={customers} isEmpty={(data) => data.rows.length === 0} empty={q === '' ? <Empty title={t('empty')}>{t('emptyHelp')}</Empty> : <Empty title={t('noMatch')}>{t('noMatchHelp')}</Empty>}>
        {(data) => (
          <Panel tight>
            <CustomerList page={data} />
          </Panel>
        )}
      </Answer>
    </div>
  );
}
