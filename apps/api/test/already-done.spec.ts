import Database from 'better-sqlite3';
import sharp from 'sharp';
import { afterAll, afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { CustomersService } from '../src/customers/customers.service.js';
import { databaseFile } from '../src/database/data-folder.js';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { HistoryService } from '../src/history/history.service.js';
import { bookedIn, NEW_CUSTOMER } from './jobs-booking.js';
import { openTestShop, type Person, type TestShop } from './test-app.js';

let shop: TestShop;
let counter: Person;
let disk: Database.Database;
beforeAll(async () => {
  shop = await openTestShop();
  counter = await shop.person(['counter']);
  disk = new Database(databaseFile(shop.config.dataDir), { readonly: true, fileMustExist: true });
});
afterEach(() => {
  vi.restoreAllMocks();
});
afterAll(async () => {
  disk.close();
  await shop.close();
});

const enter = (name: string, key: string) => counter.post('/api/customers', { ...NEW_CUSTOMER, name }, key);
const onDisk = (name: string, key: string) => ({
  customers: disk.prepare('SELECT COUNT(*) FROM customers WHERE name = ?').pluck().get(name),
  told: disk.prepare('SELECT COUNT(*) FROM history WHERE words LIKE ?').pluck().get(`%${name}%`),
  key: disk.prepare('SELECT COUNT(*) FROM idempotency_keys WHERE key = ?').pluck().get(key),
  answer: disk.prepare('SELECT body IS NOT NULL FROM idempotency_keys WHERE key = ?').pluck().get(key),
});

describe('a photo under a key', () => {
  it('sent again is the same one; another photo under that key is refused, not dropped', async () => {
    const { id } = await bookedIn(counter);
    const picture = (width: number) => sharp({ create: { width, height: 8, channels: 3, background: '#b87333' } }).png().toBuffer();
    const send = async (bytes: Buffer) => counter.post(`/api/jobs/${id}/attachments`).set('idempotency-key', 'photo-of-the-winding').attach('file', bytes, 'winding.png');
    const first = await send(await picture(8));
    expect(first.status).toBe(201);
    const again = await send(await picture(8));
    expect(again.body).toEqual(first.body);
    const other = await send(await picture(640));
    expect(other.body).toMatchObject({ statusCode: 422, code: 'IDEMPOTENCY_KEY_REUSED' });
    expect(disk.prepare('SELECT COUNT(*) FROM attachments WHERE jobId = ?').pluck().get(id)).toBe(1);
  });
});

describe('a request under a key, when the shop’s computer fails', () => {
  it('after the change was written and before it was answered: the retry is told that it is done, and nothing is done twice', async () => {
    const service = shop.app.get(CustomersService);
    const create = service.create.bind(service);
    vi.spyOn(service, 'create').mockImplementationOnce(async (actor, details) => {
      await create(actor, details);
      throw new Error('the power went');
    });
    const first = await enter('Written, not answered', 'power-cut-after');
    expect(first.body).toMatchObject({ statusCode: 500, code: 'INTERNAL' });
    expect(onDisk('Written, not answered', 'power-cut-after')).toEqual({ customers: 1, told: 1, key: 1, answer: 0 });
    for (let retry = 0; retry < 3; retry += 1) {
      const answer = await enter('Written, not answered', 'power-cut-after');
      expect(answer.body).toMatchObject({ statusCode: 409, code: 'ALREADY_DONE' });
    }
    expect(onDisk('Written, not answered', 'power-cut-after')).toEqual({ customers: 1, told: 1, key: 1, answer: 0 });
  });

  it('and what is retried under that key is something else: that is refused, as ever', async () => {
    expect((await enter('Somebody else', 'power-cut-after')).body.code).toBe('IDEMPOTENCY_KEY_REUSED');
  });

  it('in the middle of the change: nothing is kept, the key neither, and the retry does it', async () => {
    vi.spyOn(shop.app.get(HistoryService), 'record').mockRejectedValueOnce(new Error('the disk is full'));
    expect((await enter('Half written', 'power-cut-within')).status).toBe(500);
    expect(onDisk('Half written', 'power-cut-within')).toEqual({ customers: 0, told: 0, key: 0, answer: undefined });
    await enter('Half written', 'power-cut-within').expect(201);
    expect(onDisk('Half written', 'power-cut-within')).toEqual({ customers: 1, told: 1, key: 1, answer: 1 });
  });

  it('while the answer is being kept: the change stands once, and the retry is told so', async () => {
    const unitOfWork = shop.app.get(UnitOfWork);
    const run = unitOfWork.run.bind(unitOfWork);
    let units = 0;
    vi.spyOn(unitOfWork, 'run').mockImplementation((work) => ((units += 1) === 2 ? Promise.reject(new Error('the power went')) : run(work)));
    expect((await enter('Answer lost', 'power-cut-keeping')).status).toBe(500);
    vi.restoreAllMocks();
    expect(onDisk('Answer lost', 'power-cut-keeping')).toEqual({ customers: 1, told: 1, key: 1, answer: 0 });
    expect((await enter('Answer lost', 'power-cut-keeping')).body.code).toBe('ALREADY_DONE');
    expect(onDisk('Answer lost', 'power-cut-keeping').customers).toBe(1);
  });

  it('ten taps at once, the first of which fails after its change: all hear of one failure, and the change stands once', async () => {
    const service = shop.app.get(CustomersService);
    const create = service.create.bind(service);
    vi.spyOn(service, 'create').mockImplementation(async (actor, details) => {
      await create(actor, details);
      throw new Error('the power went');
    });
    const answers = await Promise.all(Array.from({ length: 10 }, () => enter('Tapped in the dark', 'power-cut-taps')));
    expect(answers.every((a) => a.status === 500 || a.body.code === 'ALREADY_DONE')).toBe(true);
    expect(onDisk('Tapped in the dark', 'power-cut-taps')).toEqual({ customers: 1, told: 1, key: 1, answer: 0 });
  });
});
