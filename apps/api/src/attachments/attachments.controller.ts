import { Controller, Get, Param, Post, Query, Req, StreamableFile } from '@nestjs/common';
import { ApiBody, ApiConsumes, ApiTags } from '@nestjs/swagger';
import { idField } from '@shared/fields';
import type { AttachmentView } from '@shared/jobs';
import type { FastifyRequest } from 'fastify';
import { z } from 'zod';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { AttachmentsService, type ServedFile } from './attachments.service.js';

const addQuerySchema = z.strictObject({ recordId: idField.optional() });
const served = ({ stream, type, length, disposition }: ServedFile) => new StreamableFile(stream, { type, disposition, ...(length === undefined ? {} : { length }) });

@ApiTags('attachments')
@Controller()
export class AttachmentsController {
  constructor(private readonly attachments: AttachmentsService) {}

  /** One file as form data: PNG, JPEG, WebP or PDF. */
  @Post('jobs/:id/attachments')
  @Needs('attachments.add')
  @ApiConsumes('multipart/form-data')
  @ApiBody({ schema: { type: 'object', properties: { file: { type: 'string', format: 'binary' } }, required: ['file'] } })
  add(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Query({ schema: addQuerySchema }) query: z.infer<typeof addQuerySchema>, @Req() request: FastifyRequest): Promise<AttachmentView> {
    return this.attachments.add(actor, id, query.recordId ?? null, request);
  }

  @Get('attachments/:id')
  @Needs('jobs.read')
  async file(@Param('id', { schema: idField }) id: string): Promise<StreamableFile> {
    return served(await this.attachments.open(id));
  }

  @Get('attachments/:id/thumb')
  @Needs('jobs.read')
  async thumb(@Param('id', { schema: idField }) id: string): Promise<StreamableFile> {
    return served(await this.attachments.openThumb(id));
  }

  @Get('portal/attachments/:id')
  @Needs('portal.use')
  async ownFile(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string): Promise<StreamableFile> {
    return served(await this.attachments.open(id, actor.customerId ?? ''));
  }

  @Get('portal/attachments/:id/thumb')
  @Needs('portal.use')
  async ownThumb(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string): Promise<StreamableFile> {
    return served(await this.attachments.openThumb(id, actor.customerId ?? ''));
  }
}
