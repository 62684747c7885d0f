import { getDataSourceToken } from '@nestjs/typeorm';
import type { DataSource } from 'typeorm';
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest';
import { floorPageSchema, floorStepsSchema, type FloorRow } from '@shared/jobs';
import { STEPS } from '@shared/route';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { Ids } from '../src/ids/ids.js';
import { Job } from '../src/jobs/job.entity.js';
import { JobRecord } from '../src/records/job-record.entity.js';
import { bookedIn, NEW_CUSTOMER, PLATE, sheetOf } from './jobs-booking.js';
import { openTestShop, type Person, type TestShop } from './test-app.js';

let shop: TestShop;
let counter: Person;
const numbers: string[] = [];
/** The clock stands at 2 March 2026, 10 o'clock in the shop. */
const JOBS: { customer: string; machine: string; job: Partial<Job> }[] = [
  { customer: 'Brandt & Co', machine: '75 kW pump motor', job: { promisedOn: '2026-03-20', step: 'rewind' } },
  { customer: '=HYPERLINK("http://evil.test")', machine: '@SUM(A1)', job: { promisedOn: '2026-03-01', step: 'ready' } },
  { customer: 'albers mill', machine: 'Fan, 5 kW "old"', job: { promisedOn: null, step: 'received' } },
  { customer: 'Zeller', machine: '11 kW 100% duty', job: { promisedOn: '2026-02-10', step: 'rewind', state: 'on-hold', holdReason: 'Wire ordered', waitingFor: 'part' } },
  { customer: 'Zeller', machine: 'Crane motor', job: { promisedOn: '2026-02-01', step: 'released', state: 'released' } },
  { customer: 'Ohlsen', machine: 'Saw motor', job: { promisedOn: '2026-03-02', step: 'received' } },
];

beforeAll(async () => {
  shop = await openTestShop();
  counter = await shop.person(['counter']);
  for (const { customer, machine, job } of JOBS) {
    const booked = await bookedIn(counter, {
      customer: { kind: 'new', details: { ...NEW_CUSTOMER, name: customer } },
      machine: { kind: 'new', details: { description: machine, nameplate: { ...PLATE, serial: `S-${numbers.length}` } } },
    });
    numbers.push(booked.number);
    await shop.app.get(UnitOfWork).run((em) => em.update(Job, { id: booked.id }, job));
  }
});
afterAll(() => shop.close());

const floor = async (query = '') => floorPageSchema.parse((await counter.get(`/api/jobs?${query}`).expect(200)).body);
const indexes = (rows: readonly FloorRow[]) => rows.map((r) => numbers.indexOf(r.number));

