import { Global, Module } from '@nestjs/common';
import { InstrumentsController } from './instruments.controller.js';
import { InstrumentsService } from './instruments.service.js';

@Global()
@Module({ controllers: [InstrumentsController], providers: [InstrumentsService], exports: [InstrumentsService] })
export class InstrumentsModule {}
