import { DEFAULT_CORE_LIMITS, evaluateCoreTest, type CoreTestInput } from '@libs/core-loss';
import { portalHomeSchema, portalJobSchema, portalMachinesSchema } from '@shared/portal';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { Attachment } from '../src/attachments/attachment.entity.js';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { Ids } from '../src/ids/ids.js';
import { JobRecord } from '../src/records/job-record.entity.js';
import { RecordRevision } from '../src/records/record-revision.entity.js';
import { issuedInvoice } from './approved-quote.js';
import { jobInShop, QUOTE, shopProfile, type JobInShop } from './job-in-shop.js';
import { openTestShop, type Person, type TestShop } from './test-app.js';

let shop: TestShop;
let manager: Person;
let customer: Person;
let other: Person;
let job: JobInShop;
let theirs: JobInShop;

beforeAll(async () => {
  shop = await openTestShop();
  shop.clock.set(new Date('2026-03-03T09:00:00.000Z'));
  await shopProfile(shop);
  manager = await shop.person(['manager'], { name: 'Greta Stein' });
  job = await jobInShop(shop, manager, { name: 'Corvel Plastics' });
  theirs = await jobInShop(shop, manager, { name: 'SECRET Neighbour' }, { complaint: 'SECRET complaint' });
  customer = await shop.person(['customer'], { customerId: job.customerId });
  other = await shop.person(['customer'], { customerId: theirs.customerId });
});
afterAll(() => shop.close());

/** Readings of the plastics plant’s 37 kW motor in the sample shop. */
const reading = (phase: 'before' | 'after', volts: number, amps: number, watts: number, temperatures: CoreTestInput['temperatures']): CoreTestInput => ({
  phase,
  geometry: { kind: 'stator', outerDiameterM: 0.34, innerDiameterM: 0.218, slotDepthM: 0.028, slots: 48, stackLengthM: 0.22, ducts: 0, ductWidthM: 0, stackingFactor: 0.95, densityKgPerM3: 7700 },
  target: { basis: 'standard', fluxDensityT: 1.32 },
  frame: { state: 'in-frame', material: 'cast-iron' },
  cablePath: 'over-frame',
  massBasis: 'back-iron',
  reading: { excitingTurns: 16, searchTurns: 4, searchVoltsV: volts, voltmeter: 'average', excitingA: amps, wattsW: watts, wattmeterLead: 'search', frequencyHz: 50 },
  temperatures,
  instruments: { voltmeterId: 'v1', ammeterId: 'a1', wattmeterId: 'w1', wattmeterRange: '100 W', thermometerId: 't1', clampMeter: false },
  checks: { rotorOut: true, leadsOpen: true, parallelsOpened: true, onePointEarthed: true, throughBoltsMeasured: true, boreClear: true, barrierUp: true },
});
const BEFORE = reading('before', 8.096, 26.5, 40.01, { ambientC: 21, startC: 21, meanC: 27.2, hottestC: 31, minutes: 20 });
const AFTER = reading('after', 8.084, 26.6, 47.31, { ambientC: 22, startC: 22, meanC: 29.4, hottestC: 35.5, minutes: 20 });

async function recordCoreTests(): Promise<void> {
  const before = evaluateCoreTest(BEFORE, DEFAULT_CORE_LIMITS);
  const after = evaluateCoreTest(AFTER, DEFAULT_CORE_LIMITS, { input: BEFORE, result: before });
  const ids = shop.app.get(Ids);
  await shop.app.get(UnitOfWork).run(async (m) => {
    for (const [input, result] of [[BEFORE, before], [AFTER, after]] as const) {
      const record = { id: ids.next(), jobId: job.jobId, machineId: job.machineId, kind: `core-test-${input.phase}` as const, ordinal: 1, revision: 1, verdict: result.verdict, wattsPerKg: result.wattsPerKgReferred, increase: null, createdAt: shop.clock.iso(), version: 1 };
      await m.insert(JobRecord, record);
      await m.insert(RecordRevision, { id: ids.next(), recordId: record.id, revision: 1, readings: input as never, entered: {} as never, result: result as never, verdict: result.verdict, calculation: result.calculation, limitsVersion: 1, instruments: [] as never, reason: '', byUserId: manager.userId!, byName: 'Greta Stein', at: shop.clock.iso(), contentHash: 'x' });
    }
  });
}

