import type { CoreTestResult } from '@libs/core-loss';
import type { GateCondition } from '@shared/errors';
import type { RecordView } from '@shared/records';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { beforeVarnish, finalTest } from '../../../mocks/sample-shop/machine-tests.js';
import { winding } from '../../../mocks/sample-shop/windings.js';
import { BenchJob, staffAndMeters } from './job-on-the-bench.js';
import { openTestShop, TEST_PASSWORD, type TestShop } from './test-app.js';

let shop: TestShop;
let house: Awaited<ReturnType<typeof staffAndMeters>>;
beforeAll(async () => {
  shop = await openTestShop();
  house = await staffAndMeters(shop);
});
afterAll(() => shop.close());
const book = (machine: number, more: object = {}) => BenchJob.book(house, machine, more);
const missing = (conditions: readonly GateCondition[]) => conditions.filter((c) => !c.met).map((c) => c.code);

describe('recording a core test', () => {
  it('the server computes the result again and keeps only its own', async () => {
    const job = await book(12);
    await job.toCoreBefore();
    const record = await job.record('core-test-before', job.ring('12 before'));
    const result = record.result as unknown as CoreTestResult;
    // the sample shop's figures for this reading: 1.3210 T, 3.120 W/kg referred
    expect(result.fluxDensityT).toBeCloseTo(1.321, 4);
    expect(result.wattsPerKgReferred).toBeCloseTo(3.12, 2);
    expect(record).toMatchObject({ verdict: 'conforms', revision: 1, ordinal: 1, by: 'Tess Technician' });
    expect(record.instruments.map((i) => i.tag)).toEqual(['ammeter', 'thermometer', 'voltmeter', 'wattmeter']);
  });

  it('a result sent along by the screen is refused as an unknown key', async () => {
    const job = await book(12);
    await job.toCoreBefore();
    const answer = await house.staff.technician.post(`/api/jobs/${job.id}/records`, { record: { kind: 'core-test-before', readings: job.ring('12 before'), entered: {}, result: { wattsPerKg: 1 } } });
    expect(answer.status).toBe(400);
  });

  it.each([
    ['negative turns', (r: Readings) => ({ ...r, reading: { ...r.reading, excitingTurns: -16 } }), 'reading.excitingTurns'],
    ['a slot deeper than the core', (r: Readings) => ({ ...r, geometry: { ...r.geometry, slotDepthM: 0.2 } }), 'geometry.slotDepthM'],
    ['a density of nothing', (r: Readings) => ({ ...r, geometry: { ...r.geometry, densityKgPerM3: 0 } }), 'geometry.densityKgPerM3'],
    ['a flux no steel can carry', (r: Readings) => ({ ...r, reading: { ...r.reading, searchVoltsV: 20 } }), 'reading.searchVoltsV'],
  ])('%s is named at its field, and nothing is saved', async (_, change, path) => {
    const job = await book(12);
    await job.toCoreBefore();
    const answer = await job.tryRecord('core-test-before', change(job.ring('12 before')));
    expect(answer.status).toBe(422);
    expect(answer.body.code).toBe('READINGS_NOT_VALID');
    expect((answer.body.fields as { path: string }[]).map((f) => f.path)).toContain(`record.readings.${path}`);
    expect((await house.staff.technician.get(`/api/jobs/${job.id}/records`)).body.filter((r: RecordView) => r.kind === 'core-test-before')).toEqual([]);
  });

  it('a step the job has not come to yet cannot be recorded', async () => {
    const job = await book(12);
    const answer = await job.tryRecord('core-test-after', job.ring('12 after'));
    expect(answer.body).toMatchObject({ statusCode: 409, code: 'STEP_NOT_OPEN' });
  });

  it('a test with an instrument that is overdue for more than thirty days is not valid', async () => {
    const job = await book(12);
    await job.toCoreBefore();
    const old = (await house.staff.manager.post('/api/instruments', { tag: `old-${job.id.slice(-6)}`, kind: 'wattmeter', description: '', serial: '', percentOfReading: 0.3, percentOfRange: 0.1, rangeText: '', calibratedOn: '2025-01-15', dueOn: '2026-01-15', certificateNumber: '' })).body;
    const readings = job.ring('12 before');
    const record = await job.record('core-test-before', { ...readings, instruments: { ...readings.instruments, wattmeterId: old.id } });
    expect(record.verdict).toBe('not-valid');
    expect(JSON.stringify(record.result['validityReasons'])).toContain('instrument-overdue');
    expect(missing((await job.sheet()).next!.conditions)).toContain('CORE_BEFORE');
  });

  it('the same key sent twice at once makes one record', async () => {
    const job = await book(12);
    await job.toCoreBefore();
    const key = `key-${job.id}`;
    const [first, second] = await Promise.all([job.tryRecord('core-test-before', job.ring('12 before'), key), job.tryRecord('core-test-before', job.ring('12 before'), key)]);
    expect([first.status, second.status]).toEqual([201, 201]);
    expect(first.body.id).toBe(second.body.id);
    const third = await job.tryRecord('core-test-before', job.ring('12 before'), key);
    expect(third.body.id).toBe(first.body.id);
  });
});
type Readings = ReturnType<BenchJob['ring']>;

