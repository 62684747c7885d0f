import { Module } from '@nestjs/common';
import { InvoicesModule } from '../invoices/invoices.module.js';
import { PortalController } from './portal.controller.js';
import { PortalService } from './portal.service.js';

@Module({ imports: [InvoicesModule], controllers: [PortalController], providers: [PortalService] })
export class PortalModule {}
