import { expect, it } from 'vitest';
import { issuedInvoice } from './approved-quote.js';
import { jobInShop } from './job-in-shop.js';
import { openPaymentTown } from './payment-town.js';

it('paying on the service’s page pays the invoice, although every event comes five times', async () => {
  const { shop, stripe, close } = await openPaymentTown({ events: 'delivered' });
  try {
    const manager = await shop.person(['manager']);
    const job = await jobInShop(shop, manager);
    const customer = await shop.person(['customer'], { customerId: job.customerId });
    const invoice = await issuedInvoice(shop, manager, job);
    const { url } = (await customer.post(`/api/portal/invoices/${invoice.id}/checkout`, { version: 1 }).expect(201)).body;
    stripe.control.onEvents({ action: 'repeat', type: '*', copies: 5 });
    const form = new URLSearchParams({ email: 'brandt@customer.test', name: 'H. Brandt', number: '4242424242424242', expiry: '12 / 34', cvc: '123' });
    const landed = await fetch(url, { method: 'POST', body: form, redirect: 'manual' });
    expect(landed.headers.get('location')).toMatch(new RegExp(`^http://shop.test/portal/invoices/${invoice.id}/paid\\?session_id=cs_`));
    await stripe.control.settled();
    expect((await customer.get(`/api/portal/invoices/${invoice.id}`)).body).toMatchObject({ state: 'paid', payments: [{ amountMinor: 75_669 }] });
    expect(stripe.control.deliveries().every((delivery) => delivery.state === 'delivered')).toBe(true);
  } finally {
    await close();
  }
});
