import { createHash } from 'node:crypto';
import { Injectable, type CallHandler, type ExecutionContext, type NestInterceptor, type RawBodyRequest } from '@nestjs/common';
import type { FastifyReply } from 'fastify';
import { from, lastValueFrom, type Observable } from 'rxjs';
import type { ActorRequest } from '../auth/needs.js';
import { Clock } from '../clock/clock.js';
import { ReadDb } from '../database/read-db.js';
import { UnitOfWork } from '../database/unit-of-work.js';
import { AppError } from '../http/app-error.js';
import { requestContext } from '../http/request-context.js';
import { IdempotencyKey } from './idempotency-key.entity.js';

const KEY = /^[\w-]{8,100}$/;

interface Kept {
  requestHash: string;
  status: number | null;
  body: string | null;
}

/**
 * A double tap or a retry makes one thing. The key is written in the same unit as the change it belongs to;
 * a request that comes again while the first runs waits for it and gets the same answer.
 */
@Injectable()
export class IdempotencyInterceptor implements NestInterceptor {
  private readonly running = new Map<string, { hash: string; answer: Promise<unknown> }>();

  constructor(
    private readonly db: ReadDb,
    private readonly unitOfWork: UnitOfWork,
    private readonly clock: Clock,
  ) {}

  intercept(context: ExecutionContext, next: CallHandler): Observable<unknown> {
    const request = context.switchToHttp().getRequest<RawBodyRequest<ActorRequest>>();
    const key = request.headers['idempotency-key'];
    const actorId = request.user?.userId;
    if (request.method !== 'POST' || key === undefined || !actorId) return next.handle();
    if (typeof key !== 'string' || !KEY.test(key)) throw new AppError('INPUT_NOT_VALID', 'The idempotency key must be 8 to 100 letters, digits, - or _.');
    return from(this.once(context, next, request, actorId, key));
  }

  private async once(context: ExecutionContext, next: CallHandler, request: RawBodyRequest<ActorRequest>, actorId: string, key: string): Promise<unknown> {
    // over the bytes as they came: to write a body nested a hundred thousand deep once more would break; of a file, which goes
    // straight to disk, its length
    const hash = createHash('sha256').update(`${request.method} ${request.url}\n`).update(request.rawBody ?? request.headers['content-length'] ?? '').digest('hex');
    const name = `${actorId}|${key}`;
    const twin = this.running.get(name);
    if (twin) {
      assertSameRequest(twin.hash, hash);
      return twin.answer;
    }
    const answer = this.carryOut(context, next, { actorId, key, hash });
    this.running.set(name, { hash, answer });
    answer.catch(() => undefined).finally(() => this.running.delete(name));
    return answer;
  }

  private async carryOut(context: ExecutionContext, next: CallHandler, claim: { actorId: string; key: string; hash: string }): Promise<unknown> {
    const reply = context.switchToHttp().getResponse<FastifyReply>();
    const kept = await this.db.one<Kept>('SELECT requestHash, status, body FROM idempotency_keys WHERE actorId = ? AND key = ?', [claim.actorId, claim.key]);
    if (kept) return this.replay(kept, claim.hash, reply);
    let claimed = false;
    const store = requestContext.getStore();
    if (store) {
      store.claimIdempotencyKey = async (manager) => {
        if (claimed) return;
        await manager.insert(IdempotencyKey, { actorId: claim.actorId, key: claim.key, requestHash: claim.hash, at: this.clock.iso(), status: null, body: null });
        claimed = true;
      };
    }
    const body: unknown = await lastValueFrom(next.handle(), { defaultValue: undefined });
    if (store) delete store.claimIdempotencyKey;
    if (claimed) {
      await this.unitOfWork.run((manager) =>
        manager.update(IdempotencyKey, { actorId: claim.actorId, key: claim.key }, { status: reply.statusCode, body: JSON.stringify(body ?? null) }),
      );
    }
    return body;
  }

  private replay(kept: Kept, hash: string, reply: FastifyReply): unknown {
    assertSameRequest(kept.requestHash, hash);
    if (kept.body === null) throw new AppError('ALREADY_DONE', 'This was done already, just before the shop’s computer restarted. Reload the page to see it.');
    reply.header('idempotent-replayed', 'true');
    const body: unknown = JSON.parse(kept.body);
    return body === null ? undefined : body;
  }
}

function assertSameRequest(first: string, second: string): void {
  if (first !== second) throw new AppError('IDEMPOTENCY_KEY_REUSED', 'This key belongs to another request.');
}
