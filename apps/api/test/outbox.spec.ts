import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { OutboxService } from '../src/outbox/outbox.service.js';
import { openTestShop, type TestShop } from './test-app.js';

let shop: TestShop;
beforeAll(async () => {
  shop = await openTestShop();
});
afterAll(() => shop.close());

const promise = (subject: string, dedupeKey?: string) =>
  shop.app.get(UnitOfWork).run((manager) => shop.app.get(OutboxService).addMail(manager, { kind: 'note', to: 'someone@shop.test', subject, text: 'text', html: '<p>text</p>', ...(dedupeKey ? { dedupeKey } : {}) }));
const sent = (subject: string) => shop.mail.sent.filter((m) => m.subject === subject).length;

describe('mail that was promised', () => {
  it('leaves once, after the unit it was promised in', async () => {
    await promise('once');
    await shop.postman();
    await shop.postman();
    expect(sent('once')).toBe(1);
  });

  it('never leaves when the unit failed', async () => {
    const failing = shop.app.get(UnitOfWork).run(async (manager) => {
      await shop.app.get(OutboxService).addMail(manager, { kind: 'note', to: 'someone@shop.test', subject: 'never', text: '', html: '' });
      throw new Error('refused');
    });
    await expect(failing).rejects.toThrow('refused');
    await shop.postman();
    expect(sent('never')).toBe(0);
  });

  it('the same promise given twice leaves once', async () => {
    await promise('twice promised', 'receipt-1');
    await promise('twice promised', 'receipt-1');
    await shop.postman();
    expect(sent('twice promised')).toBe(1);
  });

  it('waits while the mail server is down, holds nothing else up, and leaves when it is back', async () => {
    const manager = await shop.person(['manager']);
    shop.mail.down = true;
    await promise('delayed');
    await shop.postman();
    expect(sent('delayed')).toBe(0);
    const row = async () => (await manager.get('/api/messages').expect(200)).body.find((m: { subject: string }) => m.subject === 'delayed');
    expect(await row()).toMatchObject({ state: 'waiting', attempts: 1, lastError: 'connect ECONNREFUSED' });
    await manager.post('/api/customers', { name: 'While mail is down', email: 'down@customers.test' }).expect(201);
    shop.mail.down = false;
    await shop.postman();
    expect(sent('delayed'), 'not before its time').toBe(0);
    shop.clock.forward(6_000);
    await shop.postman();
    expect(sent('delayed')).toBe(1);
    expect(await row()).toMatchObject({ state: 'sent', attempts: 2, lastError: null });
  });

  it('is given up after three days and stands in the list for a person', async () => {
    const manager = await shop.person(['manager']);
    shop.mail.down = true;
    await promise('hopeless');
    shop.clock.forward(3 * 24 * 3_600_000);
    await shop.postman();
    shop.mail.down = false;
    const again = await shop.person(['manager']);
    expect((await again.get('/api/messages')).body.find((m: { subject: string }) => m.subject === 'hopeless')).toMatchObject({ state: 'given-up' });
    expect(manager.userId).not.toBe(again.userId);
  });
});
