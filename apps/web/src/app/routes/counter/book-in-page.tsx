import { useQuery } from '@tanstack/react-query';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { Failed, Waiting } from '../../../components/faces.js';
import { PageHeader } from '../../../components/panel.js';
import { useUnits } from '../../../components/units.js';
import { BookInFlow } from '../../../features/counter/components/book-in-flow.js';
import { emptyBookIn } from '../../../features/counter/book-in-form.js';
import { t } from '../../../features/counter/text.js';
import { customerQuery, machineQuery } from '../../../lib/customer-queries.js';

/** Books a machine in; the address may name the customer and the machine already. */
export function BookInPage() {
  const [params] = useSearchParams();
  const navigate = useNavigate();
  const units = useUnits();
  const customerId = params.get('customer');
  const machineId = params.get('machine');
  const customer = useQuery({ ...customerQuery(customerId ?? ''), enabled: customerId !== null });
  const machine = useQuery({ ...machineQuery(machineId ?? ''), enabled: machineId !== null });
  const error = customer.error ?? machine.error;
  const waiting = (customerId !== null && !customer.data) || (machineId !== null && !machine.data);
  const empty = emptyBookIn(units);
  const start = {
    ...empty,
    customer: customer.data ? { ...empty.customer, customerId: customer.data.id, name: customer.data.name } : empty.customer,
    machine: machine.data ? { ...empty.machine, machineId: machine.data.id, words: machine.data.description } : empty.machine,
  };
  return (
    <>
      <PageHeader title={t('bookIn')} />
      {error ? <Failed error={error} /> : waiting ? <Waiting /> : <BookInFlow key={`${customerId ?? ''}-${machineId ?? ''}`} start={start} draftKey={['book-in', customerId, machineId].filter(Boolean).join(':')} onBooked={(id) => void navigate(`/counter/booked/${id}`)} />}
    </>
  );
}
