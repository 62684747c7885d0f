import { Controller, Get, Param, StreamableFile } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { idField } from '@shared/fields';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { PapersService } from './papers.service.js';

const asPdf = (paper: { name: string; bytes: Buffer }) => new StreamableFile(paper.bytes, { type: 'application/pdf', length: paper.bytes.length, disposition: `inline; filename="${paper.name}"` });

@ApiTags('papers')
@Controller()
export class PapersController {
  constructor(private readonly papers: PapersService) {}

  @Get('papers/:id/pdf')
  @Needs('jobs.read')
  async pdf(@Param('id', { schema: idField }) id: string): Promise<StreamableFile> {
    return asPdf(await this.papers.bytes(id));
  }

  @Get('portal/papers/:id/pdf')
  @Needs('portal.use')
  async ownPdf(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string): Promise<StreamableFile> {
    return asPdf(await this.papers.bytes(id, actor.customerId ?? ''));
  }
}
