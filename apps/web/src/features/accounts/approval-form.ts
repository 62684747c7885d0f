import { parseMoney } from '@libs/money';
import type { ApproveForCustomer } from '@shared/quotes';
import type { FormProblem } from '../../lib/typed.js';
import { t } from './text.js';

export interface ApprovalForm {
  how: ApproveForCustomer['how'];
  approvedBy: string;
  /** as the device's own clock shows it: yyyy-mm-ddThh:mm */
  approvedAt: string;
  purchaseOrder: string;
  notToExceedMinor: string;
}

/** Now, for a field that asks for a day and a time on this device's clock. */
export const localMinute = (now: Date): string => new Date(now.getTime() - now.getTimezoneOffset() * 60_000).toISOString().slice(0, 16);

export const emptyApproval = (now: Date): ApprovalForm => ({ how: 'phone', approvedBy: '', approvedAt: localMinute(now), purchaseOrder: '', notToExceedMinor: '' });

/** What the shop takes down for the customer; what cannot be read is named at its field. */
export function readApproval(form: ApprovalForm, version: number, currency: string): { readonly candidate: unknown; readonly problems: FormProblem[] } {
  const problems: FormProblem[] = [];
  const at = new Date(form.approvedAt);
  if (Number.isNaN(at.getTime())) problems.push({ path: 'approvedAt', message: t('needMoment') });
  let notToExceedMinor: number | null = null;
  if (form.notToExceedMinor.trim() !== '') {
    const money = parseMoney(form.notToExceedMinor, currency);
    if (money.ok) notToExceedMinor = money.amountMinor;
    else problems.push({ path: 'notToExceedMinor', message: money.words });
  } else if (form.how === 'phone') problems.push({ path: 'notToExceedMinor', message: t('needLimit') });
  if (form.how === 'purchase-order' && form.purchaseOrder.trim() === '') problems.push({ path: 'purchaseOrder', message: t('needOrder') });
  const candidate = { version, how: form.how, approvedBy: form.approvedBy, approvedAt: Number.isNaN(at.getTime()) ? '' : at.toISOString(), purchaseOrder: form.purchaseOrder, notToExceedMinor };
  return { candidate, problems };
}
