import { Body, Controller, Get, HttpCode, Inject, Post, Put, Req, Res } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { preferencesSchema, signInSchema, type Me, type Preferences, type SignIn } from '@shared/session';
import type { FastifyReply, FastifyRequest } from 'fastify';
import { CONFIG, type Config } from '../config/config.js';
import type { Actor } from './actor.js';
import { CurrentActor, Needs } from './needs.js';
import { clearSessionCookie, isSecure, setSessionCookie } from './session-cookie.js';
import { SessionsService } from './sessions.service.js';

@ApiTags('session')
@Controller('session')
export class SessionController {
  private readonly secure: boolean;

  constructor(
    private readonly sessions: SessionsService,
    @Inject(CONFIG) config: Config,
  ) {
    this.secure = isSecure(config.publicUrl);
  }

  @Post()
  @HttpCode(200)
  @Needs('public')
  async signIn(@Body({ schema: signInSchema }) input: SignIn, @Req() request: FastifyRequest, @Res({ passthrough: true }) reply: FastifyReply): Promise<Me> {
    const { token, me } = await this.sessions.signIn(input, request.ip);
    setSessionCookie(reply, token, this.secure);
    return me;
  }

  @Get()
  @Needs('profile.own')
  me(@CurrentActor() actor: Actor): Promise<Me> {
    return this.sessions.me(actor);
  }

  @Put('preferences')
  @Needs('profile.own')
  preferences(@CurrentActor() actor: Actor, @Body({ schema: preferencesSchema }) input: Preferences): Promise<Me> {
    return this.sessions.setPreferences(actor, input);
  }

  @Post('end')
  @HttpCode(204)
  @Needs('profile.own')
  async signOut(@CurrentActor() actor: Actor, @Res({ passthrough: true }) reply: FastifyReply): Promise<void> {
    await this.sessions.signOut(actor);
    clearSessionCookie(reply, this.secure);
  }

  @Post('end-all')
  @HttpCode(204)
  @Needs('profile.own')
  async signOutEverywhere(@CurrentActor() actor: Actor, @Res({ passthrough: true }) reply: FastifyReply): Promise<void> {
    await this.sessions.signOutEverywhere(actor);
    clearSessionCookie(reply, this.secure);
  }
}
