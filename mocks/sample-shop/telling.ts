import type { Step } from '@shared/route';
import { ringTest, type InstrumentIds, type RingTest } from './ring-tests.js';
import { beforeVarnish, finalTest, incomingTest } from './machine-tests.js';
import { rewindLines } from './quotes.js';
import { SampleJob, type Stage } from './stage.js';
import { DEMO_PASSWORD } from './sign-ins.js';
import { winding } from './windings.js';
import { MACHINES } from './machines.js';

export interface Scene {
  readonly day: number;
  readonly hour?: number;
  readonly play: () => Promise<void>;
}
interface Story {
  readonly route?: 'rewind' | 'recondition' | 'coil-rewind';
  readonly complaint: string;
  readonly accessories?: string;
  readonly contamination?: string;
  readonly promisedIn: number | null;
  readonly reference?: string;
}
type Dismantling = { corePlate: 'organic' | 'inorganic' | 'unknown'; frameMaterial: 'cast-iron' | 'steel' | 'aluminium'; commutatorOrSlipRings?: boolean; inspection: string };
type Strip = { method: string; ovenId: string | null; partPeakC: number; minutesAbove345C: number; explanation?: string; ringsOn?: boolean };

/** Writes down what happens to one machine, day by day. */
export class Telling {
  private job: SampleJob | undefined;
  readonly scenes: Scene[] = [];

  constructor(
    private readonly stage: Stage,
    readonly machine: number,
  ) {}

  private get it(): SampleJob {
    if (!this.job) throw new Error(`machine ${this.machine} is not booked in yet`);
    return this.job;
  }
  get jobId(): string {
    return this.it.id;
  }

  on(day: number, play: (job: SampleJob) => Promise<unknown>, hour = 9): this {
    this.scenes.push({ day, hour, play: async () => void (await play(this.it)) });
    return this;
  }

  comesIn(day: number, story: Story, more: object = {}): this {
    this.scenes.push({
      day,
      hour: 7,
      play: async () => {
        this.job = await SampleJob.book(this.stage, {
          customer: { kind: 'known', customerId: this.stage.customer(MACHINES[this.machine]!.customer) },
          machine: { kind: 'known', machineId: this.stage.machines[this.machine] },
          route: story.route ?? 'rewind',
          complaint: story.complaint,
          accessories: story.accessories ?? '',
          contamination: story.contamination ?? 'none',
          contaminationWords: '',
          promisedOn: story.promisedIn === null ? null : this.stage.date(story.promisedIn),
          customerReference: story.reference ?? '',
          ...more,
        });
      },
    });
    return this;
  }

  opened(day: number, dismantling: Dismantling, megohms?: number): this {
    return this.on(day, async (job) => {
      await job.moveTo('incoming-test');
      await job.record('incoming-test', incomingTest(this.machine, this.stage.meters, megohms));
      await job.moveTo('dismantled');
      await job.record('dismantling', { rotorOut: true, commutatorOrSlipRings: false, fits: '', ...dismantling });
      await job.record('winding-as-found', winding(this.machine));
      await job.moveTo('core-test-before');
    });
  }

  ring(day: number, kind: 'core-test-before' | 'core-test-after', test: RingTest): this {
    return this.on(day, (job) => job.record(kind, ringTest(test, instruments(this.stage))), 11);
  }

  quoted(day: number, hours: number, copperKg: number, bearings: string): this {
    return this.on(
      day,
      async (job) => {
        await job.moveTo('awaiting-approval');
        await makeQuote(this.stage, job, rewindLines(hours, copperKg, bearings));
      },
      14,
    );
  }

  approved(day: number, by: string, how: 'phone' | 'purchase-order' = 'phone', purchaseOrder = '', hour = 9): this {
    return this.on(day, (job) => approve(this.stage, job, by, how, purchaseOrder), hour);
  }

  stripped(day: number, strip: Strip): this {
    return this.on(
      day,
      async (job) => {
        await job.moveTo('strip-and-burnout');
        await job.record('strip', {
          method: strip.method,
          ovenId: strip.ovenId,
          commutatorOrSlipRingsOn: strip.ringsOn ?? false,
          wiresCountedAtCut: winding(this.machine).turnsPerCoil * winding(this.machine).wires[0]!.strands,
          sampleCoilKept: true,
          partPeakC: strip.partPeakC,
          minutesAbove345C: strip.minutesAbove345C,
          sensorPosition: 'tooth, drive end',
          explanation: strip.explanation ?? '',
        });
        await job.moveTo('core-test-after');
      },
      10,
    );
  }

