import { Body, Controller, Get, HttpCode, Param, Post, Put } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { idField, lineField } from '@shared/fields';
import {
  bookInSchema,
  endJobSchema,
  holdJobSchema,
  moveJobSchema,
  moveLimitsSchema,
  recordDeliverySchema,
  resumeJobSchema,
  updateJobSchema,
  type BookIn,
  type CreatedJob,
  type Delivery,
  type EndJob,
  type HistoryEntryView,
  type HoldJob,
  type JobSheet,
  type MoveJob,
  type MoveLimits,
  type RecordDelivery,
  type ResumeJob,
  type Tag,
  type UpdateJob,
} from '@shared/jobs';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { BookingService } from './booking.service.js';
import { DeliveryService } from './delivery.service.js';
import { JobMovesService } from './job-moves.service.js';
import { JobSheetService } from './job-sheet.service.js';
import { TagsService } from './tags.service.js';

@ApiTags('jobs')
@Controller('jobs')
export class JobsController {
  constructor(
    private readonly booking: BookingService,
    private readonly sheets: JobSheetService,
    private readonly moves: JobMovesService,
    private readonly delivery: DeliveryService,
    private readonly tags: TagsService,
  ) {}

  @Post()
  @Needs('jobs.book')
  bookIn(@CurrentActor() actor: Actor, @Body({ schema: bookInSchema }) input: BookIn): Promise<CreatedJob> {
    return this.booking.bookIn(actor, input);
  }

  @Get('by-number/:number')
  @Needs('jobs.read')
  byNumber(@Param('number', { schema: lineField(40) }) number: string): Promise<CreatedJob> {
    return this.sheets.byNumber(number);
  }

  @Get(':id')
  @Needs('jobs.read')
  sheet(@Param('id', { schema: idField }) id: string): Promise<JobSheet> {
    return this.sheets.sheet(id);
  }

  @Get(':id/history')
  @Needs('history.read')
  history(@Param('id', { schema: idField }) id: string): Promise<HistoryEntryView[]> {
    return this.sheets.historyOf(id);
  }

  @Put(':id')
  @Needs('jobs.edit')
  update(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: updateJobSchema }) input: UpdateJob): Promise<JobSheet> {
    return this.moves.update(actor, id, input);
  }

  @Post(':id/moves')
  @HttpCode(200)
  @Needs('jobs.move')
  move(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: moveJobSchema }) input: MoveJob): Promise<JobSheet> {
    return this.moves.move(actor, id, input);
  }

  @Post(':id/hold')
  @HttpCode(200)
  @Needs('jobs.move')
  hold(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: holdJobSchema }) input: HoldJob): Promise<JobSheet> {
    return this.moves.hold(actor, id, input);
  }

  @Post(':id/resume')
  @HttpCode(200)
  @Needs('jobs.move')
  resume(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: resumeJobSchema }) input: ResumeJob): Promise<JobSheet> {
    return this.moves.resume(actor, id, input);
  }

  @Post(':id/end')
  @HttpCode(200)
  @Needs('jobs.edit')
  end(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: endJobSchema }) input: EndJob): Promise<JobSheet> {
    return this.moves.end(actor, id, input);
  }

  @Post(':id/limits')
  @HttpCode(200)
  @Needs('limits.publish')
  moveLimits(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: moveLimitsSchema }) input: MoveLimits): Promise<JobSheet> {
    return this.moves.moveLimits(actor, id, input);
  }

  @Post(':id/delivery')
  @Needs('delivery.record')
  deliver(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: recordDeliverySchema }) input: RecordDelivery): Promise<Delivery> {
    return this.delivery.record(actor, id, input);
  }

  @Get(':id/tag')
  @Needs('jobs.read')
  tag(@Param('id', { schema: idField }) id: string): Promise<Tag> {
    return this.tags.latest(id);
  }

  @Post(':id/tag')
  @Needs('jobs.read')
  printTag(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string): Promise<Tag> {
    return this.tags.print(actor, id);
  }
}
