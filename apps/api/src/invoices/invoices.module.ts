import { Module } from '@nestjs/common';
import { InvoiceIssueService } from './invoice-issue.service.js';
import { InvoicesController } from './invoices.controller.js';
import { InvoicesService } from './invoices.service.js';

@Module({ controllers: [InvoicesController], providers: [InvoicesService, InvoiceIssueService], exports: [InvoicesService] })
export class InvoicesModule {}
