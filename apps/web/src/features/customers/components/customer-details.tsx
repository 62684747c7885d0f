import { Button } from '@blueprintjs/core';
import { updateCustomerSchema, type CustomerView } from '@shared/customers';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { CustomerFields } from '../../../components/customer-fields.js';
import { DraftNotice, useDraft } from '../../../components/draft.js';
import { ConflictNotice, ErrorNotice } from '../../../components/notices.js';
import { Facts, Panel } from '../../../components/panel.js';
import { useTell } from '../../../components/toaster.js';
import { checked, showServerProblems } from '../../../lib/form-problems.js';
import { ApiError } from '../../../lib/http.js';
import { useMay } from '../../../lib/me.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useUpdateCustomer } from '../api/customer-changes.js';
import { customerDifferences, customerFormOf, theirsOf, type CustomerForm } from '../customer-form.js';
import { t } from '../text.js';

/** Where a customer can be reached; read, and changed in place. */
export function CustomerDetails({ customer }: { readonly customer: CustomerView }) {
  const [editing, setEditing] = useState(false);
  const mayEdit = useMay('customers.edit');
  const address = [customer.addressLine1, customer.addressLine2, [customer.postcode, customer.city].filter(Boolean).join(' '), customer.country].filter(Boolean).join(', ');
  return (
    <Panel title={t('details')} actions={mayEdit && !editing ? <Button text={t('edit')} onClick={() => setEditing(true)} /> : undefined}>
      {editing ? (
        <EditCustomer customer={customer} onDone={() => setEditing(false)} />
      ) : (
        <Facts
          rows={[
            [t('contact'), customer.contactName || '–'],
            [t('email'), <a key="mail" href={`mailto:${customer.email}`}>{customer.email}</a>],
            [t('phone'), customer.phone ? <a key="tel" href={`tel:${customer.phone.replace(/\s/g, '')}`}>{customer.phone}</a> : '–'],
            [t('address'), address || '–'],
            [t('taxNumber'), customer.taxNumber || '–'],
          ]}
        />
      )}
    </Panel>
  );
}

function EditCustomer({ customer, onDone }: { readonly customer: CustomerView; readonly onDone: () => void }) {
  const update = useUpdateCustomer(customer.id);
  const tell = useTell();
  const form = useForm<CustomerForm>({ defaultValues: customerFormOf(customer) });
  const { control, clearErrors, handleSubmit, setError, reset, getValues } = form;
  const [basis] = useState(customer.version);
  const draft = useDraft(form, `customer:${customer.id}`, { basis });
  const [version, setVersion] = useState(customer.version);
  const theirs = update.error instanceof ApiError && update.error.code === 'CHANGED_MEANWHILE' ? theirsOf(update.error.current) : null;
  const save = (values: CustomerForm, asOf: number) => {
    const input = checked(updateCustomerSchema, { ...values, version: asOf }, setError);
    if (!input) return;
    update.mutate(input, {
      onSuccess: () => {
        draft.forget();
        tell(t('saved'));
        onDone();
      },
      onError: (error) => showServerProblems(error, setError),
    });
  };
  return (
    <form
      className="stack"
      noValidate
      onSubmit={(e) => {
        e.preventDefault();
        sendForm({ clearErrors, handleSubmit }, (values) => save(values, version));
      }}
    >
      <DraftNotice form={form} draft={draft} />
      <CustomerFields control={control} at="" />
      {theirs ? (
        <ConflictNotice
          differences={customerDifferences(customerFormOf(theirs), getValues())}
          onTakeTheirs={() => {
            reset(customerFormOf(theirs));
            setVersion(theirs.version);
            draft.forget();
            update.reset();
          }}
          onKeepMine={() => {
            setVersion(theirs.version);
            sendForm({ clearErrors, handleSubmit }, (values) => save(values, theirs.version));
          }}
        />
      ) : (
        <ErrorNotice error={unsaid(update.error, control)} />
      )}
      <div className="row">
        <Button type="submit" intent="primary" text={t('save')} loading={update.isPending} />
        <Button
          text={t('cancel')}
          onClick={() => {
            draft.forget();
            onDone();
          }}
        />
      </div>
    </form>
  );
}
