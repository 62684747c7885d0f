import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { customerPageSchema, customerViewSchema } from '@shared/customers';
import { machinePageSchema, machineViewSchema } from '@shared/machines';
import { bookedIn, NEW_CUSTOMER, PLATE } from './jobs-booking.js';
import { openTestShop, type Person, type TestShop } from './test-app.js';

let shop: TestShop;
let counter: Person;
beforeAll(async () => {
  shop = await openTestShop();
  counter = await shop.person(['counter']);
});
afterAll(() => shop.close());

const entered = async (name: string, more: object = {}) => (await counter.post('/api/customers', { ...NEW_CUSTOMER, name, ...more }).expect(201)).body;

describe('customers', () => {
  it('a customer entered at the counter pays before collection until the office says otherwise', async () => {
    const customer = await entered('Fennholt Sawmills');
    expect(customerViewSchema.parse(customer)).toMatchObject({ name: 'Fennholt Sawmills', terms: 'prepayment', netDays: 0, creditStop: false, version: 1 });
    expect((await counter.get(`/api/customers/${customer.id}`).expect(200)).body).toEqual(customer);
  });

  it('an e-mail that is none is refused at its field, and so is a key nobody knows', async () => {
    const answer = await counter.post('/api/customers', { ...NEW_CUSTOMER, email: 'not an address' });
    expect(answer.status).toBe(400);
    expect(answer.body.fields).toEqual([expect.objectContaining({ path: 'email' })]);
    const assigned = await counter.post('/api/customers', { ...NEW_CUSTOMER, creditStop: false, id: 'chosen-by-me' });
    expect(assigned.status).toBe(400);
    expect(JSON.stringify(assigned.body.fields)).toContain('creditStop');
  });

  it('a change made on an old version is refused and shows what stands there now', async () => {
    const customer = await entered('Tiefental Rolling Mill');
    const { id, terms: _t, netDays: _n, creditStop: _c, ...details } = customer;
    await counter.put(`/api/customers/${id}`, { ...details, phone: '1' }).expect(200);
    const stale = await counter.put(`/api/customers/${id}`, { ...details, phone: '2' });
    expect(stale.status).toBe(409);
    expect(stale.body).toMatchObject({ code: 'CHANGED_MEANWHILE', current: { phone: '1', version: 2 } });
  });

  it('terms are the office’s to set: the counter may not', async () => {
    const office = await shop.person(['office']);
    const customer = await entered('Rostwerk Scrap Yard');
    const terms = { version: 1, terms: 'account', netDays: 30, creditStop: true };
    await counter.put(`/api/customers/${customer.id}/terms`, terms).expect(403);
    const set = await office.put(`/api/customers/${customer.id}/terms`, terms).expect(200);
    expect(set.body).toMatchObject({ terms: 'account', netDays: 30, creditStop: true, version: 2 });
  });

  it('the list is paged, sorted by name, and counts open jobs and machines', async () => {
    const customer = await entered('Aaltje Dairy');
    await bookedIn(counter, { customer: { kind: 'known', customerId: customer.id } });
    const page = customerPageSchema.parse((await counter.get('/api/customers?size=2').expect(200)).body);
    expect(page.rows).toHaveLength(2);
    expect(page.total).toBeGreaterThan(2);
    expect(page.rows[0]).toMatchObject({ name: 'Aaltje Dairy', openJobs: 1, machines: 1 });
  });

  it('a percent sign or an underscore is looked for as it is typed', async () => {
    await entered('100% Copper Works');
    expect((await counter.get('/api/customers?q=%25').expect(200)).body.rows.map((r: { name: string }) => r.name)).toEqual(['100% Copper Works']);
    expect((await counter.get('/api/customers?q=_').expect(200)).body.total).toBe(0);
    expect((await counter.get(`/api/customers?q=${encodeURIComponent("' OR 1=1--")}`).expect(200)).body.total).toBe(0);
  });

  it('a page larger than the largest, or a filter given twice, is refused', async () => {
    await counter.get('/api/customers?size=1000000000').expect(400);
    await counter.get('/api/customers?q=a&q=b').expect(400);
  });

  it('a customer of the shop sees no list of customers', async () => {
    const customer = await entered('Holmbake Bakeries');
    const portal = await shop.person(['customer'], { customerId: customer.id });
    await portal.get('/api/customers').expect(403);
    await portal.get(`/api/customers/${customer.id}`).expect(403);
  });
});

describe('machines', () => {
  it('a machine is entered for its customer and found by a piece of its serial', async () => {
    const customer = await entered('Steinmar Quarry & Lime');
    const machine = (await counter.post(`/api/customers/${customer.id}/machines`, { description: '250 kW crusher motor', nameplate: { ...PLATE, serial: 'QX-991' } }).expect(201)).body;
    expect(machineViewSchema.parse(machine)).toMatchObject({ customerName: 'Steinmar Quarry & Lime', visits: [], coreGeometry: null });
    const found = machinePageSchema.parse((await counter.get('/api/machines?q=X-99').expect(200)).body);
    expect(found.rows).toEqual([expect.objectContaining({ id: machine.id, serial: 'QX-991', visits: 0, lastJobNumber: null })]);
    await counter.post('/api/customers/no-such-customer/machines', { description: 'x', nameplate: PLATE }).expect(404);
  });

  it('a machine lists its visits, the newest first', async () => {
    const first = await bookedIn(counter);
    const { machine, customer } = (await counter.get(`/api/jobs/${first.id}`).expect(200)).body;
    const second = await bookedIn(counter, { customer: { kind: 'known', customerId: customer.id }, machine: { kind: 'known', machineId: machine.id } });
    const view = machineViewSchema.parse((await counter.get(`/api/machines/${machine.id}`).expect(200)).body);
    expect(view.visits.map((v) => v.jobNumber)).toEqual([second.number, first.number]);
  });

  it('a corrected serial is found at once, and a stale correction is refused', async () => {
    const job = await bookedIn(counter);
    const { machine } = (await counter.get(`/api/jobs/${job.id}`).expect(200)).body;
    const change = { version: 1, description: machine.description, nameplate: { ...machine.nameplate, serial: 'CORRECTED-7' } };
    await counter.put(`/api/machines/${machine.id}`, change).expect(200);
    expect((await counter.get('/api/machines?q=corrected-7').expect(200)).body.total).toBe(1);
    const stale = await counter.put(`/api/machines/${machine.id}`, { ...change, description: 'other' });
    expect(stale.body).toMatchObject({ code: 'CHANGED_MEANWHILE', current: { version: 2, nameplate: { serial: 'CORRECTED-7' } } });
  });

  it('a nameplate figure that cannot be is refused at its place', async () => {
    const customer = await entered('Murgen Paperboard');
    const answer = await counter.post(`/api/customers/${customer.id}/machines`, { description: 'x', nameplate: { ...PLATE, powerFactor: 1.2, ratedPowerW: 'many' } });
    expect(answer.status).toBe(400);
    expect(answer.body.fields.map((f: { path: string }) => f.path).sort()).toEqual(['nameplate.powerFactor', 'nameplate.ratedPowerW']);
  });
});
