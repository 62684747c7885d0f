import { readdirSync } from 'node:fs';
import { request as httpRequest } from 'node:http';
import type { AddressInfo } from 'node:net';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { jobLoadsSchema, loadPageSchema, loadViewSchema, waitingJobsSchema, type LoadView } from '@shared/burnouts';
import { ReadDb } from '../src/database/read-db.js';
import { uploadsDir } from '../src/database/data-folder.js';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { ShopService } from '../src/shop/shop.service.js';
import { BenchJob, staffAndMeters, type Staff } from './job-on-the-bench.js';
import { openTestShop, type TestShop } from './test-app.js';

let shop: TestShop;
let staff: Staff;
let meters: Record<string, string>;
/** cast iron, core plate unknown: 370 °C; and one in an aluminium frame: 300 °C */
let iron: BenchJob;
let aluminium: BenchJob;

beforeAll(async () => {
  shop = await openTestShop();
  await shop.app.listen(0, '127.0.0.1');
  await shop.app.get(UnitOfWork).run((manager) => shop.app.get(ShopService).write(manager, 'bay', { supplies: [], cables: [], ovens: [{ id: 'O1', name: 'O1', remark: '' }, { id: 'O2', name: 'Big oven', remark: '' }] }));
  ({ staff, meters } = await staffAndMeters(shop));
  iron = await atTheStrip(1);
  aluminium = await atTheStrip(10, { frameMaterial: 'aluminium' });
});
afterAll(() => shop.close());

async function atTheStrip(machine: 1 | 10, dismantling: object = {}): Promise<BenchJob> {
  const job = await BenchJob.book({ staff, meters }, machine);
  const plain = job.dismantling.bind(job);
  job.dismantling = () => plain(dismantling);
  await job.toCoreBefore();
  await job.record('core-test-before', job.ring(`${machine} before`));
  await job.moveTo('awaiting-approval');
  await job.quoteApproved();
  await job.moveTo('strip-and-burnout');
  return job;
}

const load = (jobs: readonly BenchJob[], more: object = {}) => ({ ovenId: 'O2', day: '2026-03-02', jobs: jobs.map((j) => ({ jobId: j.id, ringsOff: false })), remark: '', countedAndSampled: true, ...more });
async function loaded(jobs: readonly BenchJob[]): Promise<LoadView> {
  return loadViewSchema.parse((await staff.technician.post('/api/burnouts', load(jobs)).expect(201)).body);
}
const send = (to: LoadView, text: string | Buffer, query = '') => staff.technician.post(`/api/burnouts/${to.id}/file?version=${to.version}${query}`).attach('file', Buffer.isBuffer(text) ? text : Buffer.from(text), 'night run.csv');
const taken = async (to: LoadView, text: string | Buffer, query = '') => loadViewSchema.parse((await send(to, text, query).expect(201)).body);
const correction = (of: LoadView, more: object = {}) => ({ version: of.version, reason: 'Looked again.', ovenId: of.ovenId, day: of.day, jobs: of.jobs.map((j) => ({ jobId: j.jobId, ringsOff: j.ringsOff })), remark: of.remark, partChannels: null, offsetK: 0, ...more });
const stored = () => readdirSync(uploadsDir(shop.config.dataDir));

/** Minutes from cold to the peak and back; the air of the oven stands fifty over the part. */
function night(peakC: number, decimal = '.', separator = ','): string {
  const figure = (c: number) => c.toFixed(1).replace('.', decimal);
  const rows = Array.from({ length: 601 }, (_, minute) => {
    const c = 20 + (peakC - 20) * Math.max(0, 1 - Math.abs(minute - 300) / 300);
    return [clock(minute), figure(c), figure(c + 50)].join(separator);
  });
  return `Time${separator}Core (°C)${separator}Chamber air (°C)\n${rows.join('\n')}\n`;
}
const clock = (minute: number) => `2026-03-02 ${String(Math.floor(minute / 60)).padStart(2, '0')}:${String(minute % 60).padStart(2, '0')}:00`;

