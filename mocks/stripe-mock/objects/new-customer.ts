import { newId, randomText } from '../store/ids.js';
import type { Customer } from './stored.js';

export interface CustomerFacts {
  email?: string | null;
  name?: string | null;
  phone?: string | null;
  description?: string | null;
  address?: Customer['address'];
  metadata?: Record<string, string>;
}

export function newCustomer(facts: CustomerFacts, created: number): Customer {
  return {
    id: newId('cus'),
    object: 'customer',
    address: facts.address ?? null,
    balance: 0,
    created,
    currency: null,
    customer_account: null,
    default_source: null,
    delinquent: false,
    description: facts.description ?? null,
    discount: null,
    email: facts.email ?? null,
    invoice_prefix: randomText(8).toUpperCase(),
    invoice_settings: { custom_fields: null, default_payment_method: null, footer: null, rendering_options: null },
    livemode: false,
    metadata: facts.metadata ?? {},
    name: facts.name ?? null,
    next_invoice_sequence: 1,
    phone: facts.phone ?? null,
    preferred_locales: [],
    shipping: null,
    tax_exempt: 'none',
    test_clock: null,
  } satisfies Customer;
}
