import { Body, Controller, Get, Param, Post, Put } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { idField } from '@shared/fields';
import {
  approveForCustomerSchema,
  createQuoteSchema,
  updateQuoteSchema,
  versionOnlySchema,
  type ApproveForCustomer,
  type CreateQuote,
  type QuoteView,
  type UpdateQuote,
  type VersionOnly,
} from '@shared/quotes';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { QuoteAnswersService } from './quote-answers.service.js';
import { QuotesService } from './quotes.service.js';

@ApiTags('quotes')
@Controller()
export class QuotesController {
  constructor(
    private readonly quotes: QuotesService,
    private readonly answers: QuoteAnswersService,
  ) {}

  @Get('jobs/:id/quotes')
  @Needs('quotes.read')
  ofJob(@Param('id', { schema: idField }) id: string): Promise<QuoteView[]> {
    return this.quotes.ofJob(id);
  }

  @Post('jobs/:id/quotes')
  @Needs('quotes.write')
  create(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: createQuoteSchema }) input: CreateQuote): Promise<QuoteView> {
    return this.quotes.create(actor, id, input);
  }

  @Get('quotes/:id')
  @Needs('quotes.read')
  one(@Param('id', { schema: idField }) id: string): Promise<QuoteView> {
    return this.quotes.one(id);
  }

  @Put('quotes/:id')
  @Needs('quotes.write')
  update(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: updateQuoteSchema }) input: UpdateQuote): Promise<QuoteView> {
    return this.quotes.update(actor, id, input);
  }

  @Post('quotes/:id/send')
  @Needs('quotes.write')
  send(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: versionOnlySchema }) input: VersionOnly): Promise<QuoteView> {
    return this.quotes.send(actor, id, input);
  }

  @Post('quotes/:id/revision')
  @Needs('quotes.write')
  revise(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: versionOnlySchema }) input: VersionOnly): Promise<QuoteView> {
    return this.quotes.revise(actor, id, input);
  }

  @Post('quotes/:id/approval-for-customer')
  @Needs('quotes.approve-for-customer')
  approve(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: approveForCustomerSchema }) input: ApproveForCustomer): Promise<QuoteView> {
    return this.answers.approveForCustomer(actor, id, input);
  }
}
