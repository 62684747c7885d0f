import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { deliverySchema, historySchema, jobSheetSchema, tagSchema, type JobSheet } from '@shared/jobs';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { Job } from '../src/jobs/job.entity.js';
import { Paper } from '../src/papers/paper.entity.js';
import { Ids } from '../src/ids/ids.js';
import { bookedIn, bookIn, NEW_CUSTOMER, PLATE, publishNextLimits, sheetOf } from './jobs-booking.js';
import { openTestShop, type Person, type TestShop } from './test-app.js';

let shop: TestShop;
let counter: Person;
let technician: Person;
let manager: Person;
beforeAll(async () => {
  shop = await openTestShop();
  counter = await shop.person(['counter'], { name: 'Ilse Counter' });
  technician = await shop.person(['technician']);
  manager = await shop.person(['manager']);
});
afterAll(() => shop.close());

/** Puts a job where a test begins, as the steps before it would have. */
async function standing(job: { id: string }, at: Partial<Job>): Promise<void> {
  await shop.app.get(UnitOfWork).run((em) => em.update(Job, { id: job.id }, at));
}
const historyOf = async (id: string) => historySchema.parse((await counter.get(`/api/jobs/${id}/history`).expect(200)).body);

describe('booking in', () => {
  it('a new machine of a new customer is booked in at once, with number, paper, mail and history', async () => {
    const before = shop.mail.sent.length;
    const job = await bookedIn(counter, { complaint: 'Smokes & hums <loudly>', accessories: 'Coupling half', customerReference: 'PO 4711' });
    expect(job.number).toMatch(/^J2026-\d{4}$/);
    const sheet = jobSheetSchema.parse(await sheetOf(counter, job.id));
    expect(sheet).toMatchObject({ number: job.number, step: 'received', state: 'open', route: 'rewind', version: 1, warrantyOf: null, customer: { name: NEW_CUSTOMER.name }, machine: { nameplate: { serial: PLATE.serial } } });
    expect(sheet.papers).toEqual([expect.objectContaining({ kind: 'acknowledgement', number: job.number })]);
    expect((await historyOf(job.id))[0]).toMatchObject({ event: 'job.booked-in', who: 'Ilse Counter' });
    await shop.postman();
    const mail = shop.mail.sent.slice(before).find((m) => m.subject.includes(job.number))!;
    expect(mail.to).toBe(NEW_CUSTOMER.email);
    expect(mail.html).toContain('Smokes &amp; hums &lt;loudly&gt;');
    expect(mail.text).toContain('20 March 2026');
    expect(mail.attachments).toHaveLength(1);
    expect(mail.attachments[0]!.content.subarray(0, 5).toString()).toBe('%PDF-');
  });

  it('a known machine of a known customer is another visit of the same machine', async () => {
    const first = await sheetOf(counter, (await bookedIn(counter)).id);
    const second = await bookedIn(counter, { customer: { kind: 'known', customerId: first.customer.id }, machine: { kind: 'known', machineId: first.machine.id }, route: 'recondition', warrantyOfJobId: first.id });
    const sheet = await sheetOf(counter, second.id);
    expect(sheet.machine.id).toBe(first.machine.id);
    expect(sheet.warrantyOf).toEqual({ jobId: first.id, jobNumber: first.number });
    expect(sheet.machine.visits).toHaveLength(2);
  });

  it('a machine of another customer is refused at its field, and nothing of the booking stays', async () => {
    const first = await sheetOf(counter, (await bookedIn(counter)).id);
    const customers = (await counter.get('/api/customers')).body.total;
    const answer = await counter.post('/api/jobs', bookIn({ machine: { kind: 'known', machineId: first.machine.id } }));
    expect(answer.status).toBe(400);
    expect(answer.body.fields).toEqual([expect.objectContaining({ path: 'machine.machineId' })]);
    expect((await counter.get('/api/customers')).body.total).toBe(customers);
  });

  it('a warranty return names a job of the same machine', async () => {
    const other = await bookedIn(counter);
    const answer = await counter.post('/api/jobs', bookIn({ warrantyOfJobId: other.id }));
    expect(answer.body.fields).toEqual([expect.objectContaining({ path: 'warrantyOfJobId' })]);
  });

  it('what is missing or of the wrong kind is named at its field', async () => {
    const input = bookIn({ complaint: '  ', promisedOn: '31.03.2026' });
    const answer = await counter.post('/api/jobs', { ...input, contamination: undefined, state: 'released' });
    expect(answer.status).toBe(400);
    const paths = answer.body.fields.map((f: { path: string }) => f.path);
    expect(paths).toEqual(expect.arrayContaining(['complaint', 'promisedOn', 'contamination']));
    expect(JSON.stringify(answer.body.fields)).toContain('state');
    const nested = await counter.post('/api/jobs', bookIn({ machine: { kind: 'new', details: { description: 'x', nameplate: { ...PLATE, poles: 'six' as never } } } }));
    expect(nested.body.fields).toEqual([expect.objectContaining({ path: 'machine.details.nameplate.poles' })]);
  });

  it('twenty bookings at once get twenty numbers without a gap', async () => {
    const last = Number((await bookedIn(counter)).number.slice(-4));
    const jobs = await Promise.all(Array.from({ length: 20 }, () => bookedIn(counter)));
    const numbers = jobs.map((j) => Number(j.number.slice(-4))).sort((a, b) => a - b);
    expect(numbers).toEqual(Array.from({ length: 20 }, (_, i) => last + 1 + i));
  });

  it('a booking that is refused gives its number back', async () => {
    const first = await bookedIn(counter);
    await counter.post('/api/jobs', bookIn({ warrantyOfJobId: 'no-such-job-1' })).expect(400);
    const next = await bookedIn(counter);
    expect(Number(next.number.slice(-4))).toBe(Number(first.number.slice(-4)) + 1);
  });

  it('a double tap with the same key makes one job', async () => {
    const input = bookIn({ customerReference: 'TAPPED-TWICE' });
    const [one, two] = await Promise.all([counter.post('/api/jobs', input, 'tap-tap-0001'), counter.post('/api/jobs', input, 'tap-tap-0001')]);
    const again = await counter.post('/api/jobs', input, 'tap-tap-0001');
    expect([one.status, two.status, again.status]).toEqual([201, 201, 201]);
    expect(two.body).toEqual(one.body);
    expect(again.body).toEqual(one.body);
    expect((await counter.get('/api/jobs?q=TAPPED-TWICE')).body.total).toBe(1);
  });

  it('a technician does not book in', async () => {
    await technician.post('/api/jobs', bookIn()).expect(403);
  });
});

