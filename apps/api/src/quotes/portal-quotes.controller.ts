import { Body, Controller, Get, Param, Post } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { idField } from '@shared/fields';
import { approveInPortalSchema, declineQuoteSchema, type ApproveInPortal, type DeclineQuote, type QuoteView } from '@shared/quotes';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { QuoteAnswersService } from './quote-answers.service.js';

@ApiTags('portal')
@Controller('portal/quotes')
export class PortalQuotesController {
  constructor(private readonly answers: QuoteAnswersService) {}

  @Get(':id')
  @Needs('portal.use')
  one(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string): Promise<QuoteView> {
    return this.answers.ofCustomer(actor, id);
  }

  @Post(':id/approval')
  @Needs('portal.use')
  approve(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: approveInPortalSchema }) input: ApproveInPortal): Promise<QuoteView> {
    return this.answers.approveInPortal(actor, id, input);
  }

  @Post(':id/decline')
  @Needs('portal.use')
  decline(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: declineQuoteSchema }) input: DeclineQuote): Promise<QuoteView> {
    return this.answers.declineInPortal(actor, id, input);
  }
}
