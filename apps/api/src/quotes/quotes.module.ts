import { Module } from '@nestjs/common';
import { PortalQuotesController } from './portal-quotes.controller.js';
import { QuoteAnswersService } from './quote-answers.service.js';
import { QuotesController } from './quotes.controller.js';
import { QuotesService } from './quotes.service.js';

@Module({ controllers: [QuotesController, PortalQuotesController], providers: [QuotesService, QuoteAnswersService], exports: [QuotesService] })
export class QuotesModule {}
