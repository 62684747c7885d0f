import { approveForCustomerSchema, type QuoteView } from '@shared/quotes';
import { useForm, useWatch } from 'react-hook-form';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import { ChoiceField, TextField } from '../../../components/fields.js';
import { MoneyField } from '../../../components/money-field.js';
import { useTell } from '../../../components/toaster.js';
import { moneyOf } from '../../../lib/format.js';
import { problemsOf, showProblems, showServerProblems } from '../../../lib/form-problems.js';
import { sendForm } from '../../../lib/send-form.js';
import { unsaid } from '../../../lib/unsaid.js';
import { useApproveForCustomer } from '../api/accounts-changes.js';
import { emptyApproval, readApproval, type ApprovalForm } from '../approval-form.js';
import { t } from '../text.js';

const HOW = (['phone', 'purchase-order'] as const).map((value) => ({ value, label: t(`approve-${value}`) }));

/** The customer said yes on the phone or by purchase order: who, when, and how far. */
export function ApprovalDialog({ quote, onClose }: { readonly quote: QuoteView; readonly onClose: () => void }) {
  const approve = useApproveForCustomer(quote.jobId, quote.id);
  const tell = useTell();
  const form = useForm<ApprovalForm>({ defaultValues: emptyApproval(new Date()) });
  const { control, setError } = form;
  const how = useWatch({ control, name: 'how' });
  const write = (values: ApprovalForm) => {
    const { candidate, problems } = readApproval(values, quote.version, quote.currency);
    const input = approveForCustomerSchema.safeParse(candidate);
    if (problems.length > 0 || !input.success) return showProblems([...problems, ...(input.success ? [] : problemsOf(input.error))], setError);
    approve.mutate(input.data, {
      onSuccess: () => {
        tell(t('approvedDone', { number: quote.number }));
        onClose();
      },
      onError: (error) => showServerProblems(error, setError),
    });
  };
  return (
    <ConfirmDialog open title={t('approveTitle', { number: quote.number })} confirm={t('approveConfirm')} pending={approve.isPending} error={unsaid(approve.error)} onConfirm={() => sendForm(form, write)} onClose={onClose}>
      <p>{t('approveWords', { money: moneyOf(quote.grossMinor, quote.currency) })}</p>
      <ChoiceField control={control} name="how" label={t('how')} options={HOW} />
      <TextField control={control} name="approvedBy" label={t('approvedBy')} />
      <TextField control={control} name="approvedAt" type="datetime-local" label={t('approvedAt')} />
      {how === 'purchase-order' && <TextField control={control} name="purchaseOrder" label={t('purchaseOrder')} />}
      <MoneyField control={control} name="notToExceedMinor" label={t('notToExceed')} currency={quote.currency} help={t('notToExceedHelp')} optional={how !== 'phone'} />
    </ConfirmDialog>
  );
}
