import { Body, Controller, Get, Param, Post, Query } from '@nestjs/common';
import { ApiTags } from '@nestjs/swagger';
import { idField } from '@shared/fields';
import { invoiceQuerySchema, issueInvoiceSchema, type InvoiceQuery, type InvoiceView, type IssueInvoice } from '@shared/invoices';
import type { Actor } from '../auth/actor.js';
import { CurrentActor, Needs } from '../auth/needs.js';
import { InvoiceIssueService } from './invoice-issue.service.js';
import { InvoicesService, type InvoicePage } from './invoices.service.js';

@ApiTags('invoices')
@Controller()
export class InvoicesController {
  constructor(
    private readonly invoices: InvoicesService,
    private readonly issuing: InvoiceIssueService,
  ) {}

  @Get('invoices')
  @Needs('invoices.read')
  list(@Query({ schema: invoiceQuerySchema }) query: InvoiceQuery): Promise<InvoicePage> {
    return this.invoices.list(query);
  }

  @Get('invoices/:id')
  @Needs('invoices.read')
  one(@Param('id', { schema: idField }) id: string): Promise<InvoiceView> {
    return this.invoices.one(id);
  }

  @Get('jobs/:id/invoices')
  @Needs('invoices.read')
  ofJob(@Param('id', { schema: idField }) id: string): Promise<InvoiceView[]> {
    return this.invoices.ofJob(id);
  }

  @Post('jobs/:id/invoices')
  @Needs('invoices.issue')
  issue(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string, @Body({ schema: issueInvoiceSchema }) input: IssueInvoice): Promise<InvoiceView> {
    return this.issuing.issue(actor, id, input);
  }

  @Get('portal/invoices/:id')
  @Needs('portal.use')
  own(@CurrentActor() actor: Actor, @Param('id', { schema: idField }) id: string): Promise<InvoiceView> {
    return this.invoices.ofCustomer(actor, id);
  }
}
