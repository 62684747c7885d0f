import { Button } from '@blueprintjs/core';
import { invoiceViewSchema, recordPaymentSchema, type InvoiceView } from '@shared/invoices';
import { useQueryClient } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { useForm } from 'react-hook-form';
import { ChoiceField, TextField } from '../../../components/fields.js';
import { MoneyField } from '../../../components/money-field.js';
import { ConflictNotice, ErrorNotice, type Difference } from '../../../components/notices.js';
import { useTell } from '../../../components/toaster.js';
import { moneyOf, shopToday } from '../../../lib/format.js';
import { problemsOf, showProblems, showServerProblems } from '../../../lib/form-problems.js';
import { ApiError } from '../../../lib/http.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useRecordPayment } from '../api/accounts-changes.js';
import { invoiceQuery } from '../api/accounts-queries.js';
import { t } from '../invoice-text.js';
import { paymentFormOf, readPayment, type PaymentForm } from '../payment-form.js';

const KINDS = (['bank-transfer', 'cash'] as const).map((value) => ({ value, label: t(value) }));

/** Money that came without the payment page is written down by hand, against the invoice as it was seen. */
export function RecordPayment({ invoice }: { readonly invoice: InvoiceView }) {
  const record = useRecordPayment(invoice.jobId, invoice.id);
  const client = useQueryClient();
  const tell = useTell();
  // the invoice this form was filled for: another payment meanwhile is a conflict, not a silent change of the balance
  const [seen, setSeen] = useState(invoice);
  const form = useForm<PaymentForm>({ defaultValues: paymentFormOf(invoice, shopToday(new Date())) });
  const { control, setError, reset, getValues } = form;
  const theirs = useMemo(() => theirsOf(record.error), [record.error]);

  const start = (from: InvoiceView) => {
    setSeen(from);
    reset(paymentFormOf(from, shopToday(new Date())));
    record.reset();
  };
  const send = (values: PaymentForm, against: InvoiceView) => {
    const { candidate, problems } = readPayment(values, against.version, against);
    const input = recordPaymentSchema.safeParse(candidate);
    if (problems.length > 0 || !input.success) return showProblems([...problems, ...(input.success ? [] : problemsOf(input.error))], setError);
    record.mutate(input.data, {
      onSuccess: (next) => {
        tell(t('recorded', { money: moneyOf(input.data.amountMinor, next.currency), number: next.number }));
        start(next);
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
        sendForm(form, (values) => send(values, seen));
      }}
    >
      <p className="muted">{t('recordHelp')}</p>
      <div className="fields">
        <ChoiceField control={control} name="kind" label={t('kind')} options={KINDS} wide />
        <MoneyField control={control} name="amountMinor" label={t('amount')} currency={invoice.currency} />
        <TextField control={control} name="receivedOn" type="date" label={t('receivedOn')} />
        <TextField control={control} name="reference" label={t('reference')} help={t('referenceHelp')} optional wide />
      </div>
      {theirs ? (
        <ConflictNotice
          differences={paymentDifferences(theirs, seen, getValues())}
          onTakeTheirs={() => {
            client.setQueryData(invoiceQuery(invoice.id).queryKey, theirs);
            start(theirs);
          }}
          onKeepMine={() => {
            setSeen(theirs);
            sendForm(form, (values) => send(values, theirs));
          }}
        />
      ) : (
        <ErrorNotice error={unsaid(record.error)} />
      )}
      <div>
        <Button type="submit" intent="primary" text={t('recordConfirm')} loading={record.isPending} />
      </div>
    </form>
  );
}

function theirsOf(error: unknown): InvoiceView | null {
  if (!(error instanceof ApiError) || error.code !== 'CHANGED_MEANWHILE') return null;
  const theirs = invoiceViewSchema.safeParse(error.current);
  return theirs.success ? theirs.data : null;
}

function paymentDifferences(theirs: InvoiceView, seen: InvoiceView, form: PaymentForm): Difference[] {
  const payments = ({ payments: all }: InvoiceView) => {
    const last = all.at(-1);
    if (!last) return t('paymentsNone');
    const money = moneyOf(last.amountMinor, last.currency);
    return all.length === 1 ? t('paymentsOne', { money }) : t('paymentsMany', { n: all.length, money });
  };
  return [
    { label: t('conflictPayments'), theirs: payments(theirs), yours: payments(seen) },
    { label: t('conflictBalance'), theirs: moneyOf(theirs.balanceMinor, theirs.currency), yours: moneyOf(seen.balanceMinor, seen.currency) },
    { label: t('conflictAmount'), theirs: '–', yours: `${form.amountMinor}\u00a0${seen.currency}` },
  ];
}
