import type { JobSheet } from '@shared/jobs';
import type { RecordInput, RecordKind, RecordView } from '@shared/records';
import { ROUTE_STEPS, type Step } from '@shared/route';
import { incomingTest, type Meters } from '../../../mocks/sample-shop/machine-tests.js';
import { MACHINES } from '../../../mocks/sample-shop/machines.js';
import { ringTest, type RingTest } from '../../../mocks/sample-shop/ring-tests.js';
import { winding } from '../../../mocks/sample-shop/windings.js';
import type { Person, TestShop } from './test-app.js';

const KINDS = ['voltmeter', 'ammeter', 'wattmeter', 'thermometer', 'insulation-tester', 'micro-ohmmeter', 'high-potential-tester', 'surge-tester', 'vibration-meter'] as const;

export interface Staff {
  readonly counter: Person;
  readonly technician: Person;
  readonly second: Person;
  readonly office: Person;
  readonly manager: Person;
}

/** The people of a shop, and its instruments, in calibration for another half year. */
export async function staffAndMeters(shop: TestShop): Promise<{ staff: Staff; meters: Meters }> {
  const staff: Staff = {
    counter: await shop.person(['counter']),
    technician: await shop.person(['technician'], { name: 'Tess Technician' }),
    second: await shop.person(['technician'], { name: 'Sam Second' }),
    office: await shop.person(['office']),
    manager: await shop.person(['manager'], { name: 'Mo Manager' }),
  };
  const meters: Record<string, string> = {};
  for (const kind of KINDS) {
    const answer = await staff.manager.post('/api/instruments', { tag: kind, kind, description: '', serial: `S-${kind}`, percentOfReading: 0.3, percentOfRange: 0.1, rangeText: '', calibratedOn: '2025-09-01', dueOn: '2026-09-01', certificateNumber: 'K-1' });
    meters[kind] = answer.body.id as string;
  }
  return { staff, meters };
}

/** A job of the sample shop's machine on its way, seen by its people over HTTP. */
export class BenchJob {
  private constructor(
    readonly id: string,
    readonly customerId: string,
    readonly machine: number,
    private readonly staff: Staff,
    readonly meters: Meters,
  ) {}

  static async book({ staff, meters }: { staff: Staff; meters: Meters }, machine: number, more: object = {}): Promise<BenchJob> {
    const { description, nameplate, customer } = MACHINES[machine]!;
    const answer = await staff.counter
      .post('/api/jobs', {
        customer: { kind: 'new', details: { name: customer, email: `${customer}@customers.test` } },
        machine: { kind: 'new', details: { description, nameplate } },
        route: 'rewind',
        complaint: 'Trips.',
        contamination: 'none',
        promisedOn: null,
        ...more,
      })
      .expect(201);
    const sheet = (await staff.counter.get(`/api/jobs/${answer.body.id}`)).body as JobSheet;
    return new BenchJob(answer.body.id as string, sheet.customer.id, machine, staff, meters);
  }

  async sheet(): Promise<JobSheet> {
    return (await this.staff.counter.get(`/api/jobs/${this.id}`).expect(200)).body as JobSheet;
  }

  /** One step forward, as far as the gate lets it. */
  async next() {
    const { version, step, route } = await this.sheet();
    const steps = ROUTE_STEPS[route];
    return this.staff.manager.post(`/api/jobs/${this.id}/moves`, { version, to: steps[steps.indexOf(step) + 1] });
  }

  async moveTo(step: Step): Promise<void> {
    while ((await this.sheet()).step !== step) {
      const answer = await this.next();
      if (answer.status >= 300) throw new Error(`on the way to ${step}: ${JSON.stringify(answer.body)}`);
    }
  }

  tryRecord(kind: RecordKind, readings: object, key?: string) {
    return this.staff.technician.post(`/api/jobs/${this.id}/records`, { record: { kind, readings, entered: {} } }, key);
  }

  async record<K extends RecordKind>(kind: K, readings: Extract<RecordInput, { kind: K }>['readings'] | object): Promise<RecordView> {
    const answer = await this.tryRecord(kind, readings);
    if (answer.status !== 201) throw new Error(`${kind}: ${JSON.stringify(answer.body)}`);
    return answer.body as RecordView;
  }

  ring(test: RingTest) {
    const { voltmeter, ammeter, wattmeter, thermometer } = this.meters as Record<string, string>;
    return ringTest(test, { voltmeterId: voltmeter!, ammeterId: ammeter!, wattmeterId: wattmeter!, thermometerId: thermometer! });
  }

  dismantling(more: object = {}) {
    return { rotorOut: true, corePlate: 'unknown', frameMaterial: 'cast-iron', commutatorOrSlipRings: false, inspection: 'Burnt.', fits: '', ...more };
  }

  strip(more: object = {}) {
    return { method: 'oven-burnout', ovenId: 'O1', commutatorOrSlipRingsOn: false, wiresCountedAtCut: 48, sampleCoilKept: true, partPeakC: 356, minutesAbove345C: 60, sensorPosition: 'tooth', explanation: '', ...more };
  }

  /** As far as the test before, with everything recorded on the way. */
  async toCoreBefore(): Promise<void> {
    await this.moveTo('incoming-test');
    await this.record('incoming-test', incomingTest(this.machine, this.meters));
    await this.moveTo('dismantled');
    await this.record('dismantling', this.dismantling());
    await this.record('winding-as-found', winding(this.machine));
    await this.moveTo('core-test-before');
  }

  async quoteApproved(): Promise<string> {
    const line = { kind: 'labour', description: 'Rewind', quantityThousandths: 10_000, unit: 'h', unitPriceMinor: 7800, taxRateBasisPoints: 1900 };
    const quote = (await this.staff.counter.post(`/api/jobs/${this.id}/quotes`, { lines: [line], validUntil: '2026-12-31', note: '' }).expect(201)).body;
    const sent = (await this.staff.counter.post(`/api/quotes/${quote.id}/send`, { version: quote.version })).body;
    await this.staff.counter
      .post(`/api/quotes/${quote.id}/approval-for-customer`, { version: sent.version, how: 'phone', approvedBy: 'The customer', approvedAt: '2026-03-02T09:00:00.000Z', purchaseOrder: '', notToExceedMinor: 200_000 })
      .expect(201);
    return quote.id as string;
  }

  /** As far as the test after, with the given test before. */
  async toCoreAfter(before: RingTest, strip: object = {}): Promise<RecordView> {
    await this.toCoreBefore();
    const record = await this.record('core-test-before', this.ring(before));
    await this.moveTo('awaiting-approval');
    await this.quoteApproved();
    await this.moveTo('strip-and-burnout');
    await this.record('strip', this.strip(strip));
    await this.moveTo('core-test-after');
    return record;
  }
}
