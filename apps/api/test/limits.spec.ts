import type { CoreTestResult } from '@libs/core-loss';
import { limitsComparisonSchema, limitsVersionViewSchema, type LimitsVersionView } from '@shared/limits';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { ReadDb } from '../src/database/read-db.js';
import { HistoryService } from '../src/history/history.service.js';
import { withAt, type Path } from './from-schema.js';
import { BenchJob, staffAndMeters } from './job-on-the-bench.js';
import { openTestShop, type TestShop } from './test-app.js';

let shop: TestShop;
let house: Awaited<ReturnType<typeof staffAndMeters>>;
beforeAll(async () => {
  shop = await openTestShop();
  house = await staffAndMeters(shop);
});
afterAll(() => shop.close());

const versions = async () => (await house.staff.manager.get('/api/limits').expect(200)).body as LimitsVersionView[];
const inForce = async () => (await versions())[0]!;

/** The set in force as a person would send it back, with some places changed. */
type Place = readonly [path: string, value: unknown];
async function changed(...places: Place[]) {
  const { version, set } = await inForce();
  const { burnout, ...rest } = set as { burnout: Record<string, unknown> };
  const { source: _source, standing: _standing, ...strip } = burnout;
  return { baseVersion: version, note: 'Decided by the shop’s engineer.', set: places.reduce<unknown>((s, [path, value]) => withAt(s, path.split('.') as Path, value), { ...rest, burnout: strip }) };
}
const publish = async (...places: Place[]) => house.staff.manager.post('/api/limits', await changed(...places));
const TIGHTER: Place[] = [
  ['core.increaseLimit', 0.15],
  ['core.increaseWarn', 0.08],
  ['core.sources.increase', { source: 'Shop practice: 15 % since the large-machine contract', standing: 'C' }],
];
const fieldsOf = (answer: { body: { fields?: { path: string; message: string }[] } }) => (answer.body.fields ?? []).map((f) => f.path);

