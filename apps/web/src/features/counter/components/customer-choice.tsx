import { Button, InputGroup } from '@blueprintjs/core';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useController, useWatch, type UseFormReturn } from 'react-hook-form';
import { CustomerFields } from '../../../components/customer-fields.js';
import { Field } from '../../../components/field.js';
import { ErrorNotice } from '../../../components/notices.js';
import { customersQuery } from '../../../lib/customer-queries.js';
import type { BookInForm } from '../book-in-form.js';
import { t } from '../text.js';
import { Hits } from './hits.js';

interface ChoiceProps {
  readonly form: UseFormReturn<BookInForm>;
  /** a known one was chosen: nothing more to type here */
  readonly onChosen: () => void;
}

/** A known customer found as it is typed, or a new one. */
export function CustomerChoice({ form, onChosen }: ChoiceProps) {
  const { control, setValue } = form;
  const customer = useWatch({ control, name: 'customer' });
  const { field, fieldState } = useController({ control, name: 'customer.customerId' });
  const [q, setQ] = useState('');
  const asked = q.trim();
  const found = useQuery({ ...customersQuery({ q: asked, size: '8' }), enabled: customer.kind === 'known' && asked.length > 0 });
  const keep = { shouldDirty: true, shouldTouch: true };

  if (customer.kind === 'new') {
    return (
      <>
        <CustomerFields control={control} at="customer.details." />
        <div>
          <Button variant="minimal" text={t('knownCustomer')} onClick={() => setValue('customer.kind', 'known', keep)} />
        </div>
      </>
    );
  }
  const choose = (id: string, name: string) => {
    if (id !== customer.customerId) {
      setValue('machine.machineId', null, keep);
      setValue('machine.words', '', keep);
      setValue('machine.kind', 'known', keep);
      setValue('warrantyOfJobId', null, keep);
    }
    setValue('customer.name', name, keep);
    field.onChange(id);
    form.clearErrors('customer.customerId');
    onChosen();
  };
  const toNew = () => {
    setValue('customer.kind', 'new', keep);
    if (asked !== '') setValue('customer.details.name', asked, keep);
    setValue('machine.kind', 'new', keep);
  };
  const rows = asked === '' ? [] : (found.data?.rows ?? []);
  return (
    <>
      <Field label={t('findCustomer')} help={customer.customerId ? `${customer.name}: ${t('chosen')}` : t('findCustomerHelp')} problem={fieldState.error?.message}>
        {({ id, describedBy, invalid }) => (
          <InputGroup id={id} className="lb-flow-search" inputRef={field.ref} type="search" autoComplete="off" autoFocus value={q} onChange={(e) => setQ(e.target.value)} aria-describedby={describedBy} aria-invalid={invalid} />
        )}
      </Field>
      <ErrorNotice error={found.error} />
      <Hits label={t('foundCustomers')} hits={rows.map((row) => ({ id: row.id, name: row.name, detail: [row.city, row.email].filter(Boolean).join(', ') }))} chosen={customer.customerId} onChoose={(hit) => choose(hit.id, hit.name)} />
      {asked !== '' && found.data && rows.length === 0 && !found.isFetching && <p role="status">{t('noCustomer', { q: asked })}</p>}
      <div>
        <Button text={t('newCustomer')} onClick={toNew} />
      </div>
    </>
  );
}
