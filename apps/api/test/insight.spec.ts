import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ovenInsightSchema, ovenListSchema, type OvenInsight } from '@shared/insight';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { ShopService } from '../src/shop/shop.service.js';
import { BenchJob, staffAndMeters, type Staff } from './job-on-the-bench.js';
import { openTestShop, type TestShop } from './test-app.js';

let shop: TestShop;
let staff: Staff;
let meters: Record<string, string>;
beforeAll(async () => {
  shop = await openTestShop();
  await shop.app.get(UnitOfWork).run((manager) => shop.app.get(ShopService).write(manager, 'bay', { supplies: [], cables: [], ovens: [{ id: 'O1', name: 'O1', remark: '' }, { id: 'O2', name: 'O2', remark: 'new' }] }));
  ({ staff, meters } = await staffAndMeters(shop));
});
afterAll(() => shop.close());

const oven = async (id = 'O1', query = ''): Promise<OvenInsight> => ovenInsightSchema.parse((await staff.technician.get(`/api/insight/ovens/${id}${query}`).expect(200)).body);
const rows = (changes: readonly number[]) => ({ rows: changes.map((change, i) => ({ day: `2026-01-${String(i + 1).padStart(2, '0')}`, change, remark: '' })) });

describe('the ovens, as they treat the cores', () => {
  it('a job stripped in an oven is a point of its chart, with a link to the job', async () => {
    const job = await BenchJob.book({ staff, meters }, 1);
    await job.toCoreAfter('1 before');
    expect((await oven()).leftOut).toMatchObject([{ job: { id: job.id }, reason: 'not-tested-yet' }]);
    const after = await job.record('core-test-after', job.ring('1 after'));
    const { points, leftOut } = await oven();
    expect(leftOut).toEqual([]);
    expect(points).toMatchObject([{ position: 1, day: '2026-03-02', job: { id: job.id }, change: (after.result['comparison'] as { increase: number }).increase }]);
    expect((await oven('O2')).points).toEqual([]);
  });

  it('a test that is not valid is left out, and the valid one after it counts', async () => {
    const job = await BenchJob.book({ staff, meters }, 9);
    await job.toCoreAfter('9 before');
    await job.record('core-test-after', job.ring('9 after warm'));
    expect((await oven()).leftOut).toMatchObject([{ job: { id: job.id }, reason: 'not-valid' }]);
    const valid = await job.record('core-test-after', job.ring('9 after'));
    const found = await oven();
    expect(found.leftOut).toEqual([]);
    expect(found.points.find((p) => p.job?.id === job.id)?.change).toBe((valid.result['comparison'] as { increase: number }).increase);
  });

  it('a test after a repair says nothing of the oven; the one before it stays', async () => {
    const repaired = await BenchJob.book({ staff, meters }, 1);
    await repaired.toCoreAfter('1 before');
    const first = await repaired.record('core-test-after', repaired.ring('1 after'));
    await repaired.record('core-repair', { methods: ['grind'], slotFrom: 11, slotTo: 15, words: 'Burr ground off.' });
    await repaired.record('core-test-after', { ...repaired.ring('1 after'), reading: { ...repaired.ring('1 after').reading, wattsW: 97 } });
    const { points } = await oven();
    expect(points.filter((p) => p.job?.id === repaired.id).map((p) => p.change)).toEqual([(first.result['comparison'] as { increase: number }).increase]);
  });

  it('what was pulled without an oven is on no oven’s chart', async () => {
    const job = await BenchJob.book({ staff, meters }, 12);
    await job.toCoreAfter('12 before', { method: 'cold-pull', ovenId: null, partPeakC: null, minutesAbove345C: null });
    await job.record('core-test-after', job.ring('12 after'));
    for (const id of ['O1', 'O2']) expect((await oven(id)).points.map((p) => p.job?.id)).not.toContain(job.id);
  });

  it('a strip record corrected to another oven moves its point there', async () => {
    const job = await BenchJob.book({ staff, meters }, 2);
    await job.toCoreAfter('2 before');
    await job.record('core-test-after', job.ring('2 after'));
    expect((await oven()).points.map((p) => p.job?.id)).toContain(job.id);
    const strip = (await staff.counter.get(`/api/jobs/${job.id}/records`)).body.find((r: { kind: string }) => r.kind === 'strip');
    await staff.technician.post(`/api/records/${strip.id}/revisions`, { version: strip.version, reason: 'It was the other oven.', record: { kind: 'strip', readings: { ...strip.readings, ovenId: 'O2' }, entered: {} } }).expect(201);
    expect((await oven()).points.map((p) => p.job?.id)).not.toContain(job.id);
    const o2 = await oven('O2');
    expect(o2.points).toMatchObject([{ job: { id: job.id }, overLimit: true }]);
    expect(o2.failedAt).toBe(1);
  });
});

