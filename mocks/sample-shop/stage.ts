import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import type { RecordInput, RecordKind, RecordView } from '@shared/records';
import type { JobSheet } from '@shared/jobs';
import { ROUTE_STEPS, type Step } from '@shared/route';
import type { SteppingClock } from '../../apps/api/src/clock/clock.js';
import type { CUSTOMERS, CustomerKey } from './customers.js';
import type { MACHINES } from './machines.js';
import type { SamplePerson } from './people.js';
import { DEMO_PASSWORD } from './sign-ins.js';

export interface Cast {
  readonly counter: SamplePerson;
  readonly technician: SamplePerson;
  readonly second: SamplePerson;
  readonly office: SamplePerson;
  readonly manager: SamplePerson;
}
const DAY_MS = 24 * 3_600_000;

/** One job of the sample shop on its way: who does what, and on which day. */
export class SampleJob {
  private constructor(
    readonly id: string,
    private readonly stage: Stage,
  ) {}

  static async book(stage: Stage, body: object): Promise<SampleJob> {
    const { id } = await stage.cast.counter.post<{ id: string }>('/jobs', body);
    return new SampleJob(id, stage);
  }

  sheet(): Promise<JobSheet> {
    return this.stage.cast.counter.get<JobSheet>(`/jobs/${this.id}`);
  }

  /** Moves on, step by step, as far as told; every gate on the way must be open. */
  async moveTo(step: Step): Promise<void> {
    for (;;) {
      const sheet = await this.sheet();
      if (sheet.step === step) return;
      const steps = ROUTE_STEPS[sheet.route];
      const next = steps[steps.indexOf(sheet.step) + 1]!;
      await this.stage.cast.counter.post(`/jobs/${this.id}/moves`, { version: sheet.version, to: next });
      this.stage.minutes(7);
    }
  }

  async record<K extends RecordKind>(kind: K, readings: Extract<RecordInput, { kind: K }>['readings'] | object): Promise<RecordView> {
    const view = await this.stage.cast.technician.post<RecordView>(`/jobs/${this.id}/records`, { record: { kind, readings, entered: {} } });
    this.stage.minutes(25);
    return view;
  }

  async act(who: keyof Cast, path: string, body: object): Promise<{ id: string }> {
    const answer = await this.stage.cast[who].post<{ id: string }>(`/jobs/${this.id}${path}`, body);
    this.stage.minutes(5);
    return answer;
  }

  async sign(record: RecordView): Promise<void> {
    await this.stage.cast.technician.post(`/records/${record.id}/signature`, { version: record.version, password: DEMO_PASSWORD });
    this.stage.minutes(12);
    await this.stage.cast.second.post(`/records/${record.id}/release`, { version: record.version, password: DEMO_PASSWORD });
  }
}

/** Clock, people and what was made so far. */
export class Stage {
  readonly customers = {} as Record<keyof typeof CUSTOMERS, string>;
  readonly machines = {} as Record<keyof typeof MACHINES, string>;
  readonly meters: Record<string, string> = {};

  constructor(
    readonly app: NestFastifyApplication,
    private readonly clock: SteppingClock,
    private readonly seedDay: Date,
    readonly cast: Cast,
  ) {}

  /** The morning of a day, counted from the seed date. */
  day(offset: number, hour = 8): void {
    this.clock.set(new Date(this.seedDay.getTime() + offset * DAY_MS + hour * 3_600_000));
  }

  minutes(count: number): void {
    this.clock.forward(count * 60_000);
  }

  date(offset: number): string {
    return new Date(this.seedDay.getTime() + offset * DAY_MS + 12 * 3_600_000).toISOString().slice(0, 10);
  }

  iso(): string {
    return this.clock.iso();
  }

  customer(key: CustomerKey): string {
    return this.customers[key];
  }
}
