import type { Clock } from './clock.js';

/** Something the service will do by itself at a later moment: expire a session, settle a refund, try a webhook again. */
export interface AgendaItem {
  atMs: number;
  kind: AgendaKind;
  id: string;
  detail?: string;
}
export type AgendaKind = 'session.expire' | 'refund.settle' | 'refund.fail' | 'debit.settle' | 'dispute.open' | 'dispute.decide' | 'fraud.warn' | 'webhook.attempt';

const LONGEST_TIMER_MS = 2_147_000_000;

export class Agenda {
  private timer: NodeJS.Timeout | undefined;
  private act: (item: AgendaItem) => void = () => undefined;
  private closed = false;

  constructor(
    private readonly clock: Clock,
    private items: AgendaItem[] = [],
  ) {
    this.items.sort((a, b) => a.atMs - b.atMs);
  }

  start(act: (item: AgendaItem) => void): void {
    this.act = act;
    this.runDue();
  }

  add(item: AgendaItem): void {
    this.items.splice(this.placeFor(item.atMs), 0, item);
    if (this.items[0] === item) this.arm();
  }

  /** The pending items, soonest first. */
  pending(): AgendaItem[] {
    return [...this.items];
  }

  /** Behind everything that is due earlier or at the same moment. */
  private placeFor(atMs: number): number {
    let low = 0;
    let high = this.items.length;
    while (low < high) {
      const middle = (low + high) >>> 1;
      if ((this.items[middle]?.atMs ?? Infinity) <= atMs) low = middle + 1;
      else high = middle;
    }
    return low;
  }

  cancel(kind: AgendaKind, id: string): void {
    this.items = this.items.filter((item) => item.kind !== kind || item.id !== id);
    this.arm();
  }

  /** Do everything whose time has come. Each act may add further items; those are done too when they are due. */
  runDue(): void {
    for (let next = this.items[0]; next && next.atMs <= this.clock.nowMs() && !this.closed; next = this.items[0]) {
      this.items.shift();
      this.act(next);
    }
    this.arm();
  }

  /** Let time pass: every item on the way is done at its own moment, so that `created` stamps come out right. */
  advance(ms: number): void {
    const target = this.clock.nowMs() + ms;
    for (let next = this.items[0]; next && next.atMs <= target; next = this.items[0]) {
      this.clock.offsetMs += Math.max(0, next.atMs - this.clock.nowMs());
      this.runDue();
    }
    this.clock.offsetMs += Math.max(0, target - this.clock.nowMs());
    this.runDue();
  }

  close(): void {
    this.closed = true;
    clearTimeout(this.timer);
  }

  toJSON(): AgendaItem[] {
    return this.items;
  }

  private arm(): void {
    clearTimeout(this.timer);
    const next = this.items[0];
    if (!next || this.closed) return;
    const wait = Math.min(LONGEST_TIMER_MS, Math.max(1, next.atMs - this.clock.nowMs()));
    this.timer = setTimeout(() => this.runDue(), wait);
    this.timer.unref();
  }
}
