import { Writable } from 'node:stream';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createLogger, PinoNestLogger } from '../src/http/logger.js';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { User } from '../src/users/user.entity.js';
import { openTestShop, TEST_PASSWORD, type Person, type TestShop } from './test-app.js';
import { openWire, type Wire } from './wire.js';

const lines: string[] = [];
const logger = createLogger(
  'debug',
  new Writable({
    write(chunk: Buffer, _encoding, done) {
      lines.push(...chunk.toString('utf8').split('\n').filter(Boolean));
      done();
    },
  }),
);
const entries = () => lines.map((line) => JSON.parse(line) as Record<string, unknown> & { msg?: string });
let shop: TestShop;
let wire: Wire;
let counter: Person;
beforeAll(async () => {
  shop = await openTestShop({ logLevel: 'debug' }, logger);
  wire = await openWire(shop);
  counter = await shop.person(['counter'], { email: 'counter@shop.test' });
});
afterAll(async () => {
  wire.close();
  await shop.close();
});

describe('the log', () => {
  it('has every request on a line of JSON with its number, and no password, cookie, query or body', async () => {
    const secrets = ['CANARY-PASSWORD', 'CANARY-QUERY', 'CANARY-BODY', 'CANARY-AGENT', 'CANARY-BEARER', TEST_PASSWORD, shop.config.jwtSecret, counter.carries()['cookie']!.split('=')[1]!];
    await wire.send(null, { method: 'POST', path: '/api/session', body: JSON.stringify({ email: 'counter@shop.test', password: 'CANARY-PASSWORD' }) });
    await wire.send(counter, { method: 'GET', path: '/api/search?q=CANARY-QUERY', headers: { 'user-agent': 'CANARY-AGENT', authorization: 'Bearer CANARY-BEARER' } });
    await wire.send(counter, { method: 'POST', path: '/api/customers', body: JSON.stringify({ name: 'CANARY-BODY', email: 'c@customers.test' }) });
    await wire.send(counter, { method: 'POST', path: '/api/customers', body: '{"name": CANARY-BODY' });
    await wire.send(counter, { method: 'GET', path: '/api/jobs/%' });
    const { headers } = await wire.send(counter, { method: 'GET', path: '/api/session', headers: { 'x-request-id': 'asked-for-this-one' } });
    expect(headers['x-request-id']).toBe('asked-for-this-one');
    expect(entries().some((e) => e['reqId'] === 'asked-for-this-one')).toBe(true);
    for (const entry of entries()) expect(entry['time']).toMatch(/^\d{4}-\d\d-\d\dT.*Z$/);
    for (const secret of secrets) expect(lines.filter((line) => line.includes(secret)), secret).toEqual([]);
  });

  it('says who signed in, and who tried what they may not, with the request’s number', async () => {
    const answer = await wire.send(counter, { method: 'GET', path: '/api/users' });
    const refused = entries().find((e) => e['reqId'] === answer.headers['x-request-id'] && String(e.msg).includes('FORBIDDEN'));
    expect(refused?.msg).toBe(`FORBIDDEN GET /api/users from 127.0.0.1, user ${counter.userId}`);
    expect(entries().some((e) => e.msg?.startsWith(`User ${counter.userId} signed in from`))).toBe(true);
    expect(entries().some((e) => e.msg?.startsWith('WRONG_NAME_OR_PASSWORD POST /api/session'))).toBe(true);
  });

  it('has no line that somebody else wrote: a request’s number and address cannot break one', async () => {
    const before = lines.length;
    await wire.send(counter, { method: 'GET', path: '/api/users%0a%7B%22level%22:60,%22msg%22:%22forged%22%7D', headers: { 'x-request-id': 'a b {"level":60}' } });
    const added = lines.slice(before).map((line) => JSON.parse(line) as { level: number; msg?: string });
    expect(added.length).toBeGreaterThan(0);
    expect(added.filter((e) => e.level === 60 || e.msg === 'forged')).toEqual([]);
  });

  it('tells of a failure in the database without the row that failed', async () => {
    const row = { id: counter.userId!, email: 'CANARY-MAIL@shop.test', name: 'CANARY-NAME', passwordHash: 'CANARY-HASH', roles: [], customerId: null, units: 'si', theme: 'system', disabledAt: null, createdAt: '', version: 1 } as const;
    const failure: unknown = await shop.app.get(UnitOfWork).run((manager) => manager.insert(User, { ...row, roles: [] })).catch((error: unknown) => error);
    expect(failure).toBeInstanceOf(Error);
    const before = lines.length;
    new PinoNestLogger(logger).error(failure);
    const told = lines.slice(before).join('\n');
    expect(told).toContain('UNIQUE constraint failed: users.id');
    expect(told).not.toContain('CANARY');
  });
});
