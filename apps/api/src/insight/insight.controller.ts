import { Body, Controller, Get, Param, Post, Query } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { idField, requiredLine } from '@shared/fields';
import { addOvenHistorySchema, ovenChartQuerySchema, withdrawOvenHistorySchema, type AddOvenHistory, type OvenChartQuery, type OvenInsight, type OvenList, type WithdrawOvenHistory } from '@shared/insight';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { InsightService } from './insight.service.js';

/** Ovens are called as the shop calls them: O1, O2. */
const ovenField = requiredLine(40);

@ApiTags('insight')
@Controller('insight')
export class InsightController {
  constructor(private readonly insight: InsightService) {}

  @Get('ovens')
  @Needs('insight.read')
  ovens(): Promise<OvenList> {
    return this.insight.ovens();
  }

  @Get('ovens/:ovenId')
  @Needs('insight.read')
  oven(@Param('ovenId', { schema: ovenField }) ovenId: string, @Query({ schema: ovenChartQuerySchema }) query: OvenChartQuery): Promise<OvenInsight> {
    return this.insight.oven(ovenId, query);
  }

  /** What an older book says of the oven, as plain figures. */
  @Post('ovens/:ovenId/history')
  @Needs('insight.write')
  addHistory(@CurrentActor() actor: Actor, @Param('ovenId', { schema: ovenField }) ovenId: string, @Body({ schema: addOvenHistorySchema }) input: AddOvenHistory): Promise<OvenInsight> {
    return this.insight.addHistory(actor, ovenId, input);
  }

  @Post('history/:id/withdrawal')
  @Needs('insight.write')
  withdraw(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: withdrawOvenHistorySchema }) input: WithdrawOvenHistory): Promise<OvenInsight> {
    return this.insight.withdraw(actor, id, input);
  }
}