describe('the customer’s own rooms', () => {
  it('show at the door what waits for an answer, what is to be paid, and the jobs', async () => {
    const quote = (await manager.post(`/api/jobs/${job.jobId}/quotes`, QUOTE).expect(201)).body;
    expect(portalHomeSchema.parse((await customer.get('/api/portal').expect(200)).body).quotesToAnswer).toEqual([]);
    await manager.post(`/api/quotes/${quote.id}/send`, { version: 1 }).expect(201);
    const invoice = await issuedInvoice(shop, manager, job);
    const home = portalHomeSchema.parse((await customer.get('/api/portal')).body);
    expect(home).toMatchObject({
      customerName: 'Corvel Plastics',
      quotesToAnswer: [{ id: quote.id, number: quote.number, grossMinor: 75_669 }],
      invoicesToPay: [{ id: invoice.id, number: invoice.number, balanceMinor: 75_669, state: 'open' }],
      jobs: [{ id: job.jobId, number: job.jobNumber, machine: '75 kW 6-pole pump motor', step: 'awaiting-approval' }],
    });
    await customer.post(`/api/portal/quotes/${quote.id}/decline`, { version: 2, reason: 'Too dear' }).expect(201);
    await manager.post(`/api/invoices/${invoice.id}/payments`, { version: 1, kind: 'cash', amountMinor: 75_669, receivedOn: '2026-03-03' }).expect(201);
    expect((await customer.get('/api/portal')).body).toMatchObject({ quotesToAnswer: [], invoicesToPay: [] });
  });

  it('show a job with its papers and photos, and the core before and after with its uncertainty', async () => {
    await recordCoreTests();
    const ids = shop.app.get(Ids);
    await shop.app.get(UnitOfWork).run(async (m) => {
      for (const [name, mime, at] of [['as-received.jpg', 'image/jpeg', job], ['order.pdf', 'application/pdf', job], ['SECRET.jpg', 'image/jpeg', theirs]] as const) {
        await m.insert(Attachment, { id: ids.next(), jobId: at.jobId, customerId: at.customerId, recordId: null, name, mime, storedName: ids.next(), sizeBytes: 1, sha256: 'x', addedByUserId: manager.userId!, addedByName: 'Greta Stein', addedAt: shop.clock.iso() });
      }
    });
    const seen = portalJobSchema.parse((await customer.get(`/api/portal/jobs/${job.jobId}`).expect(200)).body);
    expect(seen.papers.map((p) => p.kind).sort()).toEqual(['invoice', 'quote', 'quote', 'receipt']);
    expect(seen.quotes.map((q) => q.state).sort()).toEqual(['approved', 'declined']);
    expect(seen.invoices).toMatchObject([{ state: 'paid', balanceMinor: 0 }]);
    expect(seen.photos.map((p) => p.name)).toEqual(['as-received.jpg']);
    // the figures of the sample shop: 3.12 and 3.70 W/kg, +18.6 %, 2.4 points, limit 20 %
    expect(seen.core!.before!.wattsPerKg).toBeCloseTo(3.12, 2);
    expect(seen.core!.after!.wattsPerKg).toBeCloseTo(3.7, 2);
    expect(seen.core!.increase!.fraction).toBeCloseTo(0.186, 2);
    expect(seen.core).toMatchObject({ established: true, verdict: 'inconclusive', before: { fluxDensityT: 1.32 }, increase: { limitFraction: 0.2 } });
  });

  it('show the machine’s life from visit to visit', async () => {
    const machines = portalMachinesSchema.parse((await customer.get('/api/portal/machines').expect(200)).body);
    expect(machines).toMatchObject([{ id: job.machineId, serial: 'MP-75-0117', visits: [{ jobId: job.jobId, jobNumber: job.jobNumber }] }]);
    expect(machines[0]!.visits[0]!.wattsPerKgBefore).toBeCloseTo(3.12, 2);
    expect(machines[0]!.visits[0]!.wattsPerKgAfter).toBeCloseTo(3.7, 2);
    expect((await other.get('/api/portal/machines')).body).toMatchObject([{ visits: [{ wattsPerKgBefore: null, wattsPerKgAfter: null }] }]);
  });

  it('a job without a core test says nothing of a core', async () => {
    expect((await other.get(`/api/portal/jobs/${theirs.jobId}`)).body).toMatchObject({ core: null, quotes: [], invoices: [], papers: [], photos: [{ name: 'SECRET.jpg' }] });
  });

  it('hold nothing of anybody else', async () => {
    await manager.post(`/api/jobs/${theirs.jobId}/quotes`, { ...QUOTE, note: 'SECRET note' }).expect(201);
    await issuedInvoice(shop, manager, theirs);
    expect((await customer.get(`/api/portal/jobs/${theirs.jobId}`)).status).toBe(404);
    expect((await customer.get('/api/portal/jobs/ffffffff-0000')).body.message).toBe((await customer.get(`/api/portal/jobs/${theirs.jobId}`)).body.message);
    const everything = [];
    for (const path of ['/api/portal', '/api/portal/machines', `/api/portal/jobs/${job.jobId}`]) everything.push(JSON.stringify((await customer.get(path)).body));
    expect(everything.join()).not.toContain('SECRET');
    expect(everything.join()).not.toContain(theirs.customerId);
    expect(everything.join()).not.toContain('Greta Stein');
  });

  it('are closed to the staff, and the staff’s rooms to the customer', async () => {
    for (const path of ['/api/portal', '/api/portal/machines', `/api/portal/jobs/${job.jobId}`]) {
      await manager.get(path).expect(403);
      await shop.nobody.get(path).expect(401);
    }
    for (const path of [`/api/jobs/${job.jobId}/quotes`, `/api/jobs/${job.jobId}/invoices`, '/api/invoices']) await customer.get(path).expect(403);
  });
});