describe('figures of an older book', () => {
  it('come before the jobs, and make the chart speak', async () => {
    await staff.manager.post('/api/insight/ovens/O2/history', rows([...Array.from({ length: 20 }, (_, i) => (i % 2 === 0 ? -0.01 : 0.01)), 0.05, 0.09])).expect(201);
    const found = await oven('O2');
    expect(found.points.slice(0, 22).every((p) => p.entry?.by === 'Mo Manager')).toBe(true);
    expect(found.chart).toMatchObject({ outcome: 'chart', base: { first: 1, last: 20 } });
    expect([found.spokeAt, found.failedAt]).toEqual([22, 23]);
  });

  it('are taken back with a reason, once, and stay in the table', async () => {
    const { points } = await oven('O2');
    const wrong = points.find((p) => p.position === 22)!.entry!;
    await staff.technician.post(`/api/insight/history/${wrong.id}/withdrawal`, { reason: 'Misread.' }).expect(403);
    await staff.manager.post(`/api/insight/history/${wrong.id}/withdrawal`, { reason: 'Misread.' }).expect(201);
    expect((await oven('O2')).points).toHaveLength(points.length - 1);
    const again = await staff.manager.post(`/api/insight/history/${wrong.id}/withdrawal`, { reason: 'Misread.' });
    expect([again.status, again.body.code]).toEqual([409, 'ALREADY_DONE']);
  });

  it.each([
    ['a day to come', { rows: [{ day: '2026-03-03', change: 0.01 }] }, 'rows.0.day', 422],
    ['a percentage written as a fraction', { rows: [{ day: '2026-01-01', change: 12 }] }, 'rows.0.change', 400],
    ['nothing at all', { rows: [] }, 'rows', 400],
  ])('%s is refused at its field', async (_what, body, path, status) => {
    const answer = await staff.manager.post('/api/insight/ovens/O2/history', body);
    expect([answer.status, answer.body.fields[0].path]).toEqual([status, path]);
  });
});

describe('asking about an oven', () => {
  it('the list has the ovens of the bay', async () => {
    expect(ovenListSchema.parse((await staff.technician.get('/api/insight/ovens').expect(200)).body)).toEqual([{ id: 'O1', name: 'O1', remark: '' }, { id: 'O2', name: 'O2', remark: 'new' }]);
  });
  it('one the bay does not have is not there; half a base period is refused', async () => {
    await staff.technician.get('/api/insight/ovens/O9').expect(404);
    await staff.technician.get('/api/insight/ovens/O2?baseFirst=1').expect(400);
    await staff.technician.get('/api/insight/ovens/O2?baseFirst=5&baseLast=400').expect(400);
  });
  it('is for technicians and managers', async () => {
    await staff.counter.get('/api/insight/ovens').expect(403);
    await staff.office.get('/api/insight/ovens/O1').expect(403);
  });
});

describe('the day of a point', () => {
  it('is that of the load the job was stripped from, not of a later one', async () => {
    const job = await BenchJob.book({ staff, meters }, 1);
    await job.toCoreBefore();
    await job.record('core-test-before', job.ring('1 before'));
    await job.moveTo('awaiting-approval');
    await job.quoteApproved();
    await job.moveTo('strip-and-burnout');
    const load = (day: string) => staff.technician.post('/api/burnouts', { ovenId: 'O1', day, jobs: [{ jobId: job.id, ringsOff: false }], remark: '', countedAndSampled: true }).expect(201);
    await load('2026-02-28');
    await job.record('strip', job.strip());
    await job.moveTo('core-test-after');
    await job.record('core-test-after', job.ring('1 after'));
    shop.clock.forward(9 * 24 * 3_600_000);
    const again = await shop.person(['technician']);
    await again.post('/api/burnouts', { ovenId: 'O1', day: '2026-03-11', jobs: [{ jobId: job.id, ringsOff: false }], remark: '', countedAndSampled: true }).expect(201);
    const seen = ovenInsightSchema.parse((await again.get('/api/insight/ovens/O1').expect(200)).body);
    expect(seen.points.find((p) => p.job?.id === job.id)?.day).toBe('2026-02-28');
  });
});