describe('the floor', () => {
  it('shows every job that has not ended, the earliest promise first and those without one last', async () => {
    const page = await floor();
    expect(indexes(page.rows)).toEqual([3, 1, 5, 0, 2]);
    expect(page).toMatchObject({ total: 5, page: 1, size: 50 });
    expect(indexes((await floor('order=desc')).rows)).toEqual([0, 5, 1, 3, 2]);
  });

  it('late is what was promised for a day that is over in the shop; today is not late, and what has ended is not', async () => {
    const all = await floor('state=all');
    expect(all.rows.filter((r) => r.late).map((r) => numbers.indexOf(r.number)).sort()).toEqual([1, 3]);
    expect(indexes((await floor('late=yes')).rows)).toEqual([3, 1]);
    expect(await floor('late=yes&state=released')).toMatchObject({ rows: [], total: 0 });
  });

  it('sorts by number, step, customer without regard to capitals, and time of receipt', async () => {
    expect(indexes((await floor('sort=number&order=desc')).rows)).toEqual([5, 3, 2, 1, 0]);
    expect(indexes((await floor('sort=step')).rows)).toEqual([2, 5, 0, 3, 1]);
    expect(indexes((await floor('sort=customer')).rows)).toEqual([1, 2, 0, 5, 3]);
    expect(indexes((await floor('sort=receivedAt')).rows)).toEqual([0, 1, 2, 3, 5]);
  });

  it('filters by step and state', async () => {
    expect(indexes((await floor('step=rewind')).rows)).toEqual([3, 0]);
    expect((await floor('state=on-hold')).rows).toEqual([expect.objectContaining({ number: numbers[3], holdReason: 'Wire ordered', waitingFor: 'part' })]);
    expect((await floor('state=all')).total).toBe(6);
  });

  it('finds by customer, machine, serial and number, and takes % and _ as they are typed', async () => {
    expect(indexes((await floor('q=brandt')).rows)).toEqual([0]);
    expect(indexes((await floor('q=saw')).rows)).toEqual([5]);
    expect(indexes((await floor('q=s-2')).rows)).toEqual([2]);
    expect(indexes((await floor(`q=${numbers[1]}`)).rows)).toEqual([1]);
    expect(indexes((await floor('q=%25')).rows)).toEqual([3]);
    expect((await floor('q=_')).total).toBe(0);
    expect((await floor(`q=${encodeURIComponent("' OR 1=1--")}`)).total).toBe(0);
  });

  it('pages without losing or repeating a job, whatever it is sorted by', async () => {
    for (const sort of ['number', 'promisedOn', 'step', 'customer', 'receivedAt']) {
      for (const order of ['asc', 'desc']) {
        const whole = indexes((await floor(`state=all&sort=${sort}&order=${order}`)).rows);
        const pages = [];
        for (let page = 1; page <= 4; page += 1) pages.push(...indexes((await floor(`state=all&sort=${sort}&order=${order}&size=2&page=${page}`)).rows));
        expect([sort, order, pages]).toEqual([sort, order, whole]);
      }
    }
  });

  it('refuses a sort it does not know, a page too large, a key nobody asked for, and a key given twice', async () => {
    for (const query of ['sort=id;drop', 'size=1000000000', 'size=0', 'page=-1', 'colour=red', 'q=a&q=b', 'state[]=open']) await counter.get(`/api/jobs?${query}`).expect(400);
  });

  it('shows the verdict of the newest core test: the one after counts before the one before', async () => {
    const job = await sheetOf(counter, (await counter.get(`/api/jobs/by-number/${numbers[0]}`)).body.id);
    const test = (kind: 'core-test-before' | 'core-test-after', ordinal: number, verdict: string) =>
      shop.app.get(UnitOfWork).run((em) => em.insert(JobRecord, { id: shop.app.get(Ids).next(), jobId: job.id, machineId: job.machine.id, kind, ordinal, revision: 1, verdict, wattsPerKg: 4, increase: null, createdAt: shop.clock.iso(), version: 1 }));
    const verdict = async () => (await floor('q=brandt')).rows[0]!.coreVerdict;
    expect(await verdict()).toBeNull();
    await test('core-test-before', 1, 'conforms');
    expect(await verdict()).toBe('conforms');
    await test('core-test-after', 1, 'does-not-conform');
    await test('core-test-after', 2, 'inconclusive');
    expect(await verdict()).toBe('inconclusive');
  });

  it('counts what stands at each step, the whole route long', async () => {
    const steps = floorStepsSchema.parse((await counter.get('/api/jobs/steps').expect(200)).body);
    expect(steps.map((s) => s.step)).toEqual(STEPS);
    expect(steps.filter((s) => s.open + s.onHold > 0)).toEqual([
      { step: 'received', open: 2, onHold: 0, late: 0 },
      { step: 'rewind', open: 1, onHold: 1, late: 1 },
      { step: 'ready', open: 1, onHold: 0, late: 1 },
    ]);
  });

  it('asks the database twice for a page and eight times for a sheet, however much there is', async () => {
    await shop.postman();
    const reader = shop.app.get<DataSource>(getDataSourceToken('read'));
    const asked = async (path: string) => {
      const watch = vi.spyOn(reader, 'query');
      await counter.get(path).expect(200);
      const statements = watch.mock.calls.filter(([sql]) => !/\b(sessions|outbox)\b/.test(sql));
      watch.mockRestore();
      return statements.length;
    };
    expect(await asked('/api/jobs?size=1')).toBe(2);
    expect(await asked('/api/jobs?state=all&size=50&q=e')).toBe(2);
    const id = (await counter.get(`/api/jobs/by-number/${numbers[0]}`)).body.id;
    const bare = (await counter.get(`/api/jobs/by-number/${numbers[5]}`)).body.id;
    expect(await asked(`/api/jobs/${id}`)).toBe(8);
    expect(await asked(`/api/jobs/${bare}`)).toBe(8);
  });
});

