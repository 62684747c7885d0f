import { Controller, Get, Param } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import type { LimitsVersionView } from '@shared/limits';
import { z } from 'zod';
import { Needs } from '../auth/needs.js';
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
}