describe('moving a job', () => {
  it('goes one step forward, tells its history, and counts a version', async () => {
    const job = await bookedIn(counter);
    const moved = jobSheetSchema.parse((await technician.post(`/api/jobs/${job.id}/moves`, { version: 1, to: 'incoming-test' }).expect(200)).body);
    expect(moved).toMatchObject({ step: 'incoming-test', version: 2 });
    expect((await historyOf(job.id))[0]).toMatchObject({ event: 'job.moved', data: { from: 'received', to: 'incoming-test' } });
  });

  it('does not skip a step, nor step off its route', async () => {
    const job = await bookedIn(counter, { route: 'recondition' });
    for (const to of ['dismantled', 'rewind', 'received']) {
      const answer = await technician.post(`/api/jobs/${job.id}/moves`, { version: 1, to });
      expect(answer.status).toBe(409);
      expect(answer.body.code).toBe('MOVE_NOT_ALLOWED');
    }
  });

  it('the strip waits behind its gate, and the refusal lists what is missing', async () => {
    const job = await bookedIn(counter);
    await standing(job, { step: 'awaiting-approval' });
    const answer = await technician.post(`/api/jobs/${job.id}/moves`, { version: 1, to: 'strip-and-burnout' });
    expect(answer.status).toBe(409);
    expect(answer.body.code).toBe('GATE_SHUT');
    expect(answer.body.conditions.map((c: { code: string; met: boolean }) => [c.code, c.met])).toEqual([
      ['QUOTE_APPROVED', false],
      ['WINDING_AS_FOUND', false],
      ['CORE_BEFORE', false],
    ]);
    const sheet = await sheetOf(counter, job.id);
    expect(sheet.next).toMatchObject({ step: 'strip-and-burnout', open: false, conditions: answer.body.conditions });
    expect(sheet.gates.map((g) => g.gate)).toEqual(['strip-may-start', 'burnout-may-start', 'rewind-may-start', 'treatment-may-start', 'ready', 'released']);
  });

  it('goes back only with a reason, and the reason stands in the history', async () => {
    const job = await bookedIn(counter);
    await standing(job, { step: 'dismantled' });
    const silent = await technician.post(`/api/jobs/${job.id}/moves`, { version: 1, to: 'incoming-test' });
    expect(silent.status).toBe(400);
    expect(silent.body.fields).toEqual([expect.objectContaining({ path: 'why', code: 'reason-missing' })]);
    await technician.post(`/api/jobs/${job.id}/moves`, { version: 1, to: 'incoming-test', why: 'Leads were mixed up' }).expect(200);
    expect((await historyOf(job.id))[0]!.words).toContain('Leads were mixed up');
  });

  it('two people who move the same job at once: one moves it, the other is shown how it stands', async () => {
    const job = await bookedIn(counter);
    const answers = await Promise.all([counter, technician].map((who) => who.post(`/api/jobs/${job.id}/moves`, { version: 1, to: 'incoming-test' })));
    expect(answers.map((a) => a.status).sort()).toEqual([200, 409]);
    expect(answers.find((a) => a.status === 409)!.body).toMatchObject({ code: 'CHANGED_MEANWHILE', current: { step: 'incoming-test', version: 2 } });
  });

  it('releasing is for the counter and the manager: a technician may not', async () => {
    const job = await bookedIn(counter);
    await standing(job, { step: 'ready' });
    await technician.post(`/api/jobs/${job.id}/moves`, { version: 1, to: 'released' }).expect(403);
    expect((await counter.post(`/api/jobs/${job.id}/moves`, { version: 1, to: 'released' })).body.code).toBe('GATE_SHUT');
  });

  it('nobody of the customer’s moves a job or reads its sheet', async () => {
    const job = await bookedIn(counter);
    const sheet = await sheetOf(counter, job.id);
    const portal = await shop.person(['customer'], { customerId: sheet.customer.id });
    await portal.get(`/api/jobs/${job.id}`).expect(403);
    await portal.post(`/api/jobs/${job.id}/moves`, { version: 1, to: 'incoming-test' }).expect(403);
  });
});