describe('the export', () => {
  /** RFC 4180, read back independently of the writer. */
  function readCsv(text: string): string[][] {
    const rows: string[][] = [];
    let row: string[] = [];
    // one cell: quoted with doubled quotes inside, or plain; then a comma or the end of the line
    for (const [, quoted, plain, end] of text.matchAll(/(?:"((?:[^"]|"")*)"|([^",\r\n]*))(,|\r\n)/g)) {
      row.push(quoted === undefined ? plain! : quoted.replaceAll('""', '"'));
      if (end === ',') continue;
      rows.push(row);
      row = [];
    }
    return rows;
  }
  const exported = async (query: string) => {
    const answer = await counter.get(`/api/jobs.csv?${query}`).buffer(true).parse((res, done) => {
      const chunks: Buffer[] = [];
      res.on('data', (c: Buffer) => chunks.push(c));
      res.on('end', () => done(null, Buffer.concat(chunks).toString('utf8')));
    });
    expect(answer.status).toBe(200);
    return { answer, rows: readCsv((answer.body as string).replace(/^\uFEFF/, '')) };
  };

  it('holds exactly the filtered list, in its order, all pages of it', async () => {
    const { answer, rows } = await exported('state=all&sort=customer&order=desc&size=2&page=2');
    expect(answer.headers['content-type']).toBe('text/csv; charset=utf-8');
    expect(answer.headers['content-disposition']).toBe('attachment; filename="jobs-2026-03-02.csv"');
    expect(rows[0]).toHaveLength(12);
    expect(rows.slice(1).map((r) => r[0])).toEqual((await floor('state=all&sort=customer&order=desc')).rows.map((r) => r.number));
    expect((await exported('late=yes')).rows.slice(1).map((r) => numbers.indexOf(r[0]!))).toEqual([3, 1]);
  });

  it('keeps a spreadsheet from taking a name for a formula, and quotes what holds commas and quotes', async () => {
    const { rows } = await exported('state=all');
    const row = rows.find((r) => r[0] === numbers[1])!;
    expect(row.slice(1, 3)).toEqual([`'=HYPERLINK("http://evil.test")`, `'@SUM(A1)`]);
    expect(rows.find((r) => r[0] === numbers[2])![2]).toBe('Fan, 5 kW "old"');
    expect(row.at(-2)).toBe('yes');
  });

  it('walks thousands of jobs page by page: each once, in order, with and without a promise', async () => {
    const first = await sheetOf(counter, (await counter.get(`/api/jobs/by-number/${numbers[0]}`)).body.id);
    const ids = shop.app.get(Ids);
    await shop.app.get(UnitOfWork).run(async (em) => {
      for (let i = 0; i < 2300; i += 1) {
        await em.insert(Job, {
          id: ids.next(), number: `X2026-${String(i).padStart(5, '0')}`, customerId: first.customer.id, machineId: first.machine.id, route: 'rewind', step: 'received', state: i % 5 === 0 ? 'on-hold' : 'open', holdReason: null, waitingFor: null,
          complaint: 'x', accessories: '', contamination: 'none', contaminationWords: '', customerReference: 'MANY', promisedOn: i % 3 === 0 ? null : `2026-0${(i % 6) + 4}-1${i % 4}`, receivedAt: shop.clock.iso(), bookedByUserId: counter.userId!, warrantyOfJobId: null, limitsVersion: 1, releasedAt: null, version: 1,
        });
      }
    });
    for (const query of ['q=MANY', 'q=MANY&order=desc', 'q=MANY&sort=step']) {
      const { rows } = await exported(query);
      expect(new Set(rows.map((r) => r[0])).size).toBe(2301);
      const promises = rows.slice(1).map((r) => r[8]!);
      if (query.includes('step')) continue;
      const direction = query.includes('desc') ? -1 : 1;
      const days = promises.filter((promise) => promise !== '').map((promise) => direction * Number(promise.replaceAll('-', '')));
      expect(days.filter((day, at) => at > 0 && day < days[at - 1]!)).toEqual([]);
      expect(promises.slice(days.length).every((promise) => promise === '')).toBe(true);
      expect(promises.at(-1)).toBe('');
    }
  });

  it('ten exports a minute are enough for a person', async () => {
    const hurried = await shop.person(['office']);
    for (let i = 0; i < 10; i += 1) await hurried.get('/api/jobs.csv?q=nothing').expect(200);
    expect((await hurried.get('/api/jobs.csv?q=nothing').expect(429)).body.code).toBe('TOO_MANY_TRIES');
  });
});