describe('correcting a record', () => {
  it('makes a new revision with its reason, keeps the old one, and shows a stale correction both values', async () => {
    const job = await book(12);
    await job.toCoreBefore();
    const first = await job.record('core-test-before', job.ring('12 before'));
    const better = { ...job.ring('12 before'), remark: 'Read again from the sheet.' };
    const correction = { version: first.version, reason: 'Remark was missing.', record: { kind: 'core-test-before', readings: better, entered: {} } };
    const second = await house.staff.technician.post(`/api/records/${first.id}/revisions`, correction).expect(201);
    expect(second.body).toMatchObject({ revision: 2, reason: 'Remark was missing.' });
    const stale = await house.staff.technician.post(`/api/records/${first.id}/revisions`, correction);
    expect(stale.body).toMatchObject({ code: 'CHANGED_MEANWHILE', current: { revision: 2 } });
    const revisions = (await house.staff.technician.get(`/api/records/${first.id}/revisions`)).body as RecordView[];
    expect(revisions.map((r) => r.revision)).toEqual([2, 1]);
    expect(revisions[1]!.contentHash).toBe(first.contentHash);
  });

  it('of the test before asks for the test after anew', async () => {
    const job = await book(12);
    const before = await job.toCoreAfter('12 before');
    await job.record('core-test-after', { ...job.ring('12 after'), reading: { ...job.ring('12 after').reading, wattsW: 41 } });
    expect(missing((await job.sheet()).next!.conditions)).toEqual([]);
    await house.staff.technician.post(`/api/records/${before.id}/revisions`, { version: before.version, reason: 'Misread.', record: { kind: 'core-test-before', readings: job.ring('12 before'), entered: {} } }).expect(201);
    expect(missing((await job.sheet()).next!.conditions)).toContain('CORE_AFTER');
  });
});

