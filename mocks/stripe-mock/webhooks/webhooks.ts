import { randomUUID } from 'node:crypto';
import type { StoredEvent } from '../objects/stored.js';
import { later, type World } from '../world.js';
import { typeFits, type Delivery, type DeliveryRule } from './delivery.js';
import { signatureHeader } from './sign.js';

export interface WebhookTiming {
  /** Waits before each further try, in milliseconds of the service's clock; after the last one it gives up. */
  retryAfterMs: readonly number[];
  answerWithinMs: number;
}

/** Sends events to the endpoints: one after the other, again when an endpoint does not answer 2xx. */
export class Webhooks {
  rules: DeliveryRule[] = [];
  private queue: Delivery[] = [];
  private sending: Promise<void> | undefined;
  private closing = new AbortController();

  constructor(
    private readonly world: World,
    private readonly timing: WebhookTiming,
    private readonly changed: () => void,
  ) {}

  /** After a restart: what was on its way goes out again, so an event may come twice, but none is forgotten. */
  resume(): void {
    for (const delivery of this.world.state.deliveries.all()) if (delivery.state === 'queued') this.push(delivery);
  }

  announce(event: StoredEvent): void {
    const { endpoints } = this.world.state;
    const takers = endpoints.where((endpoint) => endpoint.status === 'enabled' && endpoint.enabled_events.some((type) => typeFits(type, event.type)));
    event.pending_webhooks = takers.length;
    if (takers.length === 0) return;
    const rule = this.takeRule(event.type);
    for (const endpoint of takers) {
      const copies = rule?.action === 'repeat' ? rule.copies : 1;
      for (let copy = 0; copy < copies; copy += 1) this.post(event, endpoint.id, endpoint.url, rule);
    }
  }

  private takeRule(type: string): DeliveryRule | undefined {
    const rule = this.rules.find((candidate) => candidate.left !== 0 && typeFits(candidate.type, type));
    if (rule && rule.left !== null) rule.left -= 1;
    return rule;
  }

  private post(event: StoredEvent, endpointId: string, url: string, rule?: DeliveryRule): Delivery {
    const delivery: Delivery = { id: randomUUID(), eventId: event.id, eventType: event.type, endpointId, url, state: 'queued', attempts: [] };
    this.world.state.deliveries.add(delivery);
    if (rule?.action === 'lose') delivery.state = 'lost';
    else if (rule?.action === 'hold') delivery.state = 'held';
    else if (rule?.action === 'delay') {
      delivery.state = 'delayed';
      later(this.world, rule.delayMs, { kind: 'webhook.attempt', id: delivery.id });
    } else this.push(delivery);
    return delivery;
  }

  /** Send an event once more, as the service's dashboard can. */
  resend(event: StoredEvent): void {
    for (const endpoint of this.world.state.endpoints.where((candidate) => candidate.status === 'enabled')) this.post(event, endpoint.id, endpoint.url);
  }

  /** Let held deliveries go, in the order asked for. */
  release(order: 'as-they-happened' | 'backwards' | readonly string[]): void {
    const held = this.world.state.deliveries.where((delivery) => delivery.state === 'held');
    const place = (delivery: Delivery) => (typeof order === 'string' ? 0 : order.findIndex((name) => name === delivery.eventId || name === delivery.eventType));
    const chosen = typeof order === 'string' ? held : held.filter((delivery) => place(delivery) >= 0).sort((a, b) => place(a) - place(b));
    for (const delivery of order === 'backwards' ? chosen.reverse() : chosen) this.push(delivery);
  }

  /** Do now what waits for a further try or for a delay. */
  retryNow(): void {
    for (const delivery of this.world.state.deliveries.all()) {
      if (delivery.state !== 'retrying' && delivery.state !== 'delayed') continue;
      this.world.agenda.cancel('webhook.attempt', delivery.id);
      this.push(delivery);
    }
  }

  attemptAgain(deliveryId: string): void {
    const delivery = this.world.state.deliveries.find(deliveryId);
    if (delivery && (delivery.state === 'retrying' || delivery.state === 'delayed')) this.push(delivery);
  }

  /** Resolves when nothing is on its way; what is held, delayed or waiting for a further try does not count. */
  async settled(): Promise<void> {
    while (this.sending) await this.sending;
  }

  async close(): Promise<void> {
    this.closing.abort();
    await this.settled();
  }

  private push(delivery: Delivery): void {
    if (this.closing.signal.aborted) return;
    delivery.state = 'queued';
    this.queue.push(delivery);
    this.sending ??= this.sendAll();
  }

  private async sendAll(): Promise<void> {
    // The answer to the request that caused the event goes out first.
    await new Promise((done) => setImmediate(done));
    for (let next = this.queue.shift(); next && !this.closing.signal.aborted; next = this.queue.shift()) {
      await this.send(next);
      this.changed();
    }
    this.sending = undefined;
  }

  private async send(delivery: Delivery): Promise<void> {
    const event = this.world.state.events.find(delivery.eventId);
    const secret = this.world.state.secrets[delivery.endpointId];
    if (!event || secret === undefined) {
      delivery.state = 'given-up';
      return;
    }
    const body = JSON.stringify(event, null, 2);
    const result = await this.knock(delivery.url, body, signatureHeader(body, secret, Math.floor(Date.now() / 1000)));
    if (this.closing.signal.aborted) return;
    delivery.attempts.push({ atMs: this.world.clock.nowMs(), ...result });
    if (result.status !== null && result.status >= 200 && result.status < 300) {
      if (delivery.state === 'queued') event.pending_webhooks = Math.max(0, event.pending_webhooks - 1);
      delivery.state = 'delivered';
      return;
    }
    const wait = this.timing.retryAfterMs[delivery.attempts.length - 1];
    delivery.state = wait === undefined ? 'given-up' : 'retrying';
    if (wait !== undefined) later(this.world, wait, { kind: 'webhook.attempt', id: delivery.id });
  }

  private async knock(url: string, body: string, signature: string): Promise<{ status: number | null; error: string | null }> {
    try {
      const answer = await fetch(url, {
        method: 'POST',
        body,
        redirect: 'manual',
        headers: { 'content-type': 'application/json; charset=utf-8', 'stripe-signature': signature, 'user-agent': 'Loopbay payment mock' },
        signal: AbortSignal.any([this.closing.signal, AbortSignal.timeout(this.timing.answerWithinMs)]),
      });
      await answer.arrayBuffer();
      return { status: answer.status, error: null };
    } catch (error) {
      return { status: null, error: error instanceof Error ? `${error.message}${error.cause instanceof Error ? `: ${error.cause.message}` : ''}` : String(error) };
    }
  }
}
