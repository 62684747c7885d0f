import { Injectable, type CanActivate, type ExecutionContext } from '@nestjs/common';
import { Reflector } from '@nestjs/core';
import { AuthGuard } from '@nestjs/passport';
import { AppError } from '../http/app-error.js';
import { NEEDS, type ActorRequest, type Needed } from './needs.js';

/** Who it is: the session behind the cookie, read afresh for each request. */
@Injectable()
export class SessionGuard extends AuthGuard('jwt') {
  constructor(private readonly reflector: Reflector) {
    super();
  }

  override async canActivate(context: ExecutionContext): Promise<boolean> {
    if (this.reflector.get<Needed | undefined>(NEEDS, context.getHandler()) === 'public') return true;
    return (await super.canActivate(context)) as boolean;
  }

  override handleRequest<T>(error: unknown, user: T | false): T {
    if (error instanceof AppError) throw error;
    if (error || !user) throw new AppError('NOT_SIGNED_IN', 'Sign in to go on. What you typed is kept.');
    return user;
  }
}

/** Closed unless a handler says what it needs. */
@Injectable()
export class PermissionGuard implements CanActivate {
  constructor(private readonly reflector: Reflector) {}

  canActivate(context: ExecutionContext): boolean {
    const needed = this.reflector.get<Needed | undefined>(NEEDS, context.getHandler());
    if (needed === 'public') return true;
    const held: readonly string[] = context.switchToHttp().getRequest<ActorRequest>().user?.permissions ?? [];
    if (needed && held.includes(needed)) return true;
    throw new AppError('FORBIDDEN', 'Your roles do not allow this. Ask the manager if they should.');
  }
}
