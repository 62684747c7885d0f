import { Global, Module } from '@nestjs/common';
import { AcceptanceController } from './acceptance.controller.js';
import { AcceptanceService } from './acceptance.service.js';

@Global()
@Module({ controllers: [AcceptanceController], providers: [AcceptanceService], exports: [AcceptanceService] })
export class AcceptanceModule {}
