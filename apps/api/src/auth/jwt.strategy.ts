import { createSecretKey, type KeyObject } from 'node:crypto';
import { Inject, Injectable } from '@nestjs/common';
import { PassportStrategy } from '@nestjs/passport';
import type { FastifyRequest } from 'fastify';
import { Strategy } from 'passport-jwt';
import { CONFIG, type Config } from '../config/config.js';
import type { Actor } from './actor.js';
import { isSecure, sessionCookie, TOKEN_AUDIENCE, TOKEN_ISSUER } from './session-cookie.js';
import { SessionsService } from './sessions.service.js';

/** A KeyObject: with a bare string each check would first try to read it as a public key, which is slow. */
export const jwtKey = (config: Config): KeyObject => createSecretKey(Buffer.from(config.jwtSecret));

@Injectable()
export class JwtStrategy extends PassportStrategy(Strategy) {
  constructor(
    @Inject(CONFIG) config: Config,
    private readonly sessions: SessionsService,
  ) {
    const cookie = sessionCookie(isSecure(config.publicUrl));
    super({
      jwtFromRequest: (request: unknown) => (request as FastifyRequest).cookies[cookie] ?? null,
      secretOrKey: jwtKey(config) as unknown as string,
      algorithms: ['HS256'],
      issuer: TOKEN_ISSUER,
      audience: TOKEN_AUDIENCE,
    });
  }

  /** The token only names the session; whether it lives and what its user may do is read from the database. */
  async validate(token: { sid?: unknown }): Promise<Actor | false> {
    return typeof token.sid === 'string' ? ((await this.sessions.actorOf(token.sid)) ?? false) : false;
  }
}