describe('hold, resume, end', () => {
  it('a held job says why and who is waited for, and does not move until it goes on', async () => {
    const job = await bookedIn(counter);
    const held = (await technician.post(`/api/jobs/${job.id}/hold`, { version: 1, reason: 'Bearing ordered', waitingFor: 'part' }).expect(200)).body as JobSheet;
    expect(held).toMatchObject({ state: 'on-hold', holdReason: 'Bearing ordered', waitingFor: 'part', version: 2 });
    expect((await technician.post(`/api/jobs/${job.id}/moves`, { version: 2, to: 'incoming-test' })).body.code).toBe('MOVE_NOT_ALLOWED');
    expect((await technician.post(`/api/jobs/${job.id}/hold`, { version: 2, reason: 'again', waitingFor: 'part' })).body.code).toBe('STATE_NOT_RIGHT');
    const on = (await technician.post(`/api/jobs/${job.id}/resume`, { version: 2, why: 'Bearing came' }).expect(200)).body as JobSheet;
    expect(on).toMatchObject({ state: 'open', holdReason: null, waitingFor: null, version: 3 });
    expect((await technician.post(`/api/jobs/${job.id}/resume`, { version: 3 })).body.code).toBe('STATE_NOT_RIGHT');
  });

  it('an end needs the name of who agreed, and nothing is done to the job afterwards', async () => {
    const job = await bookedIn(counter);
    const nameless = await counter.post(`/api/jobs/${job.id}/end`, { version: 1, end: 'scrapped', consentBy: '', consentHow: 'phone' });
    expect(nameless.body.fields).toEqual([expect.objectContaining({ path: 'consentBy' })]);
    const ended = (await counter.post(`/api/jobs/${job.id}/end`, { version: 1, end: 'scrapped', consentBy: 'Gesa Fennholt', consentHow: 'phone' }).expect(200)).body as JobSheet;
    expect(ended).toMatchObject({ state: 'scrapped', next: null });
    for (const [act, body] of [['moves', { to: 'incoming-test' }], ['hold', { reason: 'x', waitingFor: 'other' }], ['resume', {}], ['end', { end: 'replaced', consentBy: 'x', consentHow: 'phone' }]] as const) {
      expect((await counter.post(`/api/jobs/${job.id}/${act}`, { version: 2, ...body })).status).toBe(409);
    }
  });
});

