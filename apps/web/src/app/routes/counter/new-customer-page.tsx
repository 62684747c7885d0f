import { useNavigate } from 'react-router-dom';
import { PageHeader } from '../../../components/panel.js';
import { NewCustomer } from '../../../features/customers/components/new-customer.js';
import { t } from '../../../features/customers/text.js';

export function NewCustomerPage() {
  const navigate = useNavigate();
  return (
    <>
      <PageHeader title={t('newCustomer')} />
      <NewCustomer onMade={(id) => void navigate(`/counter/customers/${id}`)} />
    </>
  );
}
