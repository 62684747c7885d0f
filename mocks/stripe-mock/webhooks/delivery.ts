/** One event on its way to one address. */
export interface Delivery {
  id: string;
  eventId: string;
  eventType: string;
  endpointId: string;
  url: string;
  /** `queued` goes out next, `held` and `delayed` wait for the control API or the clock, `retrying` failed and comes again. */
  state: 'queued' | 'held' | 'delayed' | 'retrying' | 'delivered' | 'given-up' | 'lost';
  attempts: { atMs: number; status: number | null; error: string | null }[];
}

export type RuleAction = 'lose' | 'repeat' | 'delay' | 'hold';

/** What the control API has asked to go wrong on the way. `type` is an event type, `charge.*` or `*`. */
export interface DeliveryRule {
  action: RuleAction;
  type: string;
  /** How many more events the rule takes; null means all of them. */
  left: number | null;
  /** For `repeat`: how many copies arrive. */
  copies: number;
  /** For `delay`: how long, on the service's clock. */
  delayMs: number;
}

export const typeFits = (pattern: string, type: string): boolean =>
  pattern === '*' || pattern === type || (pattern.endsWith('.*') && type.startsWith(pattern.slice(0, -1)));
