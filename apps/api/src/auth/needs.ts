import { createParamDecorator, SetMetadata, type ExecutionContext } from '@nestjs/common';
import type { Permission } from '@shared/roles';
import type { FastifyRequest } from 'fastify';
import type { Actor } from './actor.js';

export const NEEDS = 'needs';
export type Needed = Permission | 'public';

/** Says what a handler needs; one that says nothing is closed. */
export const Needs = (needed: Needed) => SetMetadata(NEEDS, needed);

export type ActorRequest = FastifyRequest & { user?: Actor };

export const CurrentActor = createParamDecorator((_: unknown, context: ExecutionContext): Actor => {
  const actor = context.switchToHttp().getRequest<ActorRequest>().user;
  if (!actor) throw new Error('CurrentActor on a public handler');
  return actor;
});
