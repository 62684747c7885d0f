import type { Control, FieldPath, FieldValues } from 'react-hook-form';
import { defineText } from '../lib/text.js';
import { TextField } from './fields.js';

const t = defineText({
  name: 'Name',
  contactName: 'Whom to ask for',
  email: 'E-mail',
  emailHelp: 'The receipt, the quote and the invoice go here.',
  phone: 'Phone',
  addressLine1: 'Street and number',
  addressLine2: 'Second address line',
  postcode: 'Postcode',
  city: 'City',
  country: 'Country',
  countryHelp: 'Two letters, like DE.',
  taxNumber: 'Tax number',
});

interface CustomerFieldsProps<F extends FieldValues> {
  readonly control: Control<F>;
  /** where the details stand in the form, with a dot behind it; empty for the form itself */
  readonly at: string;
}

/** The details of a customer, wherever they are typed. */
export function CustomerFields<F extends FieldValues>({ control, at }: CustomerFieldsProps<F>) {
  const name = (field: string) => `${at}${field}` as FieldPath<F>;
  return (
    <div className="fields">
      <TextField control={control} name={name('name')} label={t('name')} autoComplete="organization" />
      <TextField control={control} name={name('contactName')} label={t('contactName')} optional autoComplete="name" />
      <TextField control={control} name={name('email')} type="email" label={t('email')} help={t('emailHelp')} autoComplete="email" />
      <TextField control={control} name={name('phone')} type="tel" label={t('phone')} optional autoComplete="tel" />
      <TextField control={control} name={name('addressLine1')} label={t('addressLine1')} optional autoComplete="address-line1" />
      <TextField control={control} name={name('addressLine2')} label={t('addressLine2')} optional autoComplete="address-line2" />
      <TextField control={control} name={name('postcode')} label={t('postcode')} optional autoComplete="postal-code" />
      <TextField control={control} name={name('city')} label={t('city')} optional autoComplete="address-level2" />
      <TextField control={control} name={name('country')} label={t('country')} help={t('countryHelp')} autoComplete="country" />
      <TextField control={control} name={name('taxNumber')} label={t('taxNumber')} optional />
    </div>
  );
}
