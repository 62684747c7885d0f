import type { AgendaItem } from './store/agenda.js';
import type { Agenda } from './store/agenda.js';
import type { Clock } from './store/clock.js';
import type { State } from './store/state.js';
import type { EventObject, EventType, StoredEvent } from './objects/stored.js';
import { newId } from './store/ids.js';

/** The API version the fake speaks: the one the SDK in package.json sends. */
export const API_VERSION = '2026-10-28.endive';

export interface Settings {
  /** Where a browser finds the pay page. */
  publicUrl: string;
  /** How long, on the service's clock, its own later acts take. */
  refundSettlesAfterMs: number;
  refundFailsAfterMs: number;
  disputeOpensAfterMs: number;
  disputeDecidedAfterMs: number;
  debitSettlesAfterMs: number;
  moneyAvailableAfterMs: number;
}

/** Everything an act of the service needs: what it knows, what time it is, and where its news goes. */
export interface World {
  state: State;
  clock: Clock;
  agenda: Agenda;
  settings: Settings;
  /** The API request being carried out, named in the events it causes; null when the service acts by itself. */
  request: { id: string; idempotency_key: string | null } | null;
  announce(event: StoredEvent): void;
}

export const later = (world: World, afterMs: number, item: Omit<AgendaItem, 'atMs'>): void =>
  world.agenda.add({ ...item, atMs: world.clock.nowMs() + afterMs });

/** Record that something happened, with a snapshot of the object as it is now, and hand the event to the webhooks. */
export function emit<T extends EventType>(world: World, type: T, object: EventObject<T>, previous?: Record<string, unknown>): StoredEvent {
  const event: StoredEvent = {
    id: newId('evt'),
    object: 'event',
    api_version: API_VERSION,
    created: world.clock.seconds(),
    data: { object: structuredClone<unknown>(object), ...(previous ? { previous_attributes: previous } : {}) },
    livemode: false,
    pending_webhooks: 0,
    request: world.request ? { ...world.request } : { id: null, idempotency_key: null },
    type,
  };
  world.state.events.add(event);
  world.announce(event);
  return event;
}
