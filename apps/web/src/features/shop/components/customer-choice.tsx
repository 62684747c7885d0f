import { InputGroup } from '@blueprintjs/core';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Control } from 'react-hook-form';
import { Field } from '../../../components/field.js';
import { SelectField } from '../../../components/fields.js';
import { customersQuery } from '../../../lib/customer-queries.js';
import { t } from '../text.js';
import type { NewUserForm } from '../user-form.js';

/** Which customer a person belongs to: found by a part of the name, then chosen. */
export function CustomerChoice({ control }: { readonly control: Control<NewUserForm> }) {
  const [q, setQ] = useState('');
  const { data } = useQuery(customersQuery({ ...(q.trim() === '' ? {} : { q: q.trim() }), size: '50' }));
  return (
    <>
      <Field label={t('findCustomer')} help={t('findCustomerHelp')}>
        {({ id, describedBy }) => <InputGroup id={id} type="search" value={q} onChange={(e) => setQ(e.target.value)} aria-describedby={describedBy} autoComplete="off" />}
      </Field>
      <SelectField control={control} name="customerId" label={t('customer')} ask={t('chooseCustomer')} options={(data?.rows ?? []).map((c) => ({ value: c.id, label: `${c.name}${c.city ? `, ${c.city}` : ''}` }))} />
    </>
  );
}
