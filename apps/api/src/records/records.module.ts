import { Module } from '@nestjs/common';
import { InstrumentsModule } from '../instruments/instruments.module.js';
import { JobFactsService } from '../jobs/job-facts.service.js';
import { RecordsController } from './records.controller.js';
import { RecordsService } from './records.service.js';

@Module({ imports: [InstrumentsModule], controllers: [RecordsController], providers: [RecordsService, JobFactsService], exports: [RecordsService] })
export class RecordsModule {}
