import type Stripe from 'stripe';
import { z } from 'zod';
import { missing, missingRef } from '../http/api-error.js';
import type { Operation } from '../http/api.js';
import { createdFits, listPage } from '../http/list-page.js';
import type { KnownParams } from '../http/known-params.js';
import { mergedMetadata } from '../http/metadata.js';
import { clearableText, created, email, metadata, onList, text } from '../http/params.js';
import { newCustomer } from '../objects/new-customer.js';
import type { Customer } from '../objects/stored.js';
import { emit, type World } from '../world.js';

const address = z.strictObject({ city: text(), country: text(2), line1: text(), line2: clearableText(), postal_code: text(), state: text() }).partial();
const facts = { email: email().or(z.literal('')), name: clearableText(256), phone: clearableText(20), description: clearableText(350), address, metadata: metadata() } satisfies KnownParams<Stripe.CustomerCreateParams>;
const body = z.strictObject(facts).partial();

export function customerRoutes(on: Operation, world: World): void {
  const { customers } = world.state;
  const found = (id: string): Customer => {
    const customer = customers.find(id);
    if (!customer) throw missing('customer', id);
    return customer;
  };

  on('POST', '/v1/customers', body, (params) => {
    const customer = customers.add(newCustomer({ ...textsOf(params), metadata: mergedMetadata(null, params.metadata) }, world.clock.seconds()));
    emit(world, 'customer.created', customer);
    return customer;
  });
  on('GET', '/v1/customers/:id', z.strictObject({}), (_params, id) =>
    world.state.deletedCustomers.includes(id) ? { id, object: 'customer', deleted: true } : found(id),
  );
  on('POST', '/v1/customers/:id', body, (params, id) => {
    const customer = found(id);
    Object.assign(customer, textsOf(params));
    customer.metadata = mergedMetadata(customer.metadata, params.metadata);
    emit(world, 'customer.updated', customer);
    return customer;
  });
  on('DELETE', '/v1/customers/:id', z.strictObject({}), (_params, id) => {
    const customer = found(id);
    customers.remove(id);
    world.state.deletedCustomers.push(id);
    emit(world, 'customer.deleted', customer);
    return { id, object: 'customer', deleted: true };
  });
  on('GET', '/v1/customers', z.strictObject({ ...onList, email: text().optional(), created: created() }), (params) =>
    listPage(
      customers.newestFirst().filter((customer) => (params.email === undefined || customer.email === params.email) && createdFits(customer.created, params.created)),
      params,
      '/v1/customers',
      'customer',
    ),
  );
}

/** The plain fields that were sent; an empty one unsets. */
function textsOf(params: z.output<typeof body>): Partial<Pick<Customer, 'email' | 'name' | 'phone' | 'description' | 'address'>> {
  const out: Partial<Pick<Customer, 'email' | 'name' | 'phone' | 'description' | 'address'>> = {};
  for (const key of ['email', 'name', 'phone', 'description'] as const) if (params[key] !== undefined) out[key] = params[key] || null;
  if (params.address) {
    const { city = null, country = null, line1 = null, line2 = null, postal_code = null, state = null } = params.address;
    out.address = { city, country, line1, line2: line2 || null, postal_code, state };
  }
  return out;
}

export function customerRef(world: World, id: string | undefined): string | null {
  if (id === undefined) return null;
  if (!world.state.customers.find(id)) throw missingRef('customer', id, 'customer');
  return id;
}
