import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openTestShop, type Person, type TestShop } from './test-app.js';

let shop: TestShop;
let counter: Person;
beforeAll(async () => {
  shop = await openTestShop();
  counter = await shop.person(['counter']);
});
afterAll(() => shop.close());

const customer = (name: string) => ({ name, email: 'c@customers.test' });
const named = async (name: string) => ((await counter.get(`/api/customers?q=${encodeURIComponent(name)}`)).body.rows as unknown[]).length;

describe('the same request twice', () => {
  it('twenty taps at once make one customer, and each gets the same answer', async () => {
    const answers = await Promise.all(Array.from({ length: 20 }, () => counter.post('/api/customers', customer('Tapped'), 'tap-tap-tap')));
    expect(new Set(answers.map((a) => `${a.status} ${a.body.id}`)).size).toBe(1);
    expect(await named('Tapped')).toBe(1);
  });

  it('a retry later gets the first answer again, and is told so', async () => {
    const first = await counter.post('/api/customers', customer('Retried'), 'retry-later-1');
    const second = await counter.post('/api/customers', customer('Retried'), 'retry-later-1');
    expect(second.body).toEqual(first.body);
    expect(second.headers['idempotent-replayed']).toBe('true');
    expect(await named('Retried')).toBe(1);
  });

  it('a key used for something else is refused', async () => {
    await counter.post('/api/customers', customer('One'), 'one-key-two-uses');
    const other = await counter.post('/api/customers', customer('Two'), 'one-key-two-uses');
    expect(other.body.code).toBe('IDEMPOTENCY_KEY_REUSED');
    expect(await named('Two')).toBe(0);
  });

  it('a request that was refused may be sent again with the same key', async () => {
    await counter.post('/api/customers', { name: 'Later right', email: 'not an address' }, 'refused-first').expect(400);
    await counter.post('/api/customers', customer('Later right'), 'refused-first').expect(201);
    expect(await named('Later right')).toBe(1);
  });

  it('two people may use the same key', async () => {
    const other = await shop.person(['counter']);
    await counter.post('/api/customers', customer('Mine'), 'shared-key-name').expect(201);
    await other.post('/api/customers', customer('Theirs'), 'shared-key-name').expect(201);
    expect([await named('Mine'), await named('Theirs')]).toEqual([1, 1]);
  });

  it('a key that is no key is refused', async () => {
    await counter.post('/api/customers', customer('Bad key'), 'a b').expect(400);
  });
});
