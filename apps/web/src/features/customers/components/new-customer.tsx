import { Button } from '@blueprintjs/core';
import { createCustomerSchema } from '@shared/customers';
import { useForm } from 'react-hook-form';
import { CustomerFields } from '../../../components/customer-fields.js';
import { DraftNotice, useDraft } from '../../../components/draft.js';
import { ErrorNotice } from '../../../components/notices.js';
import { Panel } from '../../../components/panel.js';
import { checked, showServerProblems } from '../../../lib/form-problems.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useCreateCustomer } from '../api/customer-changes.js';
import { emptyCustomer, type CustomerForm } from '../customer-form.js';
import { t } from '../text.js';

/** A customer without a machine yet; most come in with their first job. */
export function NewCustomer({ onMade }: { readonly onMade: (id: string) => void }) {
  const create = useCreateCustomer();
  const form = useForm<CustomerForm>({ defaultValues: emptyCustomer() });
  const { control, clearErrors, handleSubmit, setError } = form;
  const draft = useDraft(form, 'customer:new');
  const save = (values: CustomerForm) => {
    const input = checked(createCustomerSchema, values, setError);
    if (!input) return;
    create.mutate(input, {
      onSuccess: ({ id }) => {
        draft.forget();
        onMade(id);
      },
      onError: (error) => showServerProblems(error, setError),
    });
  };
  return (
    <Panel>
      <form
        className="stack"
        noValidate
        onSubmit={(e) => {
          e.preventDefault();
          sendForm({ clearErrors, handleSubmit }, save);
        }}
      >
        <DraftNotice form={form} draft={draft} />
        <CustomerFields control={control} at="" />
        <ErrorNotice error={unsaid(create.error, control)} />
        <div>
          <Button type="submit" intent="primary" text={t('save')} loading={create.isPending} />
        </div>
      </form>
    </Panel>
  );
}
