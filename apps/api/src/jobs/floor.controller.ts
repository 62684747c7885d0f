import { Controller, Get, Header, Query, StreamableFile } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { floorQuerySchema, type FloorPage, type FloorQuery, type FloorSteps } from '@shared/jobs';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { FloorService } from './floor.service.js';

@ApiTags('floor')
@Controller()
export class FloorController {
  constructor(private readonly floor: FloorService) {}

  @Get('jobs')
  @Needs('jobs.read')
  page(@Query({ schema: floorQuerySchema }) query: FloorQuery): Promise<FloorPage> {
    return this.floor.page(query);
  }

  @Get('jobs/steps')
  @Needs('jobs.read')
  steps(): Promise<FloorSteps> {
    return this.floor.steps();
  }

  /** The whole filtered list; its page and size say nothing here. */
  @Get('jobs.csv')
  @Needs('jobs.read')
  @Header('cache-control', 'no-store')
  async csv(@CurrentActor() actor: Actor, @Query({ schema: floorQuerySchema }) query: FloorQuery): Promise<StreamableFile> {
    const { name, stream } = await this.floor.csv(actor, query);
    return new StreamableFile(stream, { type: 'text/csv; charset=utf-8', disposition: `attachment; filename="${name}"` });
  }
}
