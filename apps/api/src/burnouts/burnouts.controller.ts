import { Body, Controller, Get, Param, Post, Put, Query, Req, StreamableFile } from '@nestjs/common';
import { ApiBody, ApiConsumes, ApiTags } from '@nestjs/swagger';
import { correctLoadSchema, createLoadSchema, loadListQuerySchema, loggerFileQuerySchema, type CorrectLoad, type CreateLoad, type JobLoad, type LoadListQuery, type LoadPage, type LoadView, type LoggerFileQuery, type WaitingJob } from '@shared/burnouts';
import { idField } from '@shared/fields';
import type { FastifyRequest } from 'fastify';
import { disposition } from '../attachments/file-name.js';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { LoadReadService } from './load-read.service.js';
import { LoadsService } from './loads.service.js';

@ApiTags('burnouts')
@Controller()
export class BurnoutsController {
  constructor(
    private readonly loads: LoadsService,
    private readonly reads: LoadReadService,
  ) {}

  @Get('burnouts')
  @Needs('burnouts.read')
  page(@Query({ schema: loadListQuerySchema }) query: LoadListQuery): Promise<LoadPage> {
    return this.reads.page(query);
  }

  /** Jobs that stand before the oven, with the limit of each part. */
  @Get('burnouts/waiting')
  @Needs('burnouts.read')
  waiting(): Promise<WaitingJob[]> {
    return this.reads.waiting();
  }

  @Post('burnouts')
  @Needs('burnouts.write')
  create(@CurrentActor() actor: Actor, @Body({ schema: createLoadSchema }) input: CreateLoad): Promise<LoadView> {
    return this.loads.create(actor, input);
  }

  @Get('burnouts/:id')
  @Needs('burnouts.read')
  one(@Param('id', { schema: idField }) id: string): Promise<LoadView> {
    return this.reads.one(id);
  }

  @Put('burnouts/:id')
  @Needs('burnouts.write')
  correct(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: correctLoadSchema }) input: CorrectLoad): Promise<LoadView> {
    return this.loads.correct(actor, id, input);
  }

  /** The logger's file as form data: rows with a time and a temperature, CSV or tab separated. */
  @Post('burnouts/:id/file')
  @Needs('burnouts.write')
  @ApiConsumes('multipart/form-data')
  @ApiBody({ schema: { type: 'object', properties: { file: { type: 'string', format: 'binary' } }, required: ['file'] } })
  takeFile(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Query({ schema: loggerFileQuerySchema }) query: LoggerFileQuery, @Req() request: FastifyRequest): Promise<LoadView> {
    return this.loads.takeFile(actor, id, query, request);
  }

  /** The file as it came from the logger. */
  @Get('burnouts/:id/file')
  @Needs('burnouts.read')
  async file(@Param('id', { schema: idField }) id: string): Promise<StreamableFile> {
    const { stream, name, length } = await this.loads.openFile(id);
    return new StreamableFile(stream, { type: 'application/octet-stream', disposition: disposition('attachment', name), length });
  }

  @Get('jobs/:id/burnouts')
  @Needs('burnouts.read')
  ofJob(@Param('id', { schema: idField }) id: string): Promise<JobLoad[]> {
    return this.reads.ofJob(id);
  }
}