describe('the gate before rewind', () => {
  it('stays shut for a burnt core until the customer’s answer is recorded and a manager signs a concession', async () => {
    const job = await book(2);
    await job.toCoreAfter('2 before', { partPeakC: 446, explanation: 'Thermocouple had slipped.' });
    const after = await job.record('core-test-after', job.ring('2 after'));
    expect(after.verdict).toBe('does-not-conform');
    const refused = await job.next();
    expect(refused.body.code).toBe('GATE_SHUT');
    expect(missing(refused.body.conditions)).toEqual(['CORE_AFTER', 'CUSTOMER_ANSWER']);

    const concession = (decisionId: string) => ({ recordId: after.id, decisionId, reason: 'Runs at half load until replaced.', password: TEST_PASSWORD });
    await house.staff.manager.post(`/api/jobs/${job.id}/concession`, concession(after.id)).expect(409);
    const decision = (await house.staff.counter.post(`/api/jobs/${job.id}/decisions`, { recordId: after.id, about: 'core-test-after', choice: 'accept-with-concession', answeredBy: 'Gesa', channel: 'phone', words: '' }).expect(201)).body;
    await house.staff.technician.post(`/api/jobs/${job.id}/concession`, concession(decision.id)).expect(403);
    const wrong = await house.staff.manager.post(`/api/jobs/${job.id}/concession`, { ...concession(decision.id), password: 'not mine' });
    expect(wrong.body).toMatchObject({ code: 'WRONG_SIGNATURE', fields: [{ path: 'password' }] });
    const signed = (await house.staff.manager.post(`/api/jobs/${job.id}/concession`, concession(decision.id)).expect(201)).body;
    expect(signed).toMatchObject({ kind: 'concession', by: 'Mo Manager', contentHash: after.contentHash });
    expect((await job.next()).body).toMatchObject({ step: 'rewind' });
  });

  it('opens after a core repair only with a new test that conforms', async () => {
    const job = await book(3);
    await job.toCoreBefore();
    const before = await job.record('core-test-before', job.ring('3 before'));
    await house.staff.counter.post(`/api/jobs/${job.id}/decisions`, { recordId: before.id, about: 'core-test-before', choice: 'go-on', answeredBy: 'Tilo', channel: 'phone', words: '' }).expect(201);
    await job.moveTo('awaiting-approval');
    await job.quoteApproved();
    await job.moveTo('strip-and-burnout');
    await job.record('strip', job.strip({ partPeakC: 351 }));
    await job.moveTo('core-test-after');
    expect((await job.record('core-test-after', job.ring('3 after strip'))).verdict).toBe('does-not-conform');
    await job.record('core-repair', { methods: ['grind', 'etch'], slotFrom: 11, slotTo: 15, words: 'Rub ground out.' });
    expect(missing((await job.sheet()).next!.conditions)).toEqual(['CORE_AFTER']);
    expect((await job.record('core-test-after', job.ring('3 after repair'))).verdict).toBe('conforms');
    expect((await job.next()).body).toMatchObject({ step: 'rewind' });
  });

  it('asks for a repeat or a manager’s release where the test cannot tell', async () => {
    const job = await book(12);
    await job.toCoreAfter('12 before', { partPeakC: 368 });
    const after = await job.record('core-test-after', job.ring('12 after'));
    expect(after.verdict).toBe('inconclusive');
    expect(missing((await job.sheet()).next!.conditions)).toEqual(['CORE_AFTER']);
    await house.staff.manager.post(`/api/records/${after.id}/inconclusive-release`, { reason: 'Second meter agrees.', password: TEST_PASSWORD }).expect(201);
    expect(missing((await job.sheet()).next!.conditions)).toEqual([]);
  });

  it('with a waived test before, judges the core without an increase', async () => {
    const job = await book(7);
    await job.moveTo('incoming-test');
    await job.record('incoming-test', { ...(await import('../../../mocks/sample-shop/machine-tests.js')).incomingTest(7, house.meters, 20), windingResistance: null });
    await job.moveTo('dismantled');
    await job.record('dismantling', job.dismantling());
    await job.record('winding-as-found', winding(7));
    await job.moveTo('core-test-before');
    expect(missing((await job.next()).body.conditions)).toEqual(['CORE_BEFORE']);
    const waiver = (await house.staff.technician.post(`/api/jobs/${job.id}/waiver`, { reason: 'came-in-stripped', words: 'Stripped by another shop.' }).expect(201)).body;
    await house.staff.technician.post(`/api/waivers/${waiver.id}/countersignature`, { password: TEST_PASSWORD, remark: '' }).expect(403);
    await house.staff.manager.post(`/api/waivers/${waiver.id}/countersignature`, { password: TEST_PASSWORD, remark: '' }).expect(201);
    await job.moveTo('awaiting-approval');
    await job.quoteApproved();
    await job.moveTo('strip-and-burnout');
    await job.record('strip', job.strip({ method: 'cold-pull', ovenId: null, partPeakC: null, minutesAbove345C: null }));
    await job.moveTo('core-test-after');
    const after = await job.record('core-test-after', job.ring('7 after'));
    expect(after).toMatchObject({ verdict: 'conforms', result: { increaseEstablished: false } });
  });
});