describe('publishing limits', () => {
  it('makes a new version with its note, its maker and its time, and leaves the old one as it was', async () => {
    const before = await inForce();
    const answer = await publish(...TIGHTER);
    expect(answer.status, JSON.stringify(answer.body)).toBe(201);
    const made = limitsVersionViewSchema.parse(answer.body);
    expect(made).toMatchObject({ version: before.version + 1, note: 'Decided by the shop’s engineer.', publishedBy: 'Mo Manager', publishedAt: shop.clock.iso() });
    expect((made.set as { core: { increaseLimit: number } }).core.increaseLimit).toBe(0.15);
    expect(await inForce()).toEqual(made);
    expect((await house.staff.counter.get(`/api/limits/${before.version}`).expect(200)).body).toEqual(before);
  });

  it('is written into the history with what changed, from what to what', async () => {
    const [entry] = await shop.app.get(ReadDb).all<{ words: string; actorName: string; data: string }>("SELECT words, actorName, data FROM history WHERE event = 'limits.published' ORDER BY seq DESC LIMIT 1");
    expect(entry!.actorName).toBe('Mo Manager');
    expect(entry!.words).toMatch(/^Acceptance limits no\. 2 published: Increase over the before test, at most: 20\.0.% → 15\.0.%; Increase that is worth a word: 10\.0.% → 8\.0.% \(Decided by the shop’s engineer\.\)$/);
    expect(JSON.parse(entry!.data)).toMatchObject({ from: 1, to: 2, differences: [{ path: 'core.increaseLimit', from: { value: 0.2, standing: 'P' }, to: { value: 0.15, standing: 'C' } }, { path: 'core.increaseWarn' }] });
    expect(await shop.app.get(HistoryService).firstBreak()).toBeNull();
  });

  it('on a version that is no longer in force is refused, and the one in force comes along', async () => {
    const stale = { ...(await changed(['core.hotSpotLimitK', 8], ['core.sources.hot-spot.source', 'Shop practice: 8 K'])), baseVersion: 1 };
    const answer = await house.staff.manager.post('/api/limits', stale);
    expect(answer.body).toMatchObject({ statusCode: 409, code: 'CHANGED_MEANWHILE', current: { version: 2 } });
    expect(limitsVersionViewSchema.parse(answer.body.current).version).toBe(2);
    expect((await inForce()).version).toBe(2);
  });

  it('of two managers at once only one comes through', async () => {
    const [a, b] = [await changed(['core.hotSpotLimitK', 9], ['core.sources.hot-spot.source', 'Shop practice: 9 K']), await changed(['core.hotSpotLimitK', 8], ['core.sources.hot-spot.source', 'Shop practice: 8 K'])];
    const answers = await Promise.all([house.staff.manager.post('/api/limits', a), house.staff.manager.post('/api/limits', b)]);
    expect(answers.map((x) => x.status).sort()).toEqual([201, 409]);
    expect((await versions()).map((v) => v.version)).toEqual([3, 2, 1]);
  });

  it('belongs to the manager: nobody else may, and a customer may not even read them', async () => {
    const body = await changed(['core.hotSpotLimitK', 7], ['core.sources.hot-spot.source', 'x']);
    for (const person of [house.staff.technician, house.staff.counter, house.staff.office]) {
      expect((await person.post('/api/limits', body)).body).toMatchObject({ statusCode: 403, code: 'FORBIDDEN' });
      await person.get('/api/limits').expect(200);
    }
    const job = await BenchJob.book(house, 12);
    const owner = await shop.person(['customer'], { customerId: job.customerId });
    await owner.get('/api/limits').expect(403);
    await owner.get('/api/limits/1/compare/2').expect(403);
  });

  it('of what is in force already is refused: there is nothing to publish', async () => {
    expect((await publish()).body).toMatchObject({ statusCode: 409, code: 'ALREADY_DONE' });
  });

  it('twice under one key makes one version', async () => {
    const body = await changed(['core.coverageFactor', 2.2]);
    const [first, second] = await Promise.all([house.staff.manager.post('/api/limits', body, 'limits-once'), house.staff.manager.post('/api/limits', body, 'limits-once')]);
    expect([first.status, second.status]).toEqual([201, 201]);
    expect(first.body.version).toBe(second.body.version);
    expect((await inForce()).version).toBe(first.body.version);
  });
});

describe('what the contract refuses, at the field it is wrong in', () => {
  it.each([
    ['a limit of two thousand percent', 'core.increaseLimit', 20, 'set.core.increaseLimit'],
    ['a limit as text', 'machine.polarizationIndex.value', '2', 'set.machine.polarizationIndex.value'],
    ['a missing figure', 'burnout.inorganicC', undefined, 'set.burnout.inorganicC'],
    ['a standing nobody knows', 'core.sources.fall.standing', 'X', 'set.core.sources.fall.standing'],
    ['a source left empty', 'machine.surgeDifference.source', '', 'set.machine.surgeDifference.source'],
    ['a warning over its limit', 'core.hotSpotWarnK', 30, 'set.core.hotSpotWarnK'],
    ['an organic core plate hotter than an inorganic one', 'burnout.organicOrUnknownC', 450, 'set.burnout.organicOrUnknownC'],
    ['a key nobody knows', 'core.increaseLimmit', 0.1, 'set.core'],
  ] as [string, string, unknown, string][])('%s', async (_what, path, value, field) => {
    const answer = await publish([path, value]);
    expect(answer.status).toBe(400);
    expect(fieldsOf(answer)).toEqual([field]);
  });

  it('a version without a note', async () => {
    const answer = await house.staff.manager.post('/api/limits', { ...(await changed(...TIGHTER)), note: '  ' });
    expect(answer.status).toBe(400);
    expect(fieldsOf(answer)).toEqual(['note']);
  });

  it('a changed figure under the source of the old one, until somebody says that it still stands', async () => {
    const body = await changed(['core.hotSpotMinMinutes', 20]);
    const refused = await house.staff.manager.post('/api/limits', body);
    expect(refused.body).toMatchObject({ statusCode: 400, code: 'INPUT_NOT_VALID' });
    expect(fieldsOf(refused)).toEqual(['set.core.sources.hot-spot-start.source']);
    await house.staff.manager.post('/api/limits', { ...body, confirmedSources: ['core.sources.hot-spot-start'] }).expect(201);
  });
});

