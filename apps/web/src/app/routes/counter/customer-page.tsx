import { useQuery } from '@tanstack/react-query';
import { Link, useParams, useSearchParams } from 'react-router-dom';
import { Answer } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { CustomerDetails } from '../../../features/customers/components/customer-details.js';
import { CustomerMachines } from '../../../features/customers/components/customer-machines.js';
import { CustomerTermsPanel } from '../../../features/customers/components/customer-terms.js';
import { t } from '../../../features/customers/text.js';
import { customerQuery } from '../../../lib/customer-queries.js';
import { useMay } from '../../../lib/me.js';

/** One customer: where they are reached, how they pay, and their machines. */
export function CustomerPage() {
  const { id = '' } = useParams();
  const [params] = useSearchParams();
  const customer = useQuery(customerQuery(id));
  const mayBook = useMay('jobs.book');
  return (
    <Answer query={customer}>
      {(data) => (
        <div className="stack" key={data.id}>
          <PageHeader title={data.name} below={data.city} actions={mayBook ? <Link className="lb-name" to={`/counter/book-in?customer=${data.id}`}>{t('bookIn')}</Link> : undefined} />
          <div className="two-columns">
            <CustomerDetails customer={data} />
            <CustomerTermsPanel customer={data} />
          </div>
          <CustomerMachines customerId={data.id} name={data.name} page={params.get('page') ?? '1'} />
        </div>
      )}
    </Answer>
  );
}
