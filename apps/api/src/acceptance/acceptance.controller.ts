import { Body, Controller, Get, Param, Post } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { publishLimitsSchema, type LimitsComparison, type LimitsVersionView, type PublishLimits } from '@shared/limits';
import { z } from 'zod';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { AcceptanceService } from './acceptance.service.js';

const versionParam = z.coerce.number().int().min(1).max(1_000_000);

@ApiTags('acceptance limits')
@Controller('limits')
export class AcceptanceController {
  constructor(private readonly acceptance: AcceptanceService) {}

  @Get()
  @Needs('limits.read')
  versions(): Promise<LimitsVersionView[]> {
    return this.acceptance.versions();
  }

  @Get(':version')
  @Needs('limits.read')
  version(@Param('version', { schema: versionParam }) version: number): Promise<LimitsVersionView> {
    return this.acceptance.version(version);
  }

  @Post()
  @Needs('limits.publish')
  publish(@CurrentActor() actor: Actor, @Body({ schema: publishLimitsSchema }) input: PublishLimits): Promise<LimitsVersionView> {
    return this.acceptance.publish(actor, input);
  }

  @Get(':from/compare/:to')
  @Needs('limits.read')
  compare(@Param('from', { schema: versionParam }) from: number, @Param('to', { schema: versionParam }) to: number): Promise<LimitsComparison> {
    return this.acceptance.compare(from, to);
  }
}