describe('two versions side by side', () => {
  it('show what changed between them, and nothing between one and itself', async () => {
    const answer = await house.staff.technician.get('/api/limits/1/compare/2').expect(200);
    const { from, to, differences } = limitsComparisonSchema.parse(answer.body);
    expect([from, to]).toEqual([1, 2]);
    expect(differences.map((d) => [d.path, d.from.value, d.to.value, d.valueChanged, d.sourceChanged])).toEqual([
      ['core.increaseLimit', 0.2, 0.15, true, true],
      ['core.increaseWarn', 0.1, 0.08, true, true],
    ]);
    expect((await house.staff.technician.get('/api/limits/2/compare/2').expect(200)).body.differences).toEqual([]);
  });

  it('one that was never published is not there', async () => {
    await house.staff.manager.get('/api/limits/1/compare/99').expect(404);
    await house.staff.manager.get('/api/limits/0/compare/1').expect(400);
  });
});

describe('a job and its version', () => {
  const increaseOf = (result: unknown) => (result as CoreTestResult).judgements.find((j) => j.test === 'increase')!;

  it('a job keeps the limits it was received under, and the next one is judged by the new ones', async () => {
    // the sample shop’s machine 12: 3.120 before and 3.700 after, +18.6 %, 16.2 to 21.0 with its uncertainty
    const back = await publish(['core.increaseLimit', 0.2], ['core.increaseWarn', 0.1], ['core.sources.increase', { source: 'Common practice: 20 %', standing: 'P' }], ['core.coverageFactor', 2]);
    expect(back.status).toBe(201);
    const older = await BenchJob.book(house, 12);
    await older.toCoreAfter('12 before');
    expect((await publish(...TIGHTER)).status).toBe(201);
    const newer = await BenchJob.book(house, 12);
    await newer.toCoreAfter('12 before');
    const [first, second] = [await older.record('core-test-after', older.ring('12 after')), await newer.record('core-test-after', newer.ring('12 after'))];
    expect([first.limitsVersion, first.verdict]).toEqual([back.body.version, 'inconclusive']);
    expect(increaseOf(first.result)).toMatchObject({ limit: 0.2, verdict: 'inconclusive', source: 'Common practice: 20 %' });
    expect([second.limitsVersion, second.verdict]).toEqual([back.body.version + 1, 'does-not-conform']);
    expect(increaseOf(second.result)).toMatchObject({ limit: 0.15, standing: 'C' });

    // moved by the manager, the job is judged anew; the record stays as it was judged
    const { version, limitsVersion } = await older.sheet();
    expect(limitsVersion).toBe(back.body.version);
    await house.staff.manager.post(`/api/jobs/${older.id}/limits`, { version, reason: 'The customer’s new contract counts for this job too.' }).expect(200);
    expect((await older.sheet()).limitsVersion).toBe(back.body.version + 1);
    const kept = (await house.staff.technician.get(`/api/records/${first.id}`).expect(200)).body;
    expect([kept.limitsVersion, kept.verdict, increaseOf(kept.result).limit]).toEqual([back.body.version, 'inconclusive', 0.2]);
    const repeat = await older.record('core-test-after', older.ring('12 after'));
    expect([repeat.limitsVersion, repeat.verdict]).toEqual([back.body.version + 1, 'does-not-conform']);
  });
});