  rewound(day: number, upTo: Step): this {
    return this.on(day, (job) => rewindUpTo(this.stage, job, this.machine, upTo), 13);
  }
}

export const instruments = (stage: Stage): InstrumentIds => ({
  voltmeterId: stage.meters['voltmeter']!,
  ammeterId: stage.meters['ammeter']!,
  wattmeterId: stage.meters['wattmeter']!,
  thermometerId: stage.meters['thermometer']!,
});

export async function makeQuote(stage: Stage, job: SampleJob, lines: object[]): Promise<void> {
  const quote = await stage.cast.counter.post<{ id: string; version: number }>(`/jobs/${job.id}/quotes`, { lines, validUntil: stage.iso().slice(0, 10) < stage.date(-5) ? stage.date(10) : stage.date(25), note: '' });
  await stage.cast.counter.post(`/quotes/${quote.id}/send`, { version: quote.version });
}

async function sentQuote(stage: Stage, job: SampleJob): Promise<{ id: string; version: number; grossMinor: number }> {
  const quotes = await stage.cast.counter.get<{ id: string; version: number; grossMinor: number; state: string }[]>(`/jobs/${job.id}/quotes`);
  return quotes.find((q) => q.state === 'sent')!;
}

export async function approve(stage: Stage, job: SampleJob, by: string, how: 'phone' | 'purchase-order', purchaseOrder: string): Promise<void> {
  const quote = await sentQuote(stage, job);
  const ceiling = Math.ceil((quote.grossMinor * 1.1) / 10_000) * 10_000;
  await stage.cast.counter.post(`/quotes/${quote.id}/approval-for-customer`, { version: quote.version, how, approvedBy: by, approvedAt: stage.iso(), purchaseOrder, notToExceedMinor: ceiling });
}

async function rewindUpTo(stage: Stage, job: SampleJob, machine: number, upTo: Step): Promise<void> {
  await job.moveTo('rewind');
  if (upTo === 'rewind') return;
  await job.record('winding-as-wound', winding(machine));
  await job.moveTo('before-varnish-test');
  await job.record('before-varnish-test', beforeVarnish(machine, stage.meters));
  await job.moveTo('treatment');
  if (upTo === 'treatment') return;
  await job.record('treatment', { process: 'vacuum-pressure', material: 'polyester resin, class H', batch: 'PR-2611', bakeTemperatureC: 150, bakeMinutes: 480, cycles: 1 });
  await job.moveTo('assembly');
  if (upTo === 'assembly') return;
  const { bearingDriveEnd, bearingNonDriveEnd } = MACHINES[machine]!.nameplate;
  await job.record('assembly', { bearingDriveEnd: `${bearingDriveEnd}/C3`, bearingNonDriveEnd: `${bearingNonDriveEnd}/C3`, grease: 'polyurea, NLGI 2', turnsFreely: true, words: '' });
  await job.moveTo('final-test');
  if (upTo === 'final-test') return;
  const test = await job.record('final-test', finalTest(machine, stage.meters));
  await job.sign(test);
  await job.moveTo('ready');
}

export async function issueCertificate(job: SampleJob): Promise<void> {
  await job.act('technician', '/certificate', { jobVersion: (await job.sheet()).version, paperSize: 'A4', units: 'si', reason: '' });
}

export async function handOver(job: SampleJob, receivedBy: string): Promise<void> {
  await job.act('counter', '/delivery', { version: (await job.sheet()).version, receivedBy, words: '' });
  await job.moveTo('released');
}

export async function invoice(stage: Stage, job: SampleJob): Promise<{ id: string; version: number; grossMinor: number }> {
  const quotes = await stage.cast.counter.get<{ id: string; state: string }[]>(`/jobs/${job.id}/quotes`);
  return stage.cast.office.post(`/jobs/${job.id}/invoices`, { jobVersion: (await job.sheet()).version, quoteId: quotes.find((q) => q.state === 'approved')!.id });
}

export async function waive(stage: Stage, job: SampleJob, reason: string, words: string): Promise<void> {
  const waiver = await job.act('technician', '/waiver', { reason, words });
  await stage.cast.manager.post(`/waivers/${waiver.id}/countersignature`, { password: DEMO_PASSWORD, remark: '' });
}
