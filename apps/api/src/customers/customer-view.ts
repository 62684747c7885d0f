import type { CustomerView } from '@shared/customers';

/** A customer as the API shows it, from its row or its entity. */
export const toCustomerView = (c: Omit<CustomerView, 'creditStop'> & { creditStop: boolean | number }): CustomerView => ({
  id: c.id,
  name: c.name,
  contactName: c.contactName,
  email: c.email,
  phone: c.phone,
  addressLine1: c.addressLine1,
  addressLine2: c.addressLine2,
  postcode: c.postcode,
  city: c.city,
  country: c.country,
  taxNumber: c.taxNumber,
  terms: c.terms,
  netDays: c.netDays,
  creditStop: Boolean(c.creditStop),
  version: c.version,
});