describe('a load before it is burnt', () => {
  it('those who wait at the strip are shown with the limit of their part', async () => {
    const waiting = waitingJobsSchema.parse((await staff.counter.get('/api/burnouts/waiting').expect(200)).body);
    expect(waiting.map((w) => [w.jobId, w.own?.limitC, w.own?.limitReason])).toEqual([
      [iron.id, 370, 'unknown'],
      [aluminium.id, 300, 'aluminium'],
    ]);
  });

  // limits: core plate ANSI/EASA AR100-2015 3.3; aluminium frame common practice
  it('of two jobs the lower limit counts for both', async () => {
    const view = await loaded([iron, aluminium]);
    expect(view).toMatchObject({ limitC: 300, limitReason: 'aluminium', verdict: null, ovenName: 'Big oven', file: null });
    expect(view.jobs.map((j) => j.limitC)).toEqual([370, 300]);
  });

  it.each([
    ['an oven the bay does not have', { ovenId: 'O9' }, 'ovenId'],
    ['a day to come', { day: '2026-03-03' }, 'day'],
    ['a job nobody knows', { jobs: [{ jobId: '01900000-0000-7000-8000-000000000000', ringsOff: false }] }, 'jobs.0.jobId'],
  ])('%s is refused at its field', async (_what, wrong, path) => {
    const answer = await staff.technician.post('/api/burnouts', load([iron], wrong));
    expect([answer.status, answer.body.code, answer.body.fields.map((f: { path: string }) => f.path)]).toEqual([422, 'READINGS_NOT_VALID', [path]]);
  });

  it('is not taken before the wires are counted and a coil is kept', async () => {
    const answer = await staff.technician.post('/api/burnouts', load([iron], { countedAndSampled: false }));
    expect([answer.status, answer.body.fields[0].path]).toEqual([400, 'countedAndSampled']);
  });

  it('a job that has not come to the strip stays out', async () => {
    const early = await BenchJob.book({ staff, meters }, 1);
    const answer = await staff.technician.post('/api/burnouts', load([early]));
    expect(answer.body.fields).toMatchObject([{ path: 'jobs.0.jobId', code: 'not-there-yet' }]);
  });

  it('slip rings must be off, and said to be', async () => {
    const rings = await atTheStrip(1, { commutatorOrSlipRings: true });
    const refused = await staff.technician.post('/api/burnouts', load([rings]));
    expect(refused.body.fields).toMatchObject([{ path: 'jobs.0.ringsOff', code: 'rings-on' }]);
    await staff.technician.post('/api/burnouts', load([rings], { jobs: [{ jobId: rings.id, ringsOff: true }] })).expect(201);
  });

  it('office and counter look, technicians and managers load', async () => {
    await staff.counter.post('/api/burnouts', load([iron])).expect(403);
    await staff.office.get('/api/burnouts').expect(200);
  });
});

