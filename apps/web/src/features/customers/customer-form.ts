import { customerViewSchema, type CustomerView, type UpdateCustomer } from '@shared/customers';
import type { Difference } from '../../components/notices.js';
import { t } from './text.js';

export type CustomerForm = Omit<UpdateCustomer, 'version'>;

export const emptyCustomer = (): CustomerForm => ({ name: '', contactName: '', email: '', phone: '', addressLine1: '', addressLine2: '', postcode: '', city: '', country: 'DE', taxNumber: '' });

export const customerFormOf = ({ name, contactName, email, phone, addressLine1, addressLine2, postcode, city, country, taxNumber }: CustomerForm): CustomerForm => ({
  name,
  contactName,
  email,
  phone,
  addressLine1,
  addressLine2,
  postcode,
  city,
  country,
  taxNumber,
});

/** What stands on the server when somebody else was faster; null when it cannot be read. */
export function theirsOf(current: unknown): CustomerView | null {
  const parsed = customerViewSchema.safeParse(current);
  return parsed.success ? parsed.data : null;
}

const LABELS: Record<keyof CustomerForm, string> = {
  name: t('name'),
  contactName: t('contact'),
  email: t('email'),
  phone: t('phone'),
  addressLine1: t('address'),
  addressLine2: t('address2'),
  postcode: t('postcode'),
  city: t('city'),
  country: t('country'),
  taxNumber: t('taxNumber'),
};

export const customerDifferences = (theirs: CustomerForm, yours: CustomerForm): Difference[] =>
  (Object.keys(LABELS) as (keyof CustomerForm)[]).flatMap((key) => (theirs[key] === yours[key] ? [] : [{ label: LABELS[key], theirs: theirs[key], yours: yours[key] }]));
