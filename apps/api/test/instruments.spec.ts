import { createHash } from 'node:crypto';
import { readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { instrumentDetailSchema, instrumentDueListSchema, measuredPageSchema, type InstrumentDetail, type MeasuredPage } from '@shared/calibrations';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { databaseFile, uploadsDir } from '../src/database/data-folder.js';
import { openWriter } from '../src/database/data-source.js';
import { migrate } from '../src/database/migrate.js';
import { ReadDb } from '../src/database/read-db.js';
import { BenchJob, staffAndMeters } from './job-on-the-bench.js';
import { temporaryDataDir } from './temporary-shop.js';
import { openTestShop, type Person, type TestShop } from './test-app.js';

let shop: TestShop;
let house: Awaited<ReturnType<typeof staffAndMeters>>;
let technician: Person;
beforeAll(async () => {
  shop = await openTestShop();
  house = await staffAndMeters(shop);
  technician = house.staff.technician;
});
afterAll(() => shop.close());

const instrument = (more: object = {}) => ({ tag: 'W-01', kind: 'wattmeter', description: 'low power factor', serial: 'W0932', percentOfReading: 0.3, percentOfRange: 0.1, rangeText: '0 to 600 W', calibratedOn: '2025-03-10', dueOn: '2026-03-10', certificateNumber: 'K-25-0120', ...more });
const added = async (more: object = {}) => (await technician.post('/api/instruments', instrument(more)).expect(201)).body as { id: string; version: number };
const detail = async (id: string): Promise<InstrumentDetail> => instrumentDetailSchema.parse((await technician.get(`/api/instruments/${id}`).expect(200)).body);
const calibration = (more: object = {}) => ({ calibratedOn: '2026-02-27', dueOn: '2027-02-27', certificateNumber: 'K-26-0120', laboratory: 'Town calibration service', asFound: 'within', asFoundWords: '', percentOfReading: 0.3, percentOfRange: 0.1, ...more });
const calibrate = (id: string, version: number, more: object = {}, by = technician) => by.post(`/api/instruments/${id}/calibrations`, { version, ...calibration(more) });
const PDF = Buffer.from('%PDF-1.7\n1 0 obj<</Type/Catalog>>endobj\ntrailer<</Root 1 0 R>>\n%%EOF\n');
const stored = () => readdirSync(uploadsDir(shop.config.dataDir));

describe('the calibrations of an instrument', () => {
  it('begin with what the register was told when it was added', async () => {
    const { id } = await added();
    const { instrument: one, calibrations } = await detail(id);
    expect(one).toMatchObject({ tag: 'W-01', standing: 'due-soon', daysLeft: 8, notCounted: false });
    expect(calibrations).toEqual([expect.objectContaining({ calibratedOn: '2025-03-10', dueOn: '2026-03-10', certificateNumber: 'K-25-0120', asFound: 'not-stated', by: 'Tess Technician', doubtFrom: null, superseded: false, certificate: null })]);
  });

  it('a new one goes on top, sets the register, and stands in the history', async () => {
    const { id, version } = await added({ tag: 'W-02' });
    const answer = instrumentDetailSchema.parse((await calibrate(id, version).expect(201)).body);
    expect(answer.instrument).toMatchObject({ calibratedOn: '2026-02-27', dueOn: '2027-02-27', certificateNumber: 'K-26-0120', version: 2, standing: 'in-calibration' });
    expect(answer.calibrations.map((c) => [c.calibratedOn, c.asFound, c.laboratory, c.doubtFrom])).toEqual([
      ['2026-02-27', 'within', 'Town calibration service', '2025-03-10'],
      ['2025-03-10', 'not-stated', '', null],
    ]);
    const [entry] = await shop.app.get(ReadDb).all<{ words: string }>("SELECT words FROM history WHERE event = 'instrument.calibrated' AND subjectId = ?", [id]);
    expect(entry!.words).toBe('W-02 calibrated on 2026-02-27, due again on 2027-02-27.');
  });

  it('an older certificate that turns up late fills the history and leaves the register alone', async () => {
    const { id, version } = await added({ tag: 'W-03' });
    const answer = instrumentDetailSchema.parse((await calibrate(id, version, { calibratedOn: '2024-03-04', dueOn: '2025-03-04' }).expect(201)).body);
    expect(answer.instrument).toMatchObject({ calibratedOn: '2025-03-10', version: 1 });
    expect(answer.calibrations.map((c) => c.calibratedOn)).toEqual(['2025-03-10', '2024-03-04']);
  });

  it('a slip in the register is put right by a further entry of the same day, and what the laboratory found stays', async () => {
    const { id, version } = await added({ tag: 'W-04' });
    await calibrate(id, version, { asFound: 'outside', asFoundWords: 'Read 2.1 % high at 400 W.' }).expect(201);
    await technician.put(`/api/instruments/${id}`, { ...instrument({ tag: 'W-04', calibratedOn: '2026-02-27', dueOn: '2027-02-26', certificateNumber: 'K-26-0121' }), version: 2 }).expect(200);
    const { calibrations } = await detail(id);
    expect(calibrations.map((c) => [c.certificateNumber, c.asFound, c.superseded])).toEqual([
      ['K-26-0121', 'outside', false],
      ['K-26-0120', 'outside', true],
      ['K-25-0120', 'not-stated', false],
    ]);
    await technician.put(`/api/instruments/${id}`, { ...instrument({ tag: 'W-04', calibratedOn: '2026-02-27', dueOn: '2027-02-26', certificateNumber: 'K-26-0121', description: 'new case' }), version: 3 }).expect(200);
    expect((await detail(id)).calibrations).toHaveLength(3);
  });

  it.each([
    ['due before it was made', { dueOn: '2026-02-27' }, 'dueOn'],
    ['of a day to come', { calibratedOn: '2026-03-03' }, 'calibratedOn'],
    ['found outside without saying what', { asFound: 'outside' }, 'asFoundWords'],
    ['with a finding nobody knows', { asFound: 'fine' }, 'asFound'],
    ['with limits of error as text', { percentOfReading: '0.3' }, 'percentOfReading'],
  ])('one %s is refused at its field', async (what, more, path) => {
    const { id, version } = await added({ tag: `X ${what}`.slice(0, 20) });
    const answer = await calibrate(id, version, more);
    expect(answer.status).toBe(400);
    expect((answer.body.fields as { path: string }[]).map((f) => f.path)).toEqual([path]);
    expect((await detail(id)).calibrations).toHaveLength(1);
  });

  it('written by two at once: the second is told that the instrument changed', async () => {
    const { id, version } = await added({ tag: 'W-05' });
    const answers = await Promise.all([calibrate(id, version), calibrate(id, version, {}, house.staff.manager)]);
    expect(answers.map((a) => a.status).sort()).toEqual([201, 409]);
    expect(answers.find((a) => a.status === 409)!.body).toMatchObject({ code: 'CHANGED_MEANWHILE', current: { version: 2, dueOn: '2027-02-27' } });
  });

  it('counter and office neither read nor write them, and one that is not there is not there', async () => {
    const { id, version } = await added({ tag: 'W-06' });
    for (const person of [house.staff.counter, house.staff.office]) {
      await person.get(`/api/instruments/${id}`).expect(403);
      await person.get(`/api/instruments/${id}/records`).expect(403);
      await calibrate(id, version, {}, person).expect(403);
    }
    await technician.get('/api/instruments/01900000-0000-7000-8000-000000000000').expect(404);
    await technician.get('/api/instruments/01900000-0000-7000-8000-000000000000/records').expect(404);
  });
});

describe('what is due', () => {
  it('lists what is overdue first, then what comes due within thirty days, and nothing else', async () => {
    await added({ tag: 'D-late', calibratedOn: '2025-01-20', dueOn: '2026-01-20' });
    await added({ tag: 'D-grace', calibratedOn: '2025-02-20', dueOn: '2026-02-20' });
    await added({ tag: 'D-thirty', calibratedOn: '2025-04-01', dueOn: '2026-04-01' });
    await added({ tag: 'D-thirtyone', calibratedOn: '2025-04-02', dueOn: '2026-04-02' });
    const list = instrumentDueListSchema.parse((await technician.get('/api/instruments/due').expect(200)).body).filter((i) => i.tag.startsWith('D-'));
    expect(list.map((i) => [i.tag, i.standing, i.daysLeft, i.notCounted])).toEqual([
      ['D-late', 'overdue', -41, true],
      ['D-grace', 'overdue', -10, false],
      ['D-thirty', 'due-soon', 30, false],
    ]);
  });
});

describe('the certificate as a file', () => {
  const send = (id: string, calibrationId: string, bytes: Buffer, name: string, by = technician) => by.post(`/api/instruments/${id}/calibrations/${calibrationId}/certificate`).attach('file', bytes, name);

  it('is kept under a name nobody can guess, handed out to be saved, and known by its hash', async () => {
    const { id } = await added({ tag: 'C-01' });
    const [first] = (await detail(id)).calibrations;
    const answer = instrumentDetailSchema.parse((await send(id, first!.id, PDF, '../Prüfschein K-25.pdf').expect(201)).body);
    const { certificate } = answer.calibrations[0]!;
    expect(certificate).toMatchObject({ name: 'Prüfschein K-25.pdf', sizeBytes: PDF.length, by: 'Tess Technician' });
    const got = await technician.get(`/api/instruments/${id}/certificates/${certificate!.id}`).buffer(true).expect(200);
    expect(got.headers).toMatchObject({ 'content-type': 'application/pdf', 'x-content-type-options': 'nosniff' });
    expect(got.headers['content-disposition']).toMatch(/^attachment; filename="Prufschein K-25\.pdf"/);
    expect(got.body).toEqual(PDF);
    const [entry] = await shop.app.get(ReadDb).all<{ data: string }>("SELECT data FROM history WHERE event = 'instrument.certificate-added' AND subjectId = ?", [id]);
    expect(JSON.parse(entry!.data)).toMatchObject({ sha256: createHash('sha256').update(PDF).digest('hex') });
    expect(stored().every((name) => /^[0-9a-f]{40}\.pdf$/.test(name))).toBe(true);
  });

  it.each([
    ['a picture', Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13, 0x49, 0x48, 0x44, 0x52, 0, 0, 0, 1, 0, 0, 0, 1, 8, 2, 0, 0, 0]), 'certificate.pdf'],
    ['a page with a script', Buffer.from('<html><script>alert(1)</script></html>'), 'certificate.pdf'],
    ['nothing at all', Buffer.alloc(0), 'certificate.pdf'],
  ])('%s is refused, and nothing of it stays on the disk', async (what, bytes, name) => {
    const { id } = await added({ tag: `C ${what}`.slice(0, 20) });
    const [first] = (await detail(id)).calibrations;
    const before = stored().length;
    const answer = await send(id, first!.id, bytes, name);
    expect([answer.status, answer.body.code]).toEqual([422, 'FILE_NOT_ACCEPTED']);
    expect(stored()).toHaveLength(before);
  });

  it('of another instrument’s calibration is not there, and a damaged one is not served as if it were good', async () => {
    const [a, b] = [await added({ tag: 'C-02' }), await added({ tag: 'C-03' })];
    const [first] = (await detail(a.id)).calibrations;
    const before = stored().length;
    await send(b.id, first!.id, PDF, 'x.pdf').expect(404);
    await send(a.id, first!.id, PDF, 'x.pdf', house.staff.counter).expect(403);
    expect(stored()).toHaveLength(before);
    const known = new Set(stored());
    const { certificate } = instrumentDetailSchema.parse((await send(a.id, first!.id, PDF, 'x.pdf').expect(201)).body).calibrations[0]!;
    await technician.get(`/api/instruments/${b.id}/certificates/${certificate!.id}`).expect(404);
    const file = stored().find((name) => !known.has(name))!;
    writeFileSync(join(uploadsDir(shop.config.dataDir), file), 'something else');
    expect((await technician.get(`/api/instruments/${a.id}/certificates/${certificate!.id}`)).body).toMatchObject({ statusCode: 500, code: 'INTERNAL', message: expect.stringContaining('backup') });
  });
});