describe('what the logger wrote', () => {
  it('a load over its limit marks every job in it, also the one whose own part stands more', async () => {
    const view = await taken(await loaded([iron, aluminium]), night(356));
    expect(view).toMatchObject({ verdict: 'does-not-conform', hottest: 'Core', peakC: 356, limitC: 300 });
    expect(view.reasons).toEqual([{ code: 'over-limit', channel: 'Core', peakC: 356, overK: 56 }]);
    for (const [job, own] of [[iron, { limitC: 370, limitReason: 'unknown', overK: -14 }], [aluminium, { limitC: 300, limitReason: 'aluminium', overK: 56 }]] as const) {
      const [mine] = jobLoadsSchema.parse((await staff.counter.get(`/api/jobs/${job.id}/burnouts`).expect(200)).body);
      expect(mine).toMatchObject({ id: view.id, verdict: 'does-not-conform', own, others: 1 });
      expect((await staff.counter.get(`/api/jobs/${job.id}/history`)).body[0]).toMatchObject({ event: 'burnout.read', words: expect.stringContaining('56 K over') });
    }
  });

  it('the time above stands beside it, by straight lines between the readings', async () => {
    const view = await taken(await loaded([iron]), night(356));
    // slope 336 K in 300 min on either side of the peak: 11 K over 345 take 2 · 11/1.12 min
    expect(view.minutesAbove345C).toBeCloseTo((2 * 11) / 1.12, 1);
    expect(view).toMatchObject({ verdict: 'conforms', minutesAboveLimit: 0, reasons: [] });
  });

  it('the air of the oven is not the part, unless the technician says that it hung on it', async () => {
    const view = await taken(await loaded([iron]), night(356));
    expect(view.file!.channels.map((c) => [c.name, c.onPart])).toEqual([['Core', true], ['Chamber air', false]]);
    const corrected = loadViewSchema.parse((await staff.technician.put(`/api/burnouts/${view.id}`, correction(view, { partChannels: ['Chamber air'] })).expect(200)).body);
    expect(corrected).toMatchObject({ verdict: 'does-not-conform', hottest: 'Chamber air', peakC: 406 });
    const none = loadViewSchema.parse((await staff.technician.put(`/api/burnouts/${view.id}`, correction(corrected, { partChannels: [] })).expect(200)).body);
    expect(none).toMatchObject({ verdict: 'not-valid', peakC: null, reasons: [{ code: 'nothing-on-the-part' }] });
  });

  it('reads decimal commas between semicolons, and says by line what was no temperature', async () => {
    const text = night(356, ',', ';').replace('2026-03-02 04:00:00;288,8', '2026-03-02 04:00:00;open').replace('2026-03-02 00:20:00;42,4', '2026-03-02 00:20:00;42.4');
    const view = await taken(await loaded([iron]), text);
    expect(view.file).toMatchObject({ separator: ';', decimalMark: ',', rows: 601, problemCount: 2 });
    expect(view.file!.problems).toMatchObject([
      { code: 'other-decimal-mark', line: 22, channel: 'Core' },
      { code: 'text-in-number', line: 242, channel: 'Core', message: 'Line 242, Core: "open" is no temperature.' },
    ]);
    expect(view.peakC).toBe(356);
  });

  it('rows out of order are put in their place, and named', async () => {
    const lines = night(356).split('\n');
    [lines[250], lines[251]] = [lines[251]!, lines[250]!];
    const view = await taken(await loaded([iron]), lines.join('\n'));
    expect(view.file!.problems).toMatchObject([{ code: 'wrong-order', line: 252 }]);
    expect(view.minutesAbove345C).toBeCloseTo((2 * 11) / 1.12, 1);
  });

  it('a gap in which the part may have gone over its limit leaves the load open', async () => {
    const gap = (from: number, to: number) => (line: string) => {
      const minute = Number(line.slice(11, 13)) * 60 + Number(line.slice(14, 16));
      return !(minute > from && minute < to);
    };
    const hidden = await taken(await loaded([iron]), night(372).split('\n').filter(gap(285, 315)).join('\n'));
    expect([hidden.verdict, hidden.peakC]).toEqual(['inconclusive', 354.4]);
    const [reason] = hidden.reasons;
    if (reason?.code !== 'gap-may-hide-it') throw new Error('no gap was named');
    expect([reason.fromMinute, reason.toMinute]).toEqual([285, 315]);
    // heating and cooling 352/300 K/min: a quarter of an hour up from 354.4 °C, and down again
    expect(reason.reachC).toBeCloseTo(354.4 + 15 * (352 / 300), 0);
    const harmless = await taken(await loaded([iron]), night(365).split('\n').filter(gap(100, 115)).join('\n'));
    expect(harmless.verdict).toBe('conforms');
  });

  it('two hundred thousand rows go by in pieces', async () => {
    const start = Date.UTC(2026, 2, 1);
    const rows = Array.from({ length: 200_000 }, (_, i) => `${new Date(start + i * 1000).toISOString().slice(0, 19).replace('T', ' ')},${(20 + 330 * Math.sin((Math.PI * i) / 200_000)).toFixed(2)}`);
    const before = process.memoryUsage().heapUsed;
    const view = await taken(await loaded([iron]), `Time,Core 1 (°C)\n${rows.join('\n')}\n`);
    expect(view.file).toMatchObject({ rows: 200_000, problemCount: 0, stepS: 1 });
    expect(view.peakC).toBeCloseTo(350, 2);
    const [channel] = view.file!.channels;
    if (channel?.outcome !== 'read') throw new Error('the channel was not read');
    expect(channel.curve.length).toBeLessThanOrEqual(2000);
    expect(Math.max(...channel.curve.map(([, c]) => c))).toBeCloseTo(350, 1);
    expect(process.memoryUsage().heapUsed - before).toBeLessThan(200_000_000);
  });

  it('a file of two-byte letters, as spreadsheets save them, is read too', async () => {
    const bytes = Buffer.concat([Buffer.from([0xff, 0xfe]), Buffer.from(night(356).replaceAll(',', '\t'), 'utf16le')]);
    expect((await taken(await loaded([iron]), bytes)).peakC).toBe(356);
  });
});

