import { Body, Controller, Get, Param, Post } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { idField } from '@shared/fields';
import { amendRecordSchema, makeRecordSchema, type AmendRecord, type MakeRecord, type RecordView } from '@shared/records';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { RecordsService } from './records.service.js';

@ApiTags('records')
@Controller()
export class RecordsController {
  constructor(private readonly records: RecordsService) {}

  @Get('jobs/:id/records')
  @Needs('records.read')
  ofJob(@Param('id', { schema: idField }) id: string): Promise<RecordView[]> {
    return this.records.ofJob(id);
  }

  @Post('jobs/:id/records')
  @Needs('records.write')
  make(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: makeRecordSchema }) input: MakeRecord): Promise<RecordView> {
    return this.records.make(actor, id, input);
  }

  @Get('records/:id')
  @Needs('records.read')
  one(@Param('id', { schema: idField }) id: string): Promise<RecordView> {
    return this.records.one(id);
  }

  @Get('records/:id/revisions')
  @Needs('records.read')
  revisions(@Param('id', { schema: idField }) id: string): Promise<RecordView[]> {
    return this.records.revisions(id);
  }

  @Post('records/:id/revisions')
  @Needs('records.write')
  amend(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: amendRecordSchema }) input: AmendRecord): Promise<RecordView> {
    return this.records.amend(actor, id, input);
  }
}