describe('changing what was taken in', () => {
  const intake = (sheet: JobSheet) => ({ version: sheet.version, complaint: sheet.complaint, accessories: sheet.accessories, contamination: sheet.contamination, contaminationWords: sheet.contaminationWords, promisedOn: sheet.promisedOn, customerReference: sheet.customerReference });

  it('a changed promise is kept with what it was before', async () => {
    const job = await bookedIn(counter);
    const sheet = await sheetOf(counter, job.id);
    await counter.put(`/api/jobs/${job.id}`, { ...intake(sheet), promisedOn: '2026-04-01' }).expect(200);
    expect((await historyOf(job.id))[0]).toMatchObject({ event: 'job.changed', words: 'Changed: promise date.', data: { from: { promisedOn: '2026-03-20' }, to: { promisedOn: '2026-04-01' } } });
  });

  it('a stale change is refused with both values in sight', async () => {
    const job = await bookedIn(counter);
    const sheet = await sheetOf(counter, job.id);
    await counter.put(`/api/jobs/${job.id}`, { ...intake(sheet), complaint: 'Hums' }).expect(200);
    const stale = await manager.put(`/api/jobs/${job.id}`, { ...intake(sheet), complaint: 'Smells' });
    expect(stale.status).toBe(409);
    expect(stale.body).toMatchObject({ code: 'CHANGED_MEANWHILE', current: { complaint: 'Hums', version: 2 } });
  });

  it('after the end only the customer’s reference can still come', async () => {
    const job = await bookedIn(counter);
    await standing(job, { state: 'released', step: 'released' });
    const sheet = await sheetOf(counter, job.id);
    expect((await counter.put(`/api/jobs/${job.id}`, { ...intake(sheet), complaint: 'Rewritten' })).body.code).toBe('STATE_NOT_RIGHT');
    expect((await counter.put(`/api/jobs/${job.id}`, { ...intake(sheet), customerReference: 'PO came late' }).expect(200)).body.customerReference).toBe('PO came late');
  });

  it('a change that changes nothing leaves version and history alone', async () => {
    const job = await bookedIn(counter);
    const sheet = await sheetOf(counter, job.id);
    expect((await counter.put(`/api/jobs/${job.id}`, intake(sheet)).expect(200)).body.version).toBe(1);
    expect(await historyOf(job.id)).toHaveLength(1);
  });
});

describe('acceptance limits of a job', () => {
  it('a job keeps the limits it was received under until a manager moves it, with a reason', async () => {
    const job = await bookedIn(counter);
    const before = (await sheetOf(counter, job.id)).limitsVersion;
    expect((await manager.post(`/api/jobs/${job.id}/limits`, { version: 1, reason: 'none newer' })).body.code).toBe('STATE_NOT_RIGHT');
    const newest = await publishNextLimits(shop);
    expect((await sheetOf(counter, job.id)).limitsVersion).toBe(before);
    await counter.post(`/api/jobs/${job.id}/limits`, { version: 1, reason: 'x' }).expect(403);
    expect((await manager.post(`/api/jobs/${job.id}/limits`, { version: 1, reason: '' })).body.fields).toEqual([expect.objectContaining({ path: 'reason' })]);
    expect((await manager.post(`/api/jobs/${job.id}/limits`, { version: 1, reason: 'Customer asks for the newer set' }).expect(200)).body.limitsVersion).toBe(newest);
    expect((await sheetOf(counter, (await bookedIn(counter)).id)).limitsVersion).toBe(newest);
  });
});

