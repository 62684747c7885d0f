import { AsyncLocalStorage } from 'node:async_hooks';
import type { EntityManager } from 'typeorm';

export interface RequestContext {
  readonly requestId: string;
  /** set while a request with an idempotency key runs: the key is written in the same unit as the change */
  claimIdempotencyKey?: (manager: EntityManager) => Promise<void>;
}

export const requestContext = new AsyncLocalStorage<RequestContext>();
