import { Body, Controller, Get, Param, Post, Req } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { idField } from '@shared/fields';
import { issueCertificateSchema, type IssueCertificate, type PaperView } from '@shared/papers';
import type { FastifyRequest } from 'fastify';
import { z } from 'zod';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { CertificateCheckService, type CertificateCheck } from './certificate-check.service.js';
import { CertificatesService } from './certificates.service.js';

const codeParam = z.string().trim().regex(/^[0-9A-Za-z-]{8,40}$/, 'A code like 7KQ2-9M4X-…');

@ApiTags('certificates')
@Controller()
export class CertificatesController {
  constructor(
    private readonly certificates: CertificatesService,
    private readonly checks: CertificateCheckService,
  ) {}

  @Post('jobs/:id/certificate')
  @Needs('certificates.issue')
  issue(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: issueCertificateSchema }) input: IssueCertificate): Promise<PaperView> {
    return this.certificates.issue(actor, id, input);
  }

  @Get('check/:code')
  @Needs('public')
  check(@Param('code', { schema: codeParam }) code: string, @Req() request: FastifyRequest): Promise<CertificateCheck> {
    return this.checks.check(code, request.ip);
  }
}