describe('a file that is none', () => {
  it.each([
    ['a picture', Buffer.from([0x89, 0x50, 0x4e, 0x47, 0, 0, 0, 13, 10, 0]), 'not-text', 'file'],
    ['a letter', Buffer.from('Dear all,\nthe oven is fine.\nYours\n'), 'no-table', 'file'],
    ['nothing', Buffer.alloc(0), 'empty-file', 'file'],
    ['times in numbers of nobody knows what', Buffer.from('t,Core (°C)\n0,20\n1,30\n2,40\n'), 'elapsed-unit-unknown', 'elapsedUnit'],
  ])('%s is refused in words, and nothing of it stays on the disk', async (_what, bytes, code, path) => {
    const view = await loaded([iron]);
    const before = stored();
    const answer = await send(view, bytes);
    expect([answer.status, answer.body.code, answer.body.fields[0].code, answer.body.fields[0].path]).toEqual([422, 'FILE_NOT_ACCEPTED', code, path]);
    expect(answer.body.message.length).toBeGreaterThan(15);
    expect(stored()).toEqual(before);
    expect(loadViewSchema.parse((await staff.technician.get(`/api/burnouts/${view.id}`)).body)).toEqual(view);
  });

  it('what the file leaves open may be said with it', async () => {
    const minutes = Array.from({ length: 300 }, (_, i) => `${i},${20 + (i < 150 ? i : 300 - i) * 2.2}`).join('\n');
    const view = await taken(await loaded([iron]), `t,Core (°C)\n${minutes}\n`, '&elapsedUnit=min');
    expect(view.file!.minutes).toBe(299);
  });

  it('the record of a day on which the part was never hot is no burnout', async () => {
    const view = await taken(await loaded([iron]), night(120));
    expect(view).toMatchObject({ verdict: 'not-valid', reasons: [{ code: 'never-hot', peakC: 120 }] });
  });
});

describe('a file of more than sixty megabytes', () => {
  const MB = 1024 * 1024;
  /** Sends until it is answered; tells how much had gone by then, and what the process grew by. */
  async function pour(declared: boolean): Promise<{ status: number; code: string; sentMb: number; grewMb: number }> {
    const to = await loaded([iron]);
    const { port } = shop.app.getHttpServer().address() as AddressInfo;
    const head = Buffer.from('--xx\r\nContent-Disposition: form-data; name="file"; filename="year.csv"\r\nContent-Type: text/csv\r\n\r\n');
    const tail = Buffer.from('\r\n--xx--\r\n');
    const before = process.memoryUsage().rss;
    let [sent, peak, answered] = [0, before, false];
    return new Promise((resolve, reject) => {
      const headers = { origin: 'http://shop.test', ...staff.technician.carries(), 'content-type': 'multipart/form-data; boundary=xx', ...(declared ? { 'content-length': head.length + 70 * MB + tail.length } : {}) };
      const req = httpRequest({ port, host: '127.0.0.1', method: 'POST', path: `/api/burnouts/${to.id}/file?version=${to.version}`, headers }, (res) => {
        answered = true;
        const chunks: Buffer[] = [];
        res.on('data', (c: Buffer) => chunks.push(c));
        res.on('end', () => {
          req.destroy();
          resolve({ status: res.statusCode!, code: (JSON.parse(Buffer.concat(chunks).toString()) as { code: string }).code, sentMb: sent / MB, grewMb: (peak - before) / MB });
        });
      });
      req.on('error', (error) => (answered ? undefined : reject(error)));
      const rows = Buffer.from('2026-03-02 04:00:00,288.8\n'.repeat(10_000));
      const more = (): void => {
        if (answered) return;
        peak = Math.max(peak, process.memoryUsage().rss);
        if (sent >= 70 * MB) return void req.end(tail);
        sent += rows.length;
        req.write(rows, () => setTimeout(more, 1));
      };
      req.write(head, more);
    });
  }

  it('said beforehand, it is refused before it is sent', async () => {
    const answer = await pour(true);
    expect(answer).toMatchObject({ status: 413, code: 'FILE_TOO_LARGE' });
    expect(answer.sentMb).toBeLessThan(10);
  });

  it('not said beforehand, it is refused at the limit, and leaves nothing', async () => {
    const before = stored();
    const answer = await pour(false);
    expect(answer).toMatchObject({ status: 413, code: 'FILE_TOO_LARGE' });
    expect(answer.sentMb).toBeGreaterThan(59);
    expect(answer.grewMb).toBeLessThan(80);
    expect(stored()).toEqual(before);
  });
});