describe('going out', () => {
  async function readyJob(): Promise<JobSheet> {
    const job = await bookedIn(counter, { accessories: 'Coupling half' });
    const sheet = await sheetOf(counter, job.id);
    await standing(job, { step: 'ready' });
    const office = await shop.person(['office']);
    await office.put(`/api/customers/${sheet.customer.id}/terms`, { version: 1, terms: 'account', netDays: 30, creditStop: false }).expect(200);
    return sheet;
  }
  const certificate = (job: JobSheet) =>
    shop.app.get(UnitOfWork).run((em) =>
      em.insert(Paper, { id: shop.app.get(Ids).next(), kind: 'certificate', number: `C-${job.number}`, jobId: job.id, customerId: job.customer.id, subjectId: job.id, issuedAt: shop.clock.iso(), model: {} as never, templateVersion: '1', sha256: null, verificationCode: null, supersededById: null, issuedByUserId: null, version: 1 }),
    );

  it('a machine does not go out before its certificate is there', async () => {
    const job = await readyJob();
    const answer = await counter.post(`/api/jobs/${job.id}/delivery`, { version: 1, receivedBy: 'A driver' });
    expect(answer.body).toMatchObject({ code: 'GATE_SHUT', conditions: [{ code: 'CERTIFICATE', met: false }] });
  });

  it('a job that is not ready, and a person at the bench, record no delivery', async () => {
    const job = await bookedIn(counter);
    expect((await counter.post(`/api/jobs/${job.id}/delivery`, { version: 1, receivedBy: 'A driver' })).body.code).toBe('STATE_NOT_RIGHT');
    await technician.post(`/api/jobs/${job.id}/delivery`, { version: 1, receivedBy: 'A driver' }).expect(403);
  });

  it('collection leaves a delivery note, a signature with its hash, and an open way to the release', async () => {
    const job = await readyJob();
    await certificate(job);
    const delivery = deliverySchema.parse((await counter.post(`/api/jobs/${job.id}/delivery`, { version: 1, receivedBy: 'Enno Rost', words: 'Loaded by crane' }).expect(201)).body);
    expect(delivery.number).toMatch(/^L2026-\d{4}$/);
    expect(delivery.signOff).toMatchObject({ kind: 'delivery', by: 'Ilse Counter', detail: { receivedBy: 'Enno Rost' } });
    expect(delivery.signOff.contentHash).toMatch(/^[0-9a-f]{64}$/);
    const pdf = await counter.get(`/api/papers/${delivery.paperId}/pdf`).expect(200);
    expect(pdf.headers['content-type']).toBe('application/pdf');
    const sheet = await sheetOf(counter, job.id);
    expect(sheet.next).toMatchObject({ step: 'released', open: true });
    expect((await counter.post(`/api/jobs/${job.id}/delivery`, { version: sheet.version, receivedBy: 'Enno Rost' })).body.code).toBe('ALREADY_DONE');
    const released = (await counter.post(`/api/jobs/${job.id}/moves`, { version: sheet.version, to: 'released' }).expect(200)).body as JobSheet;
    expect(released).toMatchObject({ state: 'released', step: 'released', next: null });
  });

  it('a machine that goes back unrepaired gets its delivery note too', async () => {
    const job = await bookedIn(counter);
    await counter.post(`/api/jobs/${job.id}/end`, { version: 1, end: 'returned-unrepaired', consentBy: 'Owner', consentHow: 'phone' }).expect(200);
    await counter.post(`/api/jobs/${job.id}/delivery`, { version: 2, receivedBy: 'Owner' }).expect(201);
  });
});

describe('the tag', () => {
  it('is printed again as it is until something on it changes', async () => {
    const job = await bookedIn(counter, { contamination: 'asbestos-suspected' });
    await counter.get(`/api/jobs/${job.id}/tag`).expect(404);
    const first = tagSchema.parse((await counter.post(`/api/jobs/${job.id}/tag`).expect(201)).body);
    shop.clock.forward(60_000);
    expect((await counter.post(`/api/jobs/${job.id}/tag`).expect(201)).body).toEqual(first);
    expect((await counter.get(`/api/jobs/${job.id}/tag`).expect(200)).body).toEqual(first);
    await technician.post(`/api/jobs/${job.id}/moves`, { version: 1, to: 'incoming-test' }).expect(200);
    const second = (await counter.post(`/api/jobs/${job.id}/tag`).expect(201)).body;
    expect(second.paperId).not.toBe(first.paperId);
    const pdf = await counter.get(`/api/papers/${second.paperId}/pdf`).expect(200);
    expect(pdf.body.subarray(0, 5).toString()).toBe('%PDF-');
  });
});

describe('finding a job', () => {
  it('by its number, however it is written; an unknown one is not there', async () => {
    const job = await bookedIn(counter);
    expect((await counter.get(`/api/jobs/by-number/${job.number.toLowerCase()}`).expect(200)).body).toEqual(job);
    await counter.get('/api/jobs/by-number/J1999-0001').expect(404);
    await counter.get('/api/jobs/019f0000-0000-7000-8000-000000000000').expect(404);
    await counter.get('/api/jobs/019f0000-0000-7000-8000-000000000000/history').expect(404);
    await counter.get("/api/jobs/' OR 1=1--").expect(400);
  });
});

describe('the turn of the year', () => {
  it('a number’s year turns in the shop’s time zone, not in Greenwich', async () => {
    const atNight = await openTestShop();
    try {
      atNight.clock.set(new Date('2026-12-31T22:30:00.000Z'));
      const late = await atNight.person(['counter']);
      expect((await bookedIn(late)).number).toBe('J2026-0001');
      atNight.clock.forward(60 * 60 * 1000);
      expect((await bookedIn(late)).number).toBe('J2027-0001');
    } finally {
      await atNight.close();
    }
  });
});
