import { AsyncLocalStorage } from 'node:async_hooks';
import { Injectable } from '@nestjs/common';
import type { DataSource, EntityManager } from 'typeorm';
import { requestContext } from '../http/request-context.js';

/** Long enough for the largest unit, short enough that a forgotten await does not stop the shop. */
const TIME_LIMIT_MS = 15_000;

/**
 * Runs database work in a transaction, one at a time.
 *
 * TypeORM's SQLite driver shares one connection, so two overlapping transactions nest and a failure in the first
 * rolls back the second. The queue keeps them apart. Keep the work short: no mail, no PDF, no payment call inside.
 */
@Injectable()
export class UnitOfWork {
  private tail: Promise<unknown> = Promise.resolve();
  private readonly inside = new AsyncLocalStorage<true>();
  private waiting = 0;

  constructor(
    private readonly dataSource: DataSource,
    private readonly whenBroken: (reason: Error) => void = (reason) => {
      throw reason;
    },
    private readonly timeLimitMs = TIME_LIMIT_MS,
  ) {}

  /** How many units wait or run: a figure for the readiness check. */
  get depth(): number {
    return this.waiting;
  }

  /** Nesting is a mistake in the caller: hand the manager down instead. */
  run<T>(work: (manager: EntityManager) => Promise<T>): Promise<T> {
    if (this.inside.getStore()) {
      return Promise.reject(new Error('UnitOfWork.run called inside another; pass its manager on'));
    }
    this.waiting += 1;
    const result = this.tail.then(() => this.inside.run(true, () => this.oneUnit(work)));
    this.tail = result
      .catch(() => undefined)
      .then(() => {
        this.waiting -= 1;
        this.assertClosed();
      });
    return result;
  }

  private oneUnit<T>(work: (manager: EntityManager) => Promise<T>): Promise<T> {
    return this.dataSource.transaction(async (manager) => {
      const lease = lend(manager);
      const timer = this.timeLimit();
      try {
        const answer = await Promise.race([work(lease.manager), timer.expired]);
        await requestContext.getStore()?.claimIdempotencyKey?.(manager);
        return answer;
      } finally {
        timer.cancel();
        lease.end();
      }
    });
  }

  private timeLimit(): { expired: Promise<never>; cancel(): void } {
    let handle: NodeJS.Timeout;
    const expired = new Promise<never>((_, reject) => {
      handle = setTimeout(() => reject(new Error(`A unit of work took longer than ${this.timeLimitMs} ms and was rolled back`)), this.timeLimitMs);
    });
    return { expired, cancel: () => clearTimeout(handle) };
  }

  /** A transaction left open would swallow every later write: better dead than a black hole. */
  private assertClosed(): void {
    const connection = (this.dataSource.driver as unknown as { databaseConnection?: { inTransaction: boolean } }).databaseConnection;
    if (connection?.inTransaction) this.whenBroken(new Error('A transaction stayed open after its unit of work'));
  }
}

/** A manager that refuses use after its unit has ended; a late continuation would write outside any transaction. */
function lend(manager: EntityManager): { manager: EntityManager; end(): void } {
  let ended = false;
  const proxy = new Proxy(manager, {
    get(target, property, receiver) {
      if (ended) throw new Error('This unit of work has ended; its manager cannot be used any more');
      const value: unknown = Reflect.get(target, property, receiver === proxy ? target : receiver);
      return typeof value === 'function' ? value.bind(target) : value;
    },
  });
  return { manager: proxy, end: () => (ended = true) };
}