describe('what is put right afterwards', () => {
  it('a thermocouple found to read low brings the load over its limit, with the reason in every job’s history', async () => {
    const view = await taken(await loaded([iron]), night(362));
    expect(view.verdict).toBe('conforms');
    const corrected = loadViewSchema.parse((await staff.technician.put(`/api/burnouts/${view.id}`, correction(view, { reason: 'Sensor reads 11 K low.', offsetK: 11 })).expect(200)).body);
    expect(corrected).toMatchObject({ verdict: 'does-not-conform', peakC: 373, offsetK: 11, version: view.version + 1 });
    const [entry] = (await staff.counter.get(`/api/jobs/${iron.id}/history`)).body;
    expect(entry).toMatchObject({ event: 'burnout.corrected', data: { from: { verdict: 'conforms', peakC: 362 }, to: { verdict: 'does-not-conform', peakC: 373, offsetK: 11 } } });
    expect(entry.words).toContain('Sensor reads 11 K low.');
  });

  it('a job taken out of the load is told so, and does not show it any more', async () => {
    const view = await taken(await loaded([iron, aluminium]), night(356));
    const corrected = loadViewSchema.parse((await staff.technician.put(`/api/burnouts/${view.id}`, correction(view, { reason: 'Wrong job.', jobs: [{ jobId: iron.id, ringsOff: false }] })).expect(200)).body);
    expect(corrected).toMatchObject({ limitC: 370, verdict: 'conforms' });
    const loads = jobLoadsSchema.parse((await staff.counter.get(`/api/jobs/${aluminium.id}/burnouts`)).body);
    expect(loads.map((l) => l.id)).not.toContain(view.id);
    expect((await staff.counter.get(`/api/jobs/${aluminium.id}/history`)).body[0].event).toBe('burnout.corrected');
  });

  it('when the dismantling is corrected, the load says that its limit is another now', async () => {
    const job = await atTheStrip(1, { corePlate: 'inorganic' });
    const view = await taken(await loaded([job]), night(390));
    expect(view).toMatchObject({ limitC: 400, verdict: 'conforms' });
    const record = (await staff.counter.get(`/api/jobs/${job.id}/records`)).body.find((r: { kind: string }) => r.kind === 'dismantling');
    await staff.technician.post(`/api/records/${record.id}/revisions`, { version: record.version, reason: 'No letter of the maker after all.', record: { kind: 'dismantling', readings: { ...record.readings, corePlate: 'unknown' }, entered: {} } }).expect(201);
    const stale = loadViewSchema.parse((await staff.technician.get(`/api/burnouts/${view.id}`)).body);
    expect([stale.limitC, stale.jobs[0]!.limitChanged]).toEqual([400, true]);
    const judged = loadViewSchema.parse((await staff.technician.put(`/api/burnouts/${view.id}`, correction(stale, { partChannels: ['Core'] })).expect(200)).body);
    expect(judged).toMatchObject({ limitC: 370, verdict: 'does-not-conform', jobs: [{ limitChanged: false }] });
  });

  it('a second file takes the place of the first only with a reason', async () => {
    const view = await taken(await loaded([iron]), night(356));
    const refused = await send(view, night(350));
    expect([refused.status, refused.body.code]).toEqual([409, 'ALREADY_DONE']);
    expect((await taken(view, night(350), '&reason=That%20was%20the%20night%20before.')).peakC).toBe(350);
  });

  it('two who change it at once are told apart, and a stale file leaves nothing behind', async () => {
    const view = await loaded([iron]);
    await taken(view, night(356));
    const before = stored();
    const late = await send(view, night(350));
    expect([late.status, late.body.code]).toEqual([409, 'CHANGED_MEANWHILE']);
    loadViewSchema.parse(late.body.current);
    expect((await staff.technician.put(`/api/burnouts/${view.id}`, correction(view))).status).toBe(409);
    expect(stored()).toEqual(before);
  });

  it('the logger’s file is handed out just as it came', async () => {
    const view = await taken(await loaded([iron]), night(356));
    const got = await staff.office.get(`/api/burnouts/${view.id}/file`).buffer(true).parse((res, done) => {
      const chunks: Buffer[] = [];
      res.on('data', (c: Buffer) => chunks.push(c));
      res.on('end', () => done(null, Buffer.concat(chunks)));
    });
    expect((got.body as Buffer).toString('utf8')).toBe(night(356));
    expect(got.headers['content-disposition']).toContain('attachment; filename="night run.csv"');
  });

  it('the list has every load once, newest first, and of one oven where asked', async () => {
    const page = loadPageSchema.parse((await staff.counter.get('/api/burnouts?size=200').expect(200)).body);
    const numbers = page.rows.map((r) => r.number);
    expect(numbers).toEqual([...numbers].sort((a, b) => b - a));
    expect(new Set(numbers).size).toBe(page.total);
    expect((await staff.counter.get('/api/burnouts?ovenId=O1')).body.total).toBe(0);
    expect(await shop.app.get(ReadDb).all('PRAGMA foreign_key_check')).toEqual([]);
  });
});
