import { Button } from '@blueprintjs/core';
import { customerTermsSchema, type CustomerTerms, type CustomerView } from '@shared/customers';
import { useState } from 'react';
import { useForm, useWatch } from 'react-hook-form';
import { CheckField, ChoiceField, TextField } from '../../../components/fields.js';
import { ErrorNotice } from '../../../components/notices.js';
import { Facts, Panel } from '../../../components/panel.js';
import { useTell } from '../../../components/toaster.js';
import { checked, showServerProblems } from '../../../lib/form-problems.js';
import { useMay } from '../../../lib/me.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useSetTerms } from '../api/customer-changes.js';
import { termsOf, type TermsForm } from '../terms-form.js';
import { t } from '../text.js';

const TERMS = (['prepayment', 'account'] as const).map((value) => ({ value, label: t(value) }));

/** How a customer pays; set by the office or a manager. */
export function CustomerTermsPanel({ customer }: { readonly customer: CustomerView }) {
  const [editing, setEditing] = useState(false);
  const maySet = useMay('customers.terms');
  return (
    <Panel title={t('terms')} actions={maySet && !editing ? <Button text={t('edit')} onClick={() => setEditing(true)} /> : undefined}>
      {editing ? (
        <EditTerms customer={customer} onDone={() => setEditing(false)} />
      ) : (
        <Facts
          rows={[
            [t('termsWords'), t(customer.terms)],
            ...(customer.terms === 'account' ? [[t('netDays'), t('days', { n: customer.netDays })] as const] : []),
            [t('creditStop'), customer.creditStop ? <b key="stop">{t('yesStop')}</b> : t('noStop')],
          ]}
        />
      )}
    </Panel>
  );
}

function EditTerms({ customer, onDone }: { readonly customer: CustomerView; readonly onDone: () => void }) {
  const setTerms = useSetTerms(customer.id);
  const tell = useTell();
  const { control, clearErrors, handleSubmit, setError } = useForm<TermsForm>({ defaultValues: { terms: customer.terms, netDays: String(customer.netDays), creditStop: customer.creditStop } });
  const terms = useWatch({ control, name: 'terms' });
  const save = (form: TermsForm) => {
    const wanted = termsOf(form, customer.version);
    if (wanted === null) return setError('netDays', { message: t('netDaysWrong') }, { shouldFocus: true });
    const input: CustomerTerms | null = checked(customerTermsSchema, wanted, setError);
    if (!input) return;
    setTerms.mutate(input, {
      onSuccess: () => {
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
        sendForm({ clearErrors, handleSubmit }, save);
      }}
    >
      <ChoiceField control={control} name="terms" label={t('termsWords')} options={TERMS} />
      {terms === 'account' && <TextField control={control} name="netDays" label={t('netDays')} />}
      <CheckField control={control} name="creditStop" label={t('creditStop')} help={t('creditStopHelp')} />
      <ErrorNotice error={unsaid(setTerms.error, control)} />
      <div className="row">
        <Button type="submit" intent="primary" text={t('save')} loading={setTerms.isPending} />
        <Button text={t('cancel')} onClick={onDone} />
      </div>
    </form>
  );
}