describe('what was measured with an instrument', () => {
  /** A later moment, for which everybody signs in anew. */
  async function later(instant: string): Promise<void> {
    shop.clock.set(new Date(instant));
    technician = await shop.person(['technician'], { name: 'Tess Technician' });
    Object.assign(house.staff, { technician, counter: await shop.person(['counter']), manager: await shop.person(['manager']) });
  }
  const measured = async (id: string, query = ''): Promise<MeasuredPage> => measuredPageSchema.parse((await technician.get(`/api/instruments/${id}/records${query}`).expect(200)).body);

  it('is found from the records, by the day they were made, with job, customer and verdict', async () => {
    const job = await BenchJob.book(house, 12);
    await job.toCoreAfter('12 before');
    await later('2026-03-05T23:30:00.000Z');
    const after = await job.record('core-test-after', job.ring('12 after'));
    const wattmeter = (house.meters as Record<string, string>)['wattmeter']!;
    const page = await measured(wattmeter);
    expect(page.total).toBe(2);
    expect(page.rows[0]).toMatchObject({ recordId: after.id, kind: 'core-test-after', revision: 1, superseded: false, verdict: 'inconclusive', by: 'Tess Technician', jobId: job.id, customerName: expect.any(String), certificateNumber: null, dueOnThen: '2026-09-01', overdueThen: false });
    expect(page.rows.map((r) => r.kind)).toEqual(['core-test-after', 'core-test-before']);
    // half past eleven at night in Greenwich is half an hour into the sixth of March in the shop
    expect((await measured(wattmeter, '?from=2026-03-06&to=2026-03-06')).rows.map((r) => r.recordId)).toEqual([after.id]);
    expect((await measured(wattmeter, '?from=2026-03-07')).rows).toEqual([]);
    expect((await measured(wattmeter, '?to=2026-03-05')).rows.map((r) => r.kind)).toEqual(['core-test-before']);
    expect((await measured(wattmeter, '?to=9999-12-31&size=1&page=2')).rows.map((r) => r.kind)).toEqual(['core-test-before']);
    expect((await measured((house.meters as Record<string, string>)['surge-tester']!)).total).toBe(0);
    const refused = await technician.get(`/api/instruments/${wattmeter}/records?from=2026-03-06&to=2026-03-05`);
    expect([refused.status, refused.body.fields[0].path]).toEqual([400, 'to']);
  });

  it('a record corrected to another instrument still tells that the first one was used, and that it is past', async () => {
    const job = await BenchJob.book(house, 12);
    await job.toCoreBefore();
    await later('2026-03-06T08:00:00.000Z');
    const record = await job.record('core-test-before', job.ring('12 before'));
    const wattmeter = (house.meters as Record<string, string>)['wattmeter']!;
    const other = await added({ tag: 'W-other', calibratedOn: '2025-12-01', dueOn: '2026-12-01' });
    const readings = job.ring('12 before');
    await technician.post(`/api/records/${record.id}/revisions`, { version: 1, reason: 'It was the other wattmeter.', record: { kind: 'core-test-before', readings: { ...readings, instruments: { ...readings.instruments, wattmeterId: other.id } }, entered: {} } }).expect(201);
    expect((await measured(wattmeter)).rows.find((r) => r.recordId === record.id)).toMatchObject({ revision: 1, superseded: true });
    expect((await measured(other.id)).rows).toEqual([expect.objectContaining({ recordId: record.id, revision: 2, superseded: false })]);
  });

  it('found outside later, the doubt begins at the calibration before, and the list names the jobs to look at', async () => {
    const wattmeter = (house.meters as Record<string, string>)['wattmeter']!;
    const { instrument: one } = await detail(wattmeter);
    const answer = instrumentDetailSchema.parse((await calibrate(wattmeter, one.version, { calibratedOn: '2026-03-06', dueOn: '2027-03-06', asFound: 'outside', asFoundWords: 'Read 2.1 % high at 400 W.' }).expect(201)).body);
    const [newest] = answer.calibrations;
    expect(newest).toMatchObject({ asFound: 'outside', doubtFrom: '2025-09-01' });
    const affected = await measured(wattmeter, `?from=${newest!.doubtFrom}&to=${newest!.calibratedOn}`);
    expect(affected.total).toBe(3);
    expect(new Set(affected.rows.map((r) => r.jobId)).size).toBe(2);
  });
});