describe('from rewind to the certificate', () => {
  it('varnish waits for its test, the final test for two people, the release for certificate and delivery note', async () => {
    const job = await book(1);
    await job.toCoreAfter('1 before');
    await job.record('core-test-after', job.ring('1 after'));
    await job.moveTo('rewind');
    await job.record('winding-as-wound', winding(1));
    await job.moveTo('before-varnish-test');
    const turned = await job.record('before-varnish-test', { ...beforeVarnish(1, house.meters), polarityRight: false });
    expect(turned.verdict).toBe('does-not-conform');
    expect(missing((await job.next()).body.conditions)).toEqual(['BEFORE_VARNISH']);
    await job.record('before-varnish-test', beforeVarnish(1, house.meters));
    await job.moveTo('treatment');
    await job.record('treatment', { process: 'vacuum-pressure', material: 'resin', batch: '1', bakeTemperatureC: 150, bakeMinutes: 480, cycles: 1 });
    await job.moveTo('assembly');
    await job.record('assembly', { bearingDriveEnd: '6319', bearingNonDriveEnd: '6319', grease: '', turnsFreely: true, words: '' });
    await job.moveTo('final-test');

    const halfDone = await job.record('final-test', { ...finalTest(1, house.meters), vibration: null });
    expect(halfDone).toMatchObject({ verdict: 'not-valid', result: { missing: ['vibration'] } });
    const damp = finalTest(1, house.meters);
    const refused = await job.tryRecord('final-test', { ...damp, insulation: { ...damp.insulation, resistanceOhm: 1e6 } });
    expect(refused.body.code).toBe('READINGS_NOT_VALID');
    expect(JSON.stringify(refused.body.fields)).toContain('highPotential');

    const test = await job.record('final-test', finalTest(1, house.meters));
    expect(test.verdict).toBe('conforms');
    expect(test.result['core']).toMatchObject({ verdict: 'conforms' });
    expect(missing((await job.next()).body.conditions)).toEqual(['TESTED', 'SECOND_PERSON']);
    const sign = { version: test.version, password: TEST_PASSWORD };
    await house.staff.second.post(`/api/records/${test.id}/release`, sign).expect(409);
    await house.staff.technician.post(`/api/records/${test.id}/signature`, sign).expect(201);
    expect((await house.staff.technician.post(`/api/records/${test.id}/release`, sign)).body.code).toBe('SAME_PERSON');
    await house.staff.second.post(`/api/records/${test.id}/release`, sign).expect(201);

    const corrected = await house.staff.technician
      .post(`/api/records/${test.id}/revisions`, { version: test.version, reason: 'Speed misread.', record: { kind: 'final-test', readings: finalTest(1, house.meters), entered: {} } })
      .expect(201);
    expect(missing((await job.sheet()).next!.conditions), 'signatures were for the revision before').toEqual(['TESTED', 'SECOND_PERSON']);
    const again = { version: corrected.body.version as number, password: TEST_PASSWORD };
    await house.staff.technician.post(`/api/records/${test.id}/signature`, again).expect(201);
    await house.staff.second.post(`/api/records/${test.id}/release`, again).expect(201);

    const early = await house.staff.technician.post(`/api/jobs/${job.id}/certificate`, { jobVersion: (await job.sheet()).version });
    expect(early.body.code).toBe('STEP_NOT_OPEN');
    await job.moveTo('ready');
    const certificate = (await house.staff.technician.post(`/api/jobs/${job.id}/certificate`, { jobVersion: (await job.sheet()).version }).expect(201)).body;
    expect(certificate).toMatchObject({ kind: 'certificate', number: 'C2026-0001' });
    const pdf = await house.staff.counter.get(`/api/papers/${certificate.id}/pdf`).buffer().expect(200);
    expect(pdf.body.subarray(0, 5).toString()).toBe('%PDF-');
    const printedAgain = await house.staff.counter.get(`/api/papers/${certificate.id}/pdf`).buffer().expect(200);
    expect(printedAgain.body.equals(pdf.body)).toBe(true);

    const check = await shop.nobody.get(`/api/check/${certificate.verificationCode}`).expect(200);
    expect(check.body).toMatchObject({ known: true, number: 'C2026-0001', coreVerdict: 'conforms', supersededBy: null });
    expect((await shop.nobody.get('/api/check/AAAA-BBBB-CCCC-DDDD').expect(200)).body.known).toBe(false);

    const noReason = await house.staff.technician.post(`/api/jobs/${job.id}/certificate`, { jobVersion: (await job.sheet()).version });
    expect(noReason.body.code).toBe('STATE_NOT_RIGHT');
    await house.staff.technician.post(`/api/jobs/${job.id}/certificate`, { jobVersion: (await job.sheet()).version, paperSize: 'Letter', units: 'inch-pound', reason: 'Customer asked for inches.' }).expect(201);
    expect((await shop.nobody.get(`/api/check/${certificate.verificationCode}`)).body.supersededBy).toBe('C2026-0002');
    const old = await house.staff.counter.get(`/api/papers/${certificate.id}/pdf`).buffer();
    expect(old.body.equals(pdf.body), 'what was issued does not change').toBe(true);
  });
});