describe('a shop from before calibrations had a history', () => {
  it('finds what its register knew as the beginning of it', async () => {
    const { dataDir, remove } = temporaryDataDir();
    try {
      await migrate(dataDir, '2026-03-02T09:00:00.000Z');
      const old = await openWriter(databaseFile(dataDir));
      await old.query('DROP TABLE instrument_certificates');
      await old.query('DROP TABLE instrument_calibrations');
      await old.query("DELETE FROM migrations WHERE name LIKE 'InstrumentCalibrations%'");
      await old.query("INSERT INTO instruments (id, tag, kind, description, serial, percentOfReading, percentOfRange, rangeText, calibratedOn, dueOn, certificateNumber, version) VALUES ('01900000-0000-7000-8000-000000000001', 'V-01', 'voltmeter', '', '', 0.2, 0.05, '', '2025-09-01', '2026-09-01', 'K-25-0118', 4)");
      await old.destroy();
      expect((await migrate(dataDir, '2026-03-03T09:00:00.000Z')).applied).toEqual([expect.stringMatching(/^InstrumentCalibrations/)]);
      const now = await openWriter(databaseFile(dataDir));
      expect(await now.query('SELECT instrumentId, calibratedOn, dueOn, certificateNumber, asFound, percentOfReading, byName FROM instrument_calibrations')).toEqual([
        { instrumentId: '01900000-0000-7000-8000-000000000001', calibratedOn: '2025-09-01', dueOn: '2026-09-01', certificateNumber: 'K-25-0118', asFound: 'not-stated', percentOfReading: 0.2, byName: '' },
      ]);
      await expect(now.query('DELETE FROM instrument_calibrations')).rejects.toThrow('append only');
      await now.destroy();
    } finally {
      remove();
    }
  });
});
